import { createHash, randomUUID } from "node:crypto";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer, type IncomingMessage } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll } from "vitest";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { photos } from "@/db/schema";
import { announcePhoto } from "@/lib/evidence/commands";
import { unsafeStoreFile } from "@/lib/evidence/commands/arrivals";
import { requireSending } from "@/lib/evidence/queries";
import { sizeOf, sniffType } from "@/lib/evidence/sniff";
import type { Slot } from "@/lib/evidence/types";
import type { PhotoType } from "@/lib/evidence/vocabulary";
import { startUploadService } from "@/lib/local/uploads/service";
import { uploadDoor } from "@/lib/uploads/router";
import type { Viewer } from "@/lib/viewer/types";
import { TEST_ENVIRONMENT } from "../../support/environment";
import { anAttempt, viewerOf } from "../../support/factories";
import { aPicture } from "../../support/pictures";

const ADDRESS = "/api/uploadthing";

/** The file service and, in front of it, the application's own door, on ports of their own. Who asks is named by a header here, since signing in is not what is tested. */
export async function openYard() {
  const folder = mkdtempSync(join(tmpdir(), "towfolio-yard-"));
  const service = await startUploadService({ port: 0, folder, token: TEST_ENVIRONMENT.UPLOADTHING_TOKEN ?? "" });
  let failing = false;
  const arrived = async (photoId: string, slot: Slot, file: { key: string }) => {
    if (failing) {
      failing = false;
      throw new Error("The database is away.");
    }
    return unsafeStoreFile(photoId, slot, file, new Date());
  };
  const door = uploadDoor<Viewer>({ allow: requireSending, arrived }, ADDRESS);
  const server = createServer((request, response) => {
    void answer(request, door).then(async (given) => response.writeHead(given.status, Object.fromEntries(given.headers)).end(await given.text()));
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}${ADDRESS}`;
  afterAll(async () => {
    server.closeAllConnections();
    server.close();
    await service.close();
    rmSync(folder, { recursive: true, force: true });
  });
  const environment = {
    UPLOADTHING_INGEST_URL: service.url, UPLOADTHING_API_URL: service.url, UPLOADTHING_CALLBACK_URL: url,
    UPLOADTHING_UFS_HOST: `localhost:${service.port}`, UPLOADTHING_UFS_APP_ID_LOCATION: "path",
  };
  const fault = async (given: { kind: string; times?: number; afterBytes?: number }) => {
    await fetch(`${service.url}/faults`, { method: "POST", headers: { "content-type": "application/json" }, body: JSON.stringify(given) });
    // The service hangs up idle lines when a fault is ordered; the client has to notice before it takes one up again.
    await new Promise((resolve) => setTimeout(resolve, 50));
  };
  return { url, serviceUrl: service.url, environment, fault, failNextReport: () => void (failing = true) };
}

export type Yard = Awaited<ReturnType<typeof openYard>>;

async function answer(request: IncomingMessage, door: (request: Request, who: Viewer | null) => Promise<Response>): Promise<Response> {
  const parts: Buffer[] = [];
  for await (const part of request as AsyncIterable<Buffer>) parts.push(part);
  const headers = new Headers(Object.entries(request.headers).map(([name, value]) => [name, String(value)] as [string, string]));
  const userId = headers.get("x-test-user");
  const who = userId ? await viewerOf(userId) : null;
  return door(new Request(`http://${request.headers.host}${request.url}`, { method: request.method ?? "GET", headers, body: Buffer.concat(parts) }), who);
}

export const sha256Of = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");

/** What a phone would announce of these bytes. */
export function announcement(moveId: string, bytes: Buffer, more: { clientId?: string; sha256?: string; type?: PhotoType } = {}) {
  const sniffed = sniffType(bytes);
  const size = sizeOf(bytes) ?? { widthPx: 640, heightPx: 480 };
  const type = sniffed === null || sniffed === "image/heic" ? "image/jpeg" : sniffed;
  return { moveId, clientId: randomUUID(), name: "IMG_0041.jpg", type, sizeBytes: bytes.length, sha256: sha256Of(bytes), ...size, ...more };
}

/** Announces a photo as a phone does; gives its id. */
export async function announce(viewer: Viewer, moveId: string, bytes: Buffer, more: Parameters<typeof announcement>[2] = {}): Promise<string> {
  return (await announcePhoto(viewer, announcement(moveId, bytes, more), anAttempt())).photo.id;
}

/** Asks the application where to send a file, as the page's library does. */
export function askAddress(yard: Yard, viewer: Viewer, photoId: string, slot: Slot, file: File): Promise<Response> {
  const body = JSON.stringify({ files: [{ name: file.name, size: file.size, type: file.type, lastModified: 1 }], input: { photoId } });
  return fetch(`${yard.url}?actionType=upload&slug=${slot}`, { method: "POST", headers: { "content-type": "application/json", "x-uploadthing-version": "7.7.4", "x-test-user": viewer.userId }, body });
}

/** Sends a file from where the service says it stopped, as the page's library does. */
export async function sendTo(address: string, file: File): Promise<Response> {
  const start = Number((await fetch(address, { method: "HEAD" })).headers.get("x-ut-range-start") ?? 0);
  const form = new FormData();
  form.append("file", start > 0 ? file.slice(start) : file, file.name);
  return fetch(address, { method: "PUT", headers: { range: `bytes=${start}-` }, body: form });
}

export const fileOf = (bytes: Buffer<ArrayBuffer>, type = "image/jpeg") => new File([bytes], "IMG_0041.jpg", { type });

/** Sends one file of a photo; gives what the library would hand to the page. */
export async function sendSlot(yard: Yard, viewer: Viewer, photoId: string, slot: Slot, bytes: Buffer<ArrayBuffer>, type = "image/jpeg"): Promise<{ key: string; answer: Record<string, unknown> }> {
  const file = fileOf(bytes, type);
  const asked = await askAddress(yard, viewer, photoId, slot, file);
  if (!asked.ok) throw new Error(await asked.text());
  const [place] = (await asked.json()) as [{ url: string; key: string }];
  return { key: place.key, answer: (await (await sendTo(place.url, file)).json()) as Record<string, unknown> };
}

/** A proof as a phone makes one. */
export const aProof = () => aPicture({ width: 400, height: 300, seed: 9 });

export async function photoRow(photoId: string) {
  const [row] = await db().select().from(photos).where(eq(photos.id, photoId));
  if (!row) throw new Error("no such photo");
  return row;
}
