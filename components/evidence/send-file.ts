import { generateReactHelpers } from "@uploadthing/react";
import { routes } from "@/lib/routes";
import type { UploadRouter } from "@/lib/uploads/router";
import { SendRefused, type SendOrder } from "./send-order";

/** The file service takes a file at one address for an hour; a few minutes are left for the last piece. */
const ADDRESS_GOOD_MS = 50 * 60_000;

const OUR_CODES = new Set(["BAD_REQUEST", "NOT_FOUND", "FORBIDDEN", "INTERNAL_SERVER_ERROR"]);

/** Sends one file through the upload library. True when the server has noted it, false when it was told nothing yet or did not want it. */
export async function sendFile(order: SendOrder): Promise<boolean> {
  const { slot, photoId, file, signal, onPercent } = order;
  const helpers = generateReactHelpers<UploadRouter>({ url: routes.api.uploads(), fetch: (input, init) => fetchFor(order, input, init) });
  try {
    const [sent] = await helpers.uploadFiles(slot, { files: [file], input: { photoId }, signal, onUploadProgress: ({ progress }) => onPercent(Math.min(99, Math.floor(progress))) });
    return sent?.serverData?.stored === true;
  } catch (error) {
    if (signal.aborted || !(error instanceof Error)) throw error;
    const code = "code" in error ? String(error.code) : "";
    const answered = OUR_CODES.has(code) || /^XHR failed [1-5]/.test(error.message) || (code === "UPLOAD_FAILED" && "data" in error && error.data !== undefined && error.data !== null);
    if (!answered) throw error;
    order.onAddress(null);
    throw OUR_CODES.has(code) ? new SendRefused(error.message, { cause: error }) : error;
  }
}

/** Gives the library the address of an earlier try, so that it asks the service how much is there and sends the rest. */
async function fetchFor({ slot, address, onAddress }: SendOrder, input: RequestInfo | URL, init?: RequestInit): Promise<Response> {
  const url = new URL(input instanceof Request ? input.url : input, window.location.href);
  const asksForAddress = url.pathname === routes.api.uploads() && url.searchParams.get("slug") === slot;
  if (!asksForAddress) return fetch(input, init);
  if (address && Date.now() - address.at < ADDRESS_GOOD_MS) return new Response(address.answer, { headers: { "content-type": "application/json" } });
  const answer = await fetch(input, init);
  if (answer.ok) onAddress({ answer: await answer.clone().text(), at: Date.now() });
  return answer;
}
