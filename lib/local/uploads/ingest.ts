import type { IncomingMessage } from "node:http";
import type { Faults } from "../faults";
import { type Exchange, Refusal } from "../http";
import type { Callbacks, Outcome } from "./callbacks";
import { readFilePart } from "./multipart";
import { faultOfType, type Presigned, readPresigned } from "./presigned";
import { faultOfSignedUrl, type Token } from "./signing";
import type { Storage, StoredFile } from "./storage";

type Parts = { token: Token; storage: Storage; callbacks: Callbacks; faults: Faults; urlsOf(file: StoredFile): Record<string, string> };

/** What is answered to a sender. */
export type IngestAnswer = { status: number; body: unknown; headers?: Record<string, string> };

/** The connection was broken on order. */
export class CutOff extends Error {}

// The form around the file: its delimiters and the head of the field.
const FORM_BYTES = 64 * 1024;
// The sender may come again with the same file after these.
const NOT_FOR_GOOD: readonly number[] = [409, 416];

/** Takes files at their signed addresses; one that broke off goes on where it stopped. */
export function openIngest(parts: Parts) {
  const { token, storage } = parts;
  const arriving = new Map<string, { request: IncomingMessage; ended: Promise<unknown> }>();

  async function put(exchange: Exchange, key: string): Promise<IngestAnswer> {
    const presigned = readPresigned(exchange.url);
    const sending = receive(parts, exchange.request, key, presigned);
    const ended = sending.then(() => undefined, () => undefined).then(() => void arriving.delete(key));
    arriving.set(key, { request: exchange.request, ended });
    const file = await sending.catch((error: unknown) => {
      if (error instanceof Refusal && !NOT_FOR_GOOD.includes(error.status)) {
        storage.dropPartial(key);
        void parts.callbacks.reportRefused(key, error.message);
      }
      throw error;
    });
    return { status: 200, body: answerOf(await outcomeOf(parts, file, presigned), parts.urlsOf(file)) };
  }

  return async (exchange: Exchange, key: string): Promise<IngestAnswer> => {
    const { request, url } = exchange;
    const fault = faultOfSignedUrl(url, token.apiKey);
    if (fault) throw new Refusal(403, fault);
    if (readPresigned(url).appId !== token.appId) throw new Refusal(403, "Wrong app");
    if (request.method !== "PUT" && request.method !== "HEAD") throw new Refusal(405, "Method not allowed");
    // A sender whose connection broke may be back before the old connection is known to be dead.
    for (let earlier = arriving.get(key); earlier; earlier = arriving.get(key)) {
      earlier.request.destroy();
      await earlier.ended;
    }
    if (request.method === "HEAD") return { status: 200, body: null, headers: { "x-ut-range-start": String(arrivedSize(storage, key)) } };
    return put(exchange, key);
  };
}

const arrivedSize = (storage: Storage, key: string) => storage.files.get(key)?.size ?? storage.partialSize(key);

async function receive(parts: Parts, request: IncomingMessage, key: string, presigned: Presigned): Promise<StoredFile> {
  const { storage, faults } = parts;
  const start = startOf(request);
  const done = storage.files.get(key);
  if (start > arrivedSize(storage, key)) throw new Refusal(416, "Range starts beyond what has arrived");
  if (done && start < done.size) throw new Refusal(409, "File already uploaded");
  storage.requireOwn(key, presigned.customId);
  if (Number(request.headers["content-length"] ?? 0) > presigned.size - start + FORM_BYTES) throw tooLarge(presigned);
  const cut = faults.take("cut-mid-file");
  const cutAfter = cut ? (cut.afterBytes ?? Math.floor((presigned.size - start) / 2)) : null;
  const end = await storage.append(key, start, pieces(request, { presigned, start, cutAfter }));
  if (done) {
    storage.dropPartial(key);
    return done;
  }
  if (end !== presigned.size) throw new Refusal(400, `File has ${end} bytes, ${presigned.size} were signed`);
  const { name, size, type, customId, acl, disposition } = presigned;
  return storage.finish({ key, name, size, type, customId, acl, disposition });
}

type Coming = { presigned: Presigned; start: number; cutAfter: number | null };

/** The pieces of the file that may be written: of the signed type, never more than signed, and broken off where ordered. */
async function* pieces(request: IncomingMessage, { presigned, start, cutAfter }: Coming): AsyncGenerator<Buffer> {
  let sent = 0;
  const checkType = (type: string) => {
    const fault = start === 0 ? faultOfType(presigned, type) : null;
    if (fault) throw new Refusal(400, fault);
  };
  for await (const piece of readFilePart(request, checkType)) {
    const room = cutAfter === null ? piece.length : Math.max(0, cutAfter - sent);
    yield piece.subarray(0, room);
    sent += piece.length;
    if (start + sent > presigned.size) throw tooLarge(presigned);
    if (cutAfter !== null && sent >= cutAfter) {
      request.destroy();
      throw new CutOff("Cut off on order");
    }
  }
}

const tooLarge = ({ size }: Presigned) => new Refusal(413, `File is larger than the ${size} bytes that were signed`);

/** Files that the application's own server sends have no route, and nobody is told. */
const outcomeOf = (parts: Parts, file: StoredFile, presigned: Presigned): Promise<Outcome> =>
  presigned.slug === null ? Promise.resolve({ serverData: null }) : parts.callbacks.report(file, parts.urlsOf(file));

const answerOf = (outcome: Outcome, urls: Record<string, string>) => ({ ...urls, ...outcome });

function startOf(request: IncomingMessage): number {
  const range = request.headers.range;
  if (range === undefined) return 0;
  const start = /^bytes=(\d{1,15})-$/.exec(range)?.[1];
  if (start === undefined) throw new Refusal(416, "Range cannot be read");
  return Number(start);
}
