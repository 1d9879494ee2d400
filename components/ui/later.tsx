"use client";

import { createElement, lazy, Suspense, type ComponentType } from "react";

/** A part of a page that comes after it; `load` fetches it ahead, and then it shows at once. */
export type Later<P extends object> = ComponentType<P> & { load: () => Promise<unknown> };

/** Keeps a part out of what a page brings with it. One that could not be fetched is asked for again when the page is tried again. */
export function later<P extends object>(load: () => Promise<ComponentType<P>>): Later<P> {
  let part: ComponentType<P> | null = null;
  let waiting = waitFor();
  const fetchPart = async () => (part = await load());

  function waitFor(): ComponentType<P> {
    const lazyPart = lazy(async () => {
      try {
        return { default: await fetchPart() };
      } catch (error) {
        waiting = waitFor();
        throw error;
      }
    });
    return lazyPart as unknown as ComponentType<P>;
  }

  const Shown = (props: P) => (part ? createElement(part, props) : <Suspense fallback={null}>{createElement(waiting, props)}</Suspense>);
  return Object.assign(Shown, { load: fetchPart });
}
