import { readBytes } from "@/lib/entry/body";
import { problem } from "@/lib/entry/problem";
import { unsafeTakeEvent } from "@/lib/fees/commands/notices";
import { readNotice } from "@/lib/payments/stripe";

const MOST_BYTES = 256 * 1024;

/** The one door without a viewer: the signature over the very bytes is what speaks for the caller. Anything but 2xx is sent again by the payment service. */
export async function POST(request: Request): Promise<Response> {
  const body = await readBytes(request, MOST_BYTES).catch(() => null);
  const notice = body && readNotice(body, request.headers.get("stripe-signature"));
  if (!notice) {
    console.warn("payment notice refused: unsigned, too old, changed or too large");
    return Response.json({ received: false }, { status: 400 });
  }
  try {
    await unsafeTakeEvent(notice, new Date());
    return Response.json({ received: true });
  } catch (error) {
    return problem(error);
  }
}
