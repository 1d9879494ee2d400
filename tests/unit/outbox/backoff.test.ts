import { expect, it } from "vitest";
import { givenUp, nextTry } from "@/lib/outbox/backoff";

const NOW = new Date("2026-11-24T12:00:00Z");
const DAY_MS = 24 * 3600_000;

it("waits longer after each try, and never longer than five minutes", () => {
  expect([1, 2, 3, 4, 5, 6, 7, 100].map((attempts) => (nextTry(attempts, NOW).getTime() - NOW.getTime()) / 1000)).toEqual([5, 15, 30, 60, 120, 300, 300, 300]);
});

it("gives up after five days", () => {
  expect(givenUp(NOW, new Date(NOW.getTime() + 5 * DAY_MS))).toBe(false);
  expect(givenUp(NOW, new Date(NOW.getTime() + 5 * DAY_MS + 1))).toBe(true);
});
