import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import Stripe from "stripe";
import { type PaymentOptions, startPaymentService } from "../../../lib/local/payments/service";
import { readText } from "../../../lib/local/http";
import { aFolder, afterTest, postJson, running } from "./support";

export const SECRET_KEY = "sk_test_sample_1234";
export const WEBHOOK_SECRET = "whsec_sample";

/** The service with an application behind it that checks each webhook by the library's own means. */
export async function aService(given: Partial<PaymentOptions> = {}) {
  const app = await anApp();
  const folder = given.folder ?? aFolder();
  const options = { port: 0, folder, secretKey: SECRET_KEY, webhookSecret: WEBHOOK_SECRET, webhookUrl: app.url, retryDelaysMs: [20, 40], ...given };
  const service = await running(startPaymentService(options));
  const fault = (order: object) => postJson(`${service.url}/faults`, order);
  return { ...service, folder, app, fault, stripe: aClient(service.port) };
}

/** The real library, pointed at the stand-in. */
export const aClient = (port: number, config: object = {}, key = SECRET_KEY) =>
  new Stripe(key, { host: "127.0.0.1", port, protocol: "http", maxNetworkRetries: 0, timeout: 5000, telemetry: false, ...config });

async function anApp() {
  const seen: Stripe.Event[] = [];
  const forged: string[] = [];
  const answers: number[] = [];
  const server = createServer((request, response) => {
    void readText(request).then((body) => {
      try {
        seen.push(Stripe.webhooks.constructEvent(body, String(request.headers["stripe-signature"]), WEBHOOK_SECRET));
      } catch (error) {
        forged.push(String(error));
      }
      response.writeHead(answers.shift() ?? 200).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  afterTest(() => (server.closeAllConnections(), server.close()));
  const types = () => seen.map((event) => event.type);
  return { url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/api/stripe/webhook`, seen, forged, answers, types };
}

/** A checkout for an inspection fee of 450 dollars. */
export const aFee = (changes: object = {}): Stripe.Checkout.SessionCreateParams => ({
  mode: "payment",
  line_items: [{ quantity: 1, price_data: { currency: "usd", unit_amount: 45_000, product_data: { name: "Inspection, ZVRX 2783" } } }],
  success_url: "http://localhost:3000/fees?paid={CHECKOUT_SESSION_ID}",
  cancel_url: "http://localhost:3000/fees",
  client_reference_id: "fee_1",
  customer_email: "payer@example.test",
  metadata: { moveId: "mov_1" },
  ...changes,
});

/** Presses one of the buttons of the page. */
export const press = (pageUrl: string | null, action: "pay" | "decline") =>
  fetch(pageUrl ?? "", { method: "POST", body: new URLSearchParams({ action }), redirect: "manual" });

/** The error that the library made of an answer. */
export async function refusal(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  const error = await call.then(() => undefined, (thrown: unknown) => thrown);
  if (error instanceof Stripe.errors.StripeError) return error;
  throw new Error(`Not refused: ${String(error)}`);
}
