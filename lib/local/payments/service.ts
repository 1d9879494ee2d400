import { openFaults } from "../faults";
import { type Exchange, listen, readJson, readText, Refusal, type Running, sendJson } from "../http";
import { serveApi } from "./api";
import { ApiError } from "./api-error";
import { type Books, newestEvents, openBooks, type SessionRecord } from "./books";
import { Deliveries, RETRY_DELAYS_MS } from "./deliveries";
import { decline, pay } from "./money";
import { sendCheckout, sendClosed, sendUnknown } from "./pages";
import { expireSession } from "./sessions";

/** What the payment service can do wrong on order. */
export const PAYMENT_FAULTS = ["webhook-never", "webhook-late", "webhook-twice", "webhook-out-of-order", "api-down", "api-slow", "cut-response"] as const;

export type PaymentOptions = {
  port: number;
  folder: string;
  secretKey: string;
  webhookSecret: string;
  webhookUrl: string;
  retryDelaysMs?: readonly number[];
  now?: () => number;
};

type Desk = { books: Books; deliveries: Deliveries; now(): number };

const BY_HAND = { id: null, idempotency_key: null };
const EXPIRY_LOOK_MS = 1000;

/** The payment stand-in: as much of the API behind the `stripe` package as a checkout needs, its page, and signed webhooks. */
export async function startPaymentService(options: PaymentOptions): Promise<Running> {
  const { secretKey, webhookSecret, webhookUrl, now = Date.now, retryDelaysMs = RETRY_DELAYS_MS } = options;
  const books = openBooks(options.folder);
  const faults = openFaults(PAYMENT_FAULTS);
  const deliveries = new Deliveries({ books, faults, webhookUrl, webhookSecret, retryDelaysMs, now });
  const desk = { books, deliveries, now };
  let ownUrl = "";
  const api = { ...desk, faults, secretKey, pageOf: (id: string) => `${ownUrl}/pay/${id}` };
  const clock = setInterval(() => endOverdue(desk), EXPIRY_LOOK_MS).unref();
  const stop = () => {
    clearInterval(clock);
    deliveries.close();
  };
  const running = await listen(options.port, async (exchange) => {
    endOverdue(desk);
    if (exchange.url.pathname.startsWith("/v1/")) return serveApi(api, exchange);
    if (!(await faults.serve(exchange))) await route(desk, exchange);
  }).catch((error: unknown) => {
    stop();
    throw error;
  });
  ownUrl = running.url;
  return {
    ...running,
    async close() {
      stop();
      await running.close();
    },
  };
}

async function route(desk: Desk, exchange: Exchange): Promise<void> {
  const { request, response, url } = exchange;
  const [first, id = ""] = url.pathname.split("/").slice(1);
  if (first === "pay") return checkout(desk, exchange, desk.books.sessions.get(id));
  if (first === "events" && request.method === "GET") {
    return sendJson(response, 200, newestEvents(desk.books).map(({ object, state, attempts }) => ({ ...object, state, attempts })));
  }
  if (request.method !== "POST") throw new Refusal(404, "Not found");
  if (first === "expire") return expireByHand(desk, exchange, id);
  if (first === "deliver") return deliverByHand(desk, exchange);
  throw new Refusal(404, "Not found");
}

/** Checkouts die when their time is up, whether or not anybody looks. */
function endOverdue(desk: Desk): void {
  for (const record of desk.books.sessions.all()) {
    if (record.object.status === "open" && record.object.expires_at * 1000 <= desk.now()) void end(desk, record);
  }
}

async function end({ books, deliveries }: Desk, record: SessionRecord): Promise<void> {
  const { object, scope } = expireSession(books, record);
  await deliveries.publish([{ type: "checkout.session.expired", object, scope }], BY_HAND);
}

async function checkout({ books, deliveries, now }: Desk, { request, response, url }: Exchange, record: SessionRecord | undefined): Promise<void> {
  if (!record) return sendUnknown(response);
  const { object } = record;
  const leave = (to: string) => void response.writeHead(303, { location: to, "cache-control": "no-store" }).end();
  const success = (object.success_url ?? "").replaceAll("{CHECKOUT_SESSION_ID}", object.id);
  if (request.method !== "POST") return object.status === "open" ? sendCheckout(response, record, url.searchParams.has("declined")) : sendClosed(response, record);
  const form = new URLSearchParams(await readText(request));
  // Read again: a second click may have been faster than the body of the first.
  const current = books.sessions.get(object.id) ?? record;
  if (current.object.status === "complete") return leave(success);
  if (current.object.status !== "open") return sendClosed(response, current);
  const [email, seconds] = [form.get("email") || null, Math.floor(now() / 1000)];
  if (form.get("action") === "decline") {
    await deliveries.publish(decline(books, current, email, seconds), BY_HAND);
    return leave(`/pay/${object.id}?declined=1`);
  }
  if (form.get("action") !== "pay") throw new Refusal(400, "action is pay or decline.");
  // The service, too, holds the payer back until the application was told, or for ten seconds.
  await deliveries.publish(pay(books, current, email, seconds), BY_HAND);
  leave(success);
}

async function expireByHand(desk: Desk, { response }: Exchange, id: string): Promise<void> {
  const record = desk.books.sessions.get(id);
  if (!record) throw new Refusal(404, "No such checkout session.");
  await end(desk, record).catch((error: unknown) => {
    throw error instanceof ApiError ? new Refusal(error.status, error.message) : error;
  });
  sendJson(response, 200, desk.books.sessions.get(id)?.object);
}

async function deliverByHand({ books, deliveries }: Desk, { request, response }: Exchange): Promise<void> {
  const { eventId, timestamp } = await readJson(request);
  const record = typeof eventId === "string" ? books.events.get(eventId) : undefined;
  if (!record) throw new Refusal(404, "No such event.");
  if (timestamp !== undefined && !Number.isInteger(timestamp)) throw new Refusal(400, "timestamp is in whole seconds.");
  sendJson(response, 200, await deliveries.deliver(record, typeof timestamp === "number" ? timestamp : undefined));
}
