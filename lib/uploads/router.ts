import "server-only";
import { createRouteHandler, createUploadthing, UploadThingError, UTFiles, type FileRouter } from "uploadthing/server";
import { z } from "zod";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { fileIdOf } from "./file-ids";
import { serviceSettings } from "./settings";

type Slot = "proof" | "original";
type Offered = { type: string; size: number };
type Files = readonly { name: string; size: number; type: string; lastModified?: number | undefined }[];

/** What the routes ask of the application: may this person send this file now (and under which name is it stored), and note that it arrived. */
export type UploadGround<Who> = {
  allow: (who: Who, photoId: string, slot: Slot, file: Offered) => Promise<{ name: string }>;
  arrived: (photoId: string, slot: Slot, file: { key: string }) => Promise<{ stored: boolean }>;
};

/** A refusal of ours in the library's form; its words reach the phone. */
function refusal(error: unknown): UploadThingError {
  if (!(error instanceof AppError)) {
    console.error("unexpected", error);
    return new UploadThingError({ code: "INTERNAL_SERVER_ERROR", message: "That did not go through. Nothing was saved." });
  }
  return new UploadThingError({ code: error.code === "not_found" ? "NOT_FOUND" : "BAD_REQUEST", message: error.message });
}

/** The two routes on which phones send files straight to the file service. Both are private; an original is always handed out as a download. */
export function uploadRouter<Who>(ground: UploadGround<Who>, whoAsks: (request: Request) => Who) {
  const f = createUploadthing();
  const photoIdInput = z.strictObject({ photoId: z.string().regex(/^pho_[0-9a-f]{28}$/) });

  const middlewareOf = (slot: Slot) => async ({ req, input, files }: { req: Request; input: { photoId: string }; files: Files }) => {
    const [file] = files;
    if (!file || files.length > 1) throw new UploadThingError({ code: "BAD_REQUEST", message: "One file at a time." });
    const { name } = await ground.allow(whoAsks(req), input.photoId, slot, file).catch((error: unknown) => {
      throw refusal(error);
    });
    return { photoId: input.photoId, [UTFiles]: [{ ...file, name, customId: fileIdOf(input.photoId, slot) }] };
  };

  // The library keeps a failure in here to itself and answers that all is well; the round of the worker then finds the file.
  const completeOf = (slot: Slot) => async ({ metadata, file }: { metadata: { photoId: string }; file: { key: string } }) => {
    try {
      return await ground.arrived(metadata.photoId, slot, { key: file.key });
    } catch (error) {
      console.error("upload not noted", metadata.photoId, slot, error);
      throw error;
    }
  };

  const picture = { maxFileSize: "32MB", maxFileCount: 1, acl: "private", contentDisposition: "attachment" } as const;
  return {
    proof: f({ "image/jpeg": { maxFileSize: "1MB", maxFileCount: 1, acl: "private", contentDisposition: "inline" } }, { awaitServerData: true })
      .input(photoIdInput).middleware(middlewareOf("proof")).onUploadComplete(completeOf("proof")),
    original: f({ "image/jpeg": picture, "image/png": picture, "image/webp": picture }, { awaitServerData: true })
      .input(photoIdInput).middleware(middlewareOf("original")).onUploadComplete(completeOf("original")),
  } satisfies FileRouter;
}

/** The routes as the page's side of the library knows them. */
export type UploadRouter = ReturnType<typeof uploadRouter<unknown>>;

/** The door for the library's own requests: a page asking for an address to send to, and the service reporting an arrival under its signature. `who` is null for the latter. */
export function uploadDoor<Who>(ground: UploadGround<Who>, address: string): (request: Request, who: Who | null) => Promise<Response> {
  // The library runs requests in turns of its own, in which the framework's "current request" may be another's. So who asks is tied to the request itself.
  const asking = new WeakMap<Request, Who>();
  const whoAsks = (request: Request) => {
    const who = asking.get(request);
    if (!who) throw new AppError("signed_out", "Sign in to continue.");
    return who;
  };
  let handle: ((request: Request) => Promise<Response>) | undefined;
  return (request, who) => {
    const callbackUrl = env().UPLOADTHING_CALLBACK_URL ?? `${env().APP_URL}${address}`;
    handle ??= createRouteHandler({ router: uploadRouter(ground, whoAsks), config: { ...serviceSettings(), callbackUrl, isDev: false } });
    if (who) asking.set(request, who);
    return handle(request);
  };
}
