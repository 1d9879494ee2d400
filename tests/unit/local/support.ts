import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach } from "vitest";

const endings: (() => unknown)[] = [];

afterEach(async () => {
  for (const end of endings.splice(0).reverse()) await end();
});

/** A folder that is gone after the test. */
export function aFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), "stand-in-"));
  afterTest(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** Runs when the test has ended, last one first. */
export function afterTest(end: () => unknown): void {
  endings.push(end);
}

/** Keeps a stand-in for the length of the test. */
export async function running<T extends { close(): Promise<void> }>(starting: Promise<T>): Promise<T> {
  const service = await starting;
  afterTest(() => service.close());
  return service;
}

export const postJson = (url: string, body: unknown) =>
  fetch(url, { method: "POST", headers: { "content-type": "application/json" }, body: JSON.stringify(body) });

/** Asks again until the answer is there, for what happens in the background. */
export async function until<T>(ask: () => T | Promise<T>, limitMs = 5000): Promise<NonNullable<T>> {
  const end = Date.now() + limitMs;
  for (;;) {
    const answer = await ask();
    if (answer) return answer;
    if (Date.now() > end) throw new Error("It did not happen in time.");
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
}
