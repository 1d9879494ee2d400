import "server-only";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { Viewer } from "@/lib/viewer/types";
import { requireViewer } from "@/lib/viewer/viewer";
import { readBytes } from "./body";
import { requireOurOrigin } from "./command";
import { tell } from "./problem";

/** The door that the upload library talks to: our own page asking where to send a file, or the file service reporting one under a signature that the library checks. */
export function sending(door: (request: Request, viewer: Viewer | null) => Promise<Response>) {
  return async (request: Request): Promise<Response> => {
    try {
      const viewer = request.headers.has("uploadthing-hook") ? null : await whoSends(request);
      const body = Buffer.from(await readBytes(request));
      return await door(new Request(request.url, { method: "POST", headers: request.headers, body }), viewer);
    } catch (error) {
      // The library's page side shows `message`.
      const { title: message, status } = tell(error);
      return Response.json({ message }, { status, headers: { "cache-control": "no-store" } });
    }
  };
}

async function whoSends(request: Request): Promise<Viewer> {
  requireOurOrigin(request.headers);
  const viewer = await requireViewer();
  await unsafeCountTry("upload-account", viewer.userId, new Date());
  return viewer;
}
