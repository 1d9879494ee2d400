"use client";

import { useState } from "react";

const PREFIX = "towfolio-draft:";

// A private window may refuse its store; then a draft lives as long as its page.
function quietly<T>(step: () => T): T | null {
  try {
    return step();
  } catch {
    return null;
  }
}

/** Forgets everything that was typed and not sent in this tab; for signing out. */
export function forgetDrafts(): void {
  quietly(() => {
    for (const key of Object.keys(sessionStorage)) if (key.startsWith(PREFIX)) sessionStorage.removeItem(key);
  });
}

/** What is typed survives a reload of the page in this tab. The key names the person too, so that the next one at the same screen never sees it. */
export function useDraft<T extends object>(name: string, empty: T): { value: T; change: (value: T) => void; forget: () => void; restored: boolean } {
  const key = `${PREFIX}${name}`;
  const [kept] = useState(() => quietly(() => (typeof sessionStorage === "undefined" ? null : sessionStorage.getItem(key))));
  const [value, setValue] = useState<T>(() => ({ ...empty, ...quietly(() => JSON.parse(kept ?? "{}") as Partial<T>) }));
  return {
    value,
    change: (next) => {
      setValue(next);
      quietly(() => sessionStorage.setItem(key, JSON.stringify(next)));
    },
    forget: () => {
      setValue(empty);
      quietly(() => sessionStorage.removeItem(key));
    },
    restored: kept !== null,
  };
}
