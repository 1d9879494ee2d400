"use client";

import { useState } from "react";

/** The idempotency key of one intent: the same until what was meant has happened, then a new one. */
export function useAttemptKey(): [string, () => void] {
  const [key, setKey] = useState<string>(() => crypto.randomUUID());
  return [key, () => setKey(crypto.randomUUID())];
}
