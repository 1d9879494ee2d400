import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { openShelf, timeId } from "../shelf";
import { type Message, readMessage } from "./message";

/** Everything that was sent, on disk. */
export type Mailbox = {
  keep(raw: Buffer, envelope: Message["envelope"]): Promise<Message>;
  get(id: string): Message | undefined;
  raw(id: string): Buffer | undefined;
  /** Newest first. */
  all(): Message[];
  clear(): void;
};

/** Opens the mail that an earlier run left in the folder. */
export function openMailbox(folder: string): Mailbox {
  const sources = join(folder, "raw");
  mkdirSync(sources, { recursive: true });
  const shelf = openShelf<Message>(join(folder, "messages"));
  const sourceOf = (id: string) => join(sources, `${id}.eml`);
  return {
    async keep(raw, envelope) {
      const message = await readMessage(timeId(), raw, envelope);
      // The source goes first: a listed message always has one.
      writeFileSync(`${sourceOf(message.id)}.new`, raw);
      renameSync(`${sourceOf(message.id)}.new`, sourceOf(message.id));
      return shelf.put(message.id, message);
    },
    get: shelf.get,
    raw: (id) => (shelf.get(id) && existsSync(sourceOf(id)) ? readFileSync(sourceOf(id)) : undefined),
    all: () => shelf.all().reverse(),
    clear() {
      for (const message of shelf.all()) rmSync(sourceOf(message.id), { force: true });
      shelf.clear();
    },
  };
}
