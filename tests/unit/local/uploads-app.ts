import { createServer, type IncomingMessage } from "node:http";
import type { AddressInfo } from "node:net";
import { createRouteHandler, createUploadthing, UTApi, UTFiles, type FileRouter } from "uploadthing/server";
import { startUploadService } from "../../../lib/local/uploads/service";
import { aFolder, afterTest, running } from "./support";

export const APP_ID = "sampleapp";
export const API_KEY = "sk_live_sample";
export const TOKEN = Buffer.from(JSON.stringify({ apiKey: API_KEY, appId: APP_ID, regions: ["local"] })).toString("base64");

/** What the application under test saw. */
type Seen = { completed: { key: string; customId: string | null; name: string; size: number; fileHash: string; ufsUrl: string; metadata: unknown }[]; refused: string[] };

/** The service with an application in front of it that runs the library's own route handler. */
export async function aService(given: { folder?: string; port?: number; isDev?: boolean } = {}) {
  const folder = given.folder ?? aFolder();
  const service = await running(startUploadService({ port: given.port ?? 0, folder, token: TOKEN }));
  const utapi = new UTApi({ token: TOKEN, apiUrl: service.url, ingestUrl: service.url, ufsHost: `localhost:${service.port}`, ufsAppIdLocation: "path", logLevel: "None" });
  const app = await anApp(service.url, given.isDev ?? false);
  return { ...service, folder, utapi, app };
}

async function anApp(serviceUrl: string, isDev: boolean) {
  const seen: Seen = { completed: [], refused: [] };
  const f = createUploadthing();
  const router = {
    photo: f({ image: { maxFileSize: "32MB", acl: "private" } })
      .middleware(({ files }) => ({ by: "Mae Alder", [UTFiles]: files.map((file) => ({ ...file, customId: customIdOf(file.name) })) }))
      .onUploadError(({ fileKey }) => void seen.refused.push(fileKey))
      .onUploadComplete(({ file, metadata }) => {
        const { key, customId, name, size, fileHash, ufsUrl } = file;
        seen.completed.push({ key, customId, name, size, fileHash, ufsUrl, metadata });
        if (name === "broken.jpg") throw new Error("This application fails here.");
        return { stored: name };
      }),
  } satisfies FileRouter;
  const handle = createRouteHandler({ router, config: { token: TOKEN, ingestUrl: serviceUrl, isDev, logLevel: "None" } });
  const server = createServer((request, response) => {
    void toWeb(request).then(handle).then(async (answer) => {
      response.writeHead(answer.status, Object.fromEntries(answer.headers)).end(await answer.text());
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  afterTest(() => (server.closeAllConnections(), server.close()));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api/uploadthing`;
  return { seen, url };
}

/** A name like "id=abc.jpg" asks for that own id. */
const customIdOf = (name: string) => /^id=(\w+)\./.exec(name)?.[1];

async function toWeb(request: IncomingMessage): Promise<Request> {
  const chunks: Buffer[] = [];
  for await (const chunk of request as AsyncIterable<Buffer>) chunks.push(chunk);
  const headers = new Headers(Object.entries(request.headers).map(([name, value]) => [name, String(value)] as [string, string]));
  const body = chunks.length ? Buffer.concat(chunks) : undefined;
  return new Request(`http://${request.headers.host}${request.url}`, { method: request.method ?? "GET", headers, ...(body ? { body } : {}) });
}

/** Asks the application for a signed address, as its page does. */
export async function presign(appUrl: string, file: File): Promise<{ url: string; key: string }> {
  const body = JSON.stringify({ files: [{ name: file.name, size: file.size, type: file.type, lastModified: 1 }] });
  const headers = { "content-type": "application/json", "x-uploadthing-version": "7.7.4" };
  const answer = await fetch(`${appUrl}?actionType=upload&slug=photo`, { method: "POST", headers, body });
  if (!answer.ok) throw new Error(await answer.text());
  const [presigned] = (await answer.json()) as { url: string; key: string }[];
  if (!presigned) throw new Error("No address came.");
  return presigned;
}

/** Sends a file from where the service says it stopped, as the page's library does. */
export async function send(url: string, file: Blob, name = "photo.jpg"): Promise<Response> {
  const head = await fetch(url, { method: "HEAD" });
  return put(url, file, Number(head.headers.get("x-ut-range-start") ?? 0), name);
}

/** One PUT of the rest of a file. */
export function put(url: string, file: Blob, start = 0, name = "photo.jpg"): Promise<Response> {
  return fetch(url, { method: "PUT", headers: { range: `bytes=${start}-` }, body: formOf(file, start, name) });
}

export function formOf(file: Blob, start = 0, name = "photo.jpg"): FormData {
  const form = new FormData();
  if (start > 0) form.append("file", file.slice(start));
  else form.append("file", file, name);
  return form;
}

/** A file with content that differs at every place. */
export function aPhoto(size = 300_000, name = "photo.jpg", type = "image/jpeg"): File {
  const bytes = new Uint8Array(size);
  for (let at = 0; at < size; at++) bytes[at] = (at * 31 + (at >> 8)) & 255;
  return new File([bytes], name, { type });
}

export const bytesOf = async (from: Blob | Response) => Buffer.from(await from.arrayBuffer());
