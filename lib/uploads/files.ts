import "server-only";
import { createHash, randomUUID } from "node:crypto";
import { open, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { UTApi, UTFile } from "uploadthing/server";
import { serviceSettings } from "./settings";

let known: UTApi | undefined;

const CALL_MS = 60_000;

/** The library waits for ever; a worker that waits for ever sends no mail. */
const bounded: typeof fetch = (input, init) => fetch(input, { ...init, signal: AbortSignal.any([AbortSignal.timeout(CALL_MS), ...(init?.signal ? [init.signal] : [])]) });

const api = () => (known ??= new UTApi({ ...serviceSettings(), fetch: bounded }));

/** How long an address to a private file is good. Long enough to load a picture, too short to pass on. */
export const READ_SECONDS = 60;

/** An address at which a private file can be read for a minute. Whoever asks must have been checked before. */
export async function signedAddress(key: string): Promise<string> {
  return (await api().generateSignedURL(key, { expiresIn: READ_SECONDS })).ufsUrl;
}

/** Sends the browser on to a private file, for a minute. */
export async function openFile(key: string): Promise<Response> {
  const headers = { location: await signedAddress(key), "cache-control": "private, no-store", "referrer-policy": "no-referrer", "x-content-type-options": "nosniff" };
  return new Response(null, { status: 302, headers });
}

/** The key of the file that carries an id of ours; null while there is none. */
export async function findKey(customId: string): Promise<string | null> {
  const { data } = await api().getFileUrls(customId, { keyType: "customId" });
  const [file] = data;
  if (!file) return null;
  const answer = await fetch(await signedAddress(file.key), { method: "HEAD", signal: AbortSignal.timeout(10_000) });
  return answer.ok ? file.key : null;
}

async function read(key: string): Promise<ReadableStream<Uint8Array>> {
  const answer = await fetch(await signedAddress(key), { redirect: "error", signal: AbortSignal.timeout(120_000) });
  if (!answer.ok || !answer.body) throw new Error(`The file service answered ${answer.status} for a stored file.`);
  return answer.body;
}

/** A small file as bytes; null when it has more than `maxBytes`. */
export async function readSmall(key: string, maxBytes: number): Promise<Uint8Array | null> {
  const parts: Uint8Array[] = [];
  let size = 0;
  for await (const part of await read(key)) {
    size += part.byteLength;
    if (size > maxBytes) return null;
    parts.push(part);
  }
  return Buffer.concat(parts);
}

export type Fetched = { sizeBytes: number; sha256: string; head: Uint8Array };

/** Bytes at the beginning that are looked at as they are: a picture's size stands behind its EXIF, which can fill some segments of 64 KB. */
const HEAD_BYTES = 1024 * 1024;

/** Works on a copy of a stored file, which is gone afterwards. Stops reading soon after `maxBytes`, so that a larger file is told by its size. */
export async function withCopy<T>(key: string, maxBytes: number, work: (path: string, fetched: Fetched) => Promise<T>): Promise<T> {
  const path = join(tmpdir(), `towfolio-original-${randomUUID()}`);
  try {
    return await work(path, await copyTo(key, path, maxBytes));
  } finally {
    await rm(path, { force: true });
  }
}

async function copyTo(key: string, path: string, maxBytes: number): Promise<Fetched> {
  const hash = createHash("sha256");
  const heads: Uint8Array[] = [];
  const file = await open(path, "wx", 0o600);
  let sizeBytes = 0;
  try {
    for await (const part of await read(key)) {
      if (sizeBytes < HEAD_BYTES) heads.push(part);
      sizeBytes += part.byteLength;
      hash.update(part);
      await file.write(part);
      if (sizeBytes > maxBytes) break;
    }
  } finally {
    await file.close();
  }
  return { sizeBytes, sha256: hash.digest("hex"), head: Buffer.concat(heads) };
}

/** Stores a file of our own making under an id of ours, in the place of an earlier one; gives its key. */
export async function keepFile(bytes: Uint8Array<ArrayBuffer>, { name, type, customId, download = false }: { name: string; type: string; customId: string; download?: boolean }): Promise<string> {
  await api().deleteFiles(customId, { keyType: "customId" });
  const { data, error } = await api().uploadFiles(new UTFile([bytes], name, { type, customId }), { acl: "private", contentDisposition: download ? "attachment" : "inline" });
  if (error) throw new Error(`The file service did not take a file: ${error.message}`);
  return data.key;
}

/** Deletes a file; one that is gone already is fine. */
export async function dropFile(key: string): Promise<void> {
  await api().deleteFiles(key);
}

/** The same, by the id of ours that the file carries. */
export async function dropOwn(customId: string): Promise<void> {
  await api().deleteFiles(customId, { keyType: "customId" });
}
