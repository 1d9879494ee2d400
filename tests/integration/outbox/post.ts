import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { asc, isNotNull } from "drizzle-orm";
import { db } from "@/db/client";
import { outbox } from "@/db/schema";
import type { Message } from "@/lib/local/mail/message";
import { startMailSink } from "@/lib/local/mail/sink";
import { putMail } from "@/lib/outbox/commands";
import type { TaskHandlers } from "@/lib/worker/run";

// The stand-in hangs up on idle connections when its faults change.
const ONCE = { headers: { connection: "close" } };

/** The mail stand-in on ports and a folder of its own. */
export async function openSink(smtpPort = 0) {
  const folder = mkdtempSync(join(tmpdir(), "towfolio-mail-"));
  const sink = await startMailSink({ smtpPort, pagePort: 0, folder });
  const messages = async (to = ""): Promise<Message[]> => ((await (await fetch(`${sink.url}/messages?to=${encodeURIComponent(to)}`, ONCE)).json()) as Message[]).toReversed();
  return {
    smtpUrl: sink.smtpUrl,
    /** Everything that arrived, oldest first. */
    messages,
    /** The newest message as it came over the wire. */
    source: async () => (await fetch(`${sink.url}/messages/${(await messages()).at(-1)?.id}/raw`, ONCE)).text(),
    fault: async (fault: { kind: string; times?: number; ms?: number; to?: string }) =>
      void (await fetch(`${sink.url}/faults`, { method: "POST", body: JSON.stringify(fault), headers: { "content-type": "application/json" } })),
    clear: async () => void (await fetch(`${sink.url}/messages`, { method: "DELETE", ...ONCE })),
    close: async () => {
      await sink.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Tasks that no test here queues. */
export const NO_TASKS: TaskHandlers = { "check-photo": () => Promise.resolve(), "check-payment": () => Promise.resolve() };

/** A link as mails carry it; the word in it must never be found in a table. */
export const SECRET = "gravel-lantern-teaspoon";

/** Puts one letter with a number in its subject into the outbox. */
export async function post(n: number, to = `person${n}@example.test`, at = new Date()): Promise<void> {
  const news = { unit: `ZVRX ${n}`, caseNumber: "99-1", headline: "Something changed", lines: [], actionLabel: "Look", url: `http://localhost:4999/enter/${SECRET}` };
  await putMail(db(), { kind: "finding-answered", to, payload: news, dedupe: `letter:${n}:${to}` }, at);
  // Ids sort by the millisecond that made them.
  await new Promise((resolve) => setTimeout(resolve, 2));
}

/** The mail of the outbox, oldest first. */
export const rows = () => db().select().from(outbox).where(isNotNull(outbox.toAddress)).orderBy(asc(outbox.id));

/** How often each Message-ID arrived. */
export function copies(messages: Message[]): Map<string, Message[]> {
  const found = new Map<string, Message[]>();
  for (const message of messages) found.set(message.messageId ?? "", [...(found.get(message.messageId ?? "") ?? []), message]);
  return found;
}
