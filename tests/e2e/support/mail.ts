import { expect } from "@playwright/test";
import type { Message } from "@/lib/local/mail/message";

const SINK = process.env.MAIL_PAGE_URL ?? "http://localhost:4026";
/** The worker looks for letters every few seconds, and the machine may be busy. */
const PATIENCE_MS = 40_000;

/** All letters to one address, newest first. */
export async function lettersTo(address: string): Promise<Message[]> {
  const answer = await fetch(`${SINK}/messages?to=${encodeURIComponent(address)}`);
  return (await answer.json()) as Message[];
}

/** The newest letter to an address with these words in its subject, waited for. */
export async function letterTo(address: string, subject: RegExp): Promise<Message> {
  let found: Message | undefined;
  await expect.poll(async () => (found = (await lettersTo(address)).find((one) => subject.test(one.subject))) !== undefined, { message: `a letter to ${address} about ${subject}`, timeout: PATIENCE_MS }).toBe(true);
  if (!found) throw new Error(`no letter to ${address}`);
  return found;
}

/** The one address of ours in a letter whose path begins so. */
export function linkIn({ text }: Message, path: string): string {
  const [url] = text.match(new RegExp(`https?://\\S*${path}/[\\w.~-]+`)) ?? [];
  if (!url) throw new Error(`no link to ${path} in "${text.slice(0, 300)}"`);
  return url;
}
