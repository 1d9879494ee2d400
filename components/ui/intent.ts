"use client";

import { useCallback, useRef } from "react";

/**
 * The key of what a person is about to do: the same for a double press and for another try of the same entries,
 * a new one when the entries changed or after it has been done.
 */
export function useIntent(): { key: (body?: unknown) => string; done: () => void } {
  const kept = useRef<{ key: string; text: string } | null>(null);
  const key = useCallback((body?: unknown) => {
    const text = JSON.stringify(body ?? null);
    if (kept.current?.text !== text) kept.current = { key: crypto.randomUUID(), text };
    return kept.current.key;
  }, []);
  const done = useCallback(() => {
    kept.current = null;
  }, []);
  return { key, done };
}
