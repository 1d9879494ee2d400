import "server-only";
import { AppError } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import { requireViewer } from "@/lib/viewer/viewer";
import { problem } from "./problem";

/** Every path parameter of ours is an id; anything else is simply not found. */
const ID = /^[a-z]{3}_[0-9a-f]{28}$/;

/** The door for a read: who is asking, run, then turn refusals into problem documents. */
export function route<P extends Record<string, string>>(run: (viewer: Viewer, params: P, request: Request) => Promise<unknown>) {
  return async (request: Request, context: { params: Promise<P> }): Promise<Response> => {
    try {
      const viewer = await requireViewer();
      // A door without path parameters is given none at all.
      const params = (await context.params) ?? ({} as P);
      if (Object.values(params).some((value) => !ID.test(value))) throw new AppError("not_found", "No such thing.");
      const body = await run(viewer, params, request);
      return body instanceof Response ? body : Response.json(body, { headers: { "cache-control": "private, no-store" } });
    } catch (error) {
      return problem(error);
    }
  };
}
