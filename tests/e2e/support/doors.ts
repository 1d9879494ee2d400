import type { Page } from "@playwright/test";

type Sent = { path: string; method: string; body: unknown };

/** Asks a door of the API from within a page, with that person's cookie and as our own pages do. */
async function ask<T>(page: Page, sent: Sent): Promise<T> {
  const { status, text } = await page.evaluate(async ({ path, method, body }) => {
    const headers = { "content-type": "application/json", "idempotency-key": crypto.randomUUID() };
    const answer = await fetch(path, method === "GET" ? {} : { method, headers, body: JSON.stringify(body) });
    return { status: answer.status, text: await answer.text() };
  }, sent);
  if (status !== 200) throw new Error(`${sent.method} ${sent.path} answered ${status}: ${text}`);
  return JSON.parse(text) as T;
}

export const readDoor = <T>(page: Page, path: string): Promise<T> => ask<T>(page, { path, method: "GET", body: null });
export const writeDoor = <T>(page: Page, path: string, body: unknown): Promise<T> => ask<T>(page, { path, method: "POST", body });
