import Stripe from "stripe";
import { describe, expect, it } from "vitest";
import { amountText } from "../../../lib/local/payments/pages";
import { postJson, until } from "./support";
import { aClient, aFee, aService, press, refusal } from "./payments-app";

const price = (changes: object) => ({ line_items: [{ quantity: 1, price_data: { currency: "usd", unit_amount: 45_000, product_data: { name: "Fee" }, ...changes } }] });
const split = (payment_intent_data: object) => ({ payment_intent_data });
const nowSeconds = () => Math.floor(Date.now() / 1000);

describe("a checkout", () => {
  it("is opened, paid on its page, reported and seen as paid", async () => {
    const { stripe, app } = await aService();
    const opened = await stripe.checkout.sessions.create(aFee({ payment_intent_data: { metadata: { feeId: "fee_1" }, description: "Fee" } }));
    expect(opened).toMatchObject({ status: "open", payment_status: "unpaid", amount_total: 45_000, currency: "usd", client_reference_id: "fee_1", payment_intent: null });
    expect(await (await fetch(opened.url ?? "")).text()).toContain("no money moves");
    const answer = await press(opened.url, "pay");
    expect([answer.status, answer.headers.get("location")]).toEqual([303, `http://localhost:3000/fees?paid=${opened.id}`]);
    expect(app.types()).toEqual(["payment_intent.succeeded", "checkout.session.completed"]);
    expect(app.seen[1]).toMatchObject({ api_version: Stripe.API_VERSION, livemode: false, data: { object: { id: opened.id, payment_status: "paid", metadata: { moveId: "mov_1" } } } });
    const paid = await stripe.checkout.sessions.retrieve(opened.id, { expand: ["payment_intent.latest_charge", "line_items"] });
    expect(paid).toMatchObject({
      status: "complete", payment_status: "paid", url: null, customer_details: { email: "payer@example.test" },
      line_items: { data: [{ description: "Inspection, ZVRX 2783", amount_total: 45_000, price: { unit_amount: 45_000 } }] },
      payment_intent: { status: "succeeded", amount_received: 45_000, metadata: { feeId: "fee_1" }, latest_charge: { paid: true, amount: 45_000 } },
    });
    expect(app.forged).toEqual([]);
  });

  it("is paid once, however often the button is pressed", async () => {
    const { stripe, app } = await aService();
    const { url } = await stripe.checkout.sessions.create(aFee());
    const answers = await Promise.all([press(url, "pay"), press(url, "pay"), press(url, "pay")]);
    expect(answers.map((answer) => answer.status)).toEqual([303, 303, 303]);
    expect(app.types()).toHaveLength(2);
  });

  it("stays open after a declined card", async () => {
    const { stripe, app } = await aService();
    const { id, url } = await stripe.checkout.sessions.create(aFee());
    expect((await press(url, "decline")).headers.get("location")).toBe(`/pay/${id}?declined=1`);
    expect(await (await fetch(`${url}?declined=1`)).text()).toContain("declined");
    expect(app.types()).toEqual(["payment_intent.payment_failed"]);
    const { payment_intent: intent } = await stripe.checkout.sessions.retrieve(id);
    expect(await stripe.paymentIntents.retrieve(String(intent))).toMatchObject({ status: "requires_payment_method", last_payment_error: { code: "card_declined" } });
    await press(url, "pay");
    expect((await stripe.paymentIntents.retrieve(String(intent))).status).toBe("succeeded");
  });

  it("ends by the API, by hand and by the clock, and then takes no payment", async () => {
    let now = Date.now();
    const { stripe, app, url: serviceUrl } = await aService({ now: () => now });
    const [one, two, three] = [await stripe.checkout.sessions.create(aFee()), await stripe.checkout.sessions.create(aFee()), await stripe.checkout.sessions.create(aFee())];
    expect((await stripe.checkout.sessions.expire(one.id)).status).toBe("expired");
    expect((await fetch(`${serviceUrl}/expire/${two.id}`, { method: "POST" })).status).toBe(200);
    expect((await fetch(`${serviceUrl}/expire/${two.id}`, { method: "POST" })).status).toBe(400);
    now += 24 * 3600 * 1000 + 1000;
    expect((await press(three.url, "pay")).status).toBe(410);
    expect((await stripe.checkout.sessions.retrieve(three.id)).status).toBe("expired");
    await until(() => app.types().filter((type) => type === "checkout.session.expired").length === 3);
    expect((await refusal(stripe.checkout.sessions.expire(one.id))).message).toContain("status of expired");
  });

  it("is listed by payment intent", async () => {
    const { stripe } = await aService();
    const { id, url } = await stripe.checkout.sessions.create(aFee());
    await stripe.checkout.sessions.create(aFee());
    await press(url, "pay");
    const { payment_intent: intent } = await stripe.checkout.sessions.retrieve(id);
    expect((await stripe.checkout.sessions.list({ payment_intent: String(intent) })).data.map((one) => one.id)).toEqual([id]);
    expect((await stripe.checkout.sessions.list({ status: "open" })).data).toHaveLength(1);
    expect((await stripe.checkout.sessions.listLineItems(id)).data).toHaveLength(1);
  });

  it("writes amounts as their currency does", () => {
    expect([amountText(45_000, "usd"), amountText(500, "jpy")]).toEqual(["$450.00", "¥500"]);
  });
});

describe("what opening a checkout checks", () => {
  it.each<[string, object, string | undefined, string]>([
    ["no success_url", { success_url: undefined }, "parameter_missing", "success_url"],
    ["no mode", { mode: undefined }, "parameter_missing", "mode"],
    ["no lines", { line_items: undefined }, "parameter_missing", "line_items"],
    ["a broken amount", price({ unit_amount: 10.5 }), "parameter_invalid_integer", "line_items[0][price_data][unit_amount]"],
    ["a negative amount", price({ unit_amount: -5 }), "parameter_invalid_integer", "line_items[0][price_data][unit_amount]"],
    ["too small a total", price({ unit_amount: 49 }), "amount_too_small", "line_items"],
    ["an unknown parameter", { colour: "red" }, "parameter_unknown", "colour"],
    ["an unknown parameter inside", price({ size: 1 }), "parameter_unknown", "line_items[0][price_data][size]"],
    ["an unknown currency", price({ currency: "zzz" }), undefined, "line_items[0][price_data][currency]"],
    ["a product without a name", price({ product_data: { description: "x" } }), "parameter_missing", "line_items[0][price_data][product_data][name]"],
    ["an address without a scheme", { success_url: "localhost" }, "url_invalid", "success_url"],
    ["a broken e-mail", { customer_email: "nobody" }, "email_invalid", "customer_email"],
    ["an end in 29 minutes", { expires_at: nowSeconds() + 1740 }, undefined, "expires_at"],
    ["an end in 25 hours", { expires_at: nowSeconds() + 90_000 }, undefined, "expires_at"],
    ["too long a note", { metadata: { note: "x".repeat(501) } }, undefined, "metadata[note]"],
    ["a part not played", { customer: "cus_1" }, undefined, "customer"],
    ["an unknown receiver", split({ transfer_data: { destination: "acct_none" } }), "resource_missing", "payment_intent_data[transfer_data][destination]"],
    ["a fee without a receiver", split({ application_fee_amount: 5 }), undefined, "payment_intent_data[application_fee_amount]"],
  ])("%s", async (_name, changes, code, param) => {
    const { stripe } = await aService();
    const error = await refusal(stripe.checkout.sessions.create(aFee(changes)));
    expect(error).toMatchObject({ type: "StripeInvalidRequestError", statusCode: 400, param, ...(code ? { code } : {}) });
    expect(error.requestId).toMatch(/^req_/);
  });

  it("splits a payment with a connected account", async () => {
    const { stripe } = await aService();
    const account = await stripe.accounts.create({ type: "express", email: "carrier@example.test", capabilities: { transfers: { requested: true } } });
    expect(await stripe.accounts.retrieve(account.id)).toMatchObject({ charges_enabled: true, capabilities: { transfers: "active" } });
    const data = { application_fee_amount: 1000, transfer_data: { destination: account.id } };
    expect((await refusal(stripe.checkout.sessions.create(aFee(split({ ...data, application_fee_amount: 45_001 }))))).param).toBe("payment_intent_data[application_fee_amount]");
    const { id, url } = await stripe.checkout.sessions.create(aFee(split(data)));
    await press(url, "pay");
    expect(await stripe.checkout.sessions.retrieve(id, { expand: ["payment_intent"] })).toMatchObject({ payment_intent: { application_fee_amount: 1000, transfer_data: { destination: account.id } } });
  });

  it("keeps what is done for a connected account apart", async () => {
    const { stripe, app } = await aService();
    const { id: stripeAccount } = await stripe.accounts.create({});
    const { id, url } = await stripe.checkout.sessions.create(aFee(split({ application_fee_amount: 5 })), { stripeAccount });
    expect((await refusal(stripe.checkout.sessions.retrieve(id))).code).toBe("resource_missing");
    await press(url, "pay");
    expect(app.seen.map((event) => event.account)).toEqual([stripeAccount, stripeAccount]);
    expect((await refusal(stripe.checkout.sessions.create(aFee(), { stripeAccount: "acct_none" }))).type).toBe("StripePermissionError");
  });
});

describe("keys", () => {
  it("refuses a wrong key and a missing one", async () => {
    const { port, url } = await aService();
    expect((await refusal(aClient(port, {}, "sk_test_wrong_9999").checkout.sessions.create(aFee()))).type).toBe("StripeAuthenticationError");
    const answer = await fetch(`${url}/v1/events`);
    expect([answer.status, (await answer.json()).error.type]).toEqual([401, "invalid_request_error"]);
  });

  it("repeats the answer to the same call, and refuses another call with the same idempotency key", async () => {
    const { stripe } = await aService();
    const once = { idempotencyKey: "fee_1:1" };
    const [first, second] = [await stripe.checkout.sessions.create(aFee(), once), await stripe.checkout.sessions.create(aFee(), once)];
    expect(second.id).toBe(first.id);
    expect(second.lastResponse.headers["idempotent-replayed"]).toBe("true");
    const other = await refusal(stripe.checkout.sessions.create(aFee({ client_reference_id: "fee_2" }), once));
    expect(other).toMatchObject({ type: "StripeIdempotencyError", statusCode: 400, rawType: "idempotency_error" });
    expect((await refusal(stripe.refunds.create({ charge: "ch_1" }, once))).type).toBe("StripeIdempotencyError");
  });

  it("keeps no answer to a call that failed its checks", async () => {
    const { stripe } = await aService();
    const once = { idempotencyKey: "fee_1:2" };
    await refusal(stripe.checkout.sessions.create(aFee({ customer_email: "x" }), once));
    expect((await stripe.checkout.sessions.create(aFee(), once)).status).toBe("open");
  });
});

describe("refunds", () => {
  const paid = async () => {
    const service = await aService();
    const { id, url } = await service.stripe.checkout.sessions.create(aFee());
    await press(url, "pay");
    const { payment_intent: intent } = await service.stripe.checkout.sessions.retrieve(id);
    return { ...service, intent: String(intent) };
  };

  it("in part and whole, never more than was paid", async () => {
    const { stripe, app, intent } = await paid();
    expect(await stripe.refunds.create({ payment_intent: intent, amount: 5000, reason: "requested_by_customer" })).toMatchObject({ status: "succeeded", amount: 5000 });
    expect((await refusal(stripe.refunds.create({ payment_intent: intent, amount: 40_001 }))).param).toBe("amount");
    expect((await stripe.refunds.create({ payment_intent: intent })).amount).toBe(40_000);
    expect((await refusal(stripe.refunds.create({ payment_intent: intent }))).code).toBe("charge_already_refunded");
    await until(() => app.types().filter((type) => type === "charge.refunded").length === 2);
    expect(app.seen.at(-1)).toMatchObject({ data: { object: { amount_refunded: 45_000, refunded: true } } });
    expect((await stripe.refunds.list({ payment_intent: intent })).data).toHaveLength(2);
  });

  it("not for what was not paid, not known, or not split", async () => {
    const { stripe, intent } = await paid();
    expect((await refusal(stripe.refunds.create({ payment_intent: "pi_none" }))).code).toBe("resource_missing");
    expect((await refusal(stripe.refunds.create({}))).code).toBe("parameter_missing");
    expect((await refusal(stripe.refunds.create({ payment_intent: intent, reverse_transfer: true }))).param).toBe("reverse_transfer");
  });
});

describe("webhooks and events", () => {
  it("tries again until the application says yes, then stops", async () => {
    const { stripe, app, url: serviceUrl } = await aService();
    app.answers.push(500, 200, 404);
    const { url } = await stripe.checkout.sessions.create(aFee());
    await press(url, "pay");
    const events = () => fetch(`${serviceUrl}/events`).then((answer) => answer.json());
    await until(async () => (await events()).every((event: { state: string }) => event.state === "delivered"));
    expect((await events()).map((event: { attempts: { status: number }[] }) => event.attempts.map((one) => one.status))).toEqual([[200], [500, 404, 200]]);
  });

  it("gives up after its last try, and is sent again by hand", async () => {
    const { stripe, app, url: serviceUrl } = await aService();
    app.answers.push(500, 500, 500, 500, 500, 500);
    await press((await stripe.checkout.sessions.create(aFee())).url, "decline");
    const only = () => fetch(`${serviceUrl}/events`).then(async (answer) => (await answer.json())[0]);
    const event = await until(async () => ((await only()).state === "given-up" ? only() : null));
    expect(event.attempts).toHaveLength(3);
    app.answers.length = 0;
    expect(await (await postJson(`${serviceUrl}/deliver`, { eventId: event.id })).json()).toMatchObject({ status: 200 });
    expect((await only()).state).toBe("delivered");
    await postJson(`${serviceUrl}/deliver`, { eventId: event.id, timestamp: nowSeconds() - 400 });
    expect(app.forged.join()).toContain("tolerance");
  });

  it("lists and retrieves events", async () => {
    const { stripe } = await aService();
    await press((await stripe.checkout.sessions.create(aFee())).url, "pay");
    const { data } = await stripe.events.list({ types: ["checkout.session.completed", "payment_intent.succeeded"] });
    expect(data.map((event) => event.type)).toEqual(["checkout.session.completed", "payment_intent.succeeded"]);
    expect((await stripe.events.list({ limit: 1, starting_after: data[0]?.id ?? "" })).data[0]?.id).toBe(data[1]?.id);
    expect(await stripe.events.retrieve(data[0]?.id ?? "")).toMatchObject({ id: data[0]?.id });
    expect((await refusal(stripe.events.retrieve("evt_none"))).statusCode).toBe(404);
  });

  it("everything is still there after a restart, and what was not delivered is tried again", async () => {
    const first = await aService({ retryDelaysMs: [60_000] });
    const { id, url } = await first.stripe.checkout.sessions.create(aFee(), { idempotencyKey: "kept" });
    first.app.answers.push(500, 500);
    await press(url, "pay");
    await first.close();
    const second = await aService({ folder: first.folder });
    expect((await second.stripe.checkout.sessions.retrieve(id)).payment_status).toBe("paid");
    expect((await second.stripe.checkout.sessions.create(aFee(), { idempotencyKey: "kept" })).id).toBe(id);
    await until(() => second.app.seen.length === 2);
  });
});

describe("faults on order", () => {
  const paying = async (order: object) => {
    const service = await aService();
    await service.fault(order);
    const session = await service.stripe.checkout.sessions.create(aFee());
    await press(session.url, "pay");
    return { ...service, session };
  };

  it("webhook-never: paid, but nobody is told; the event can be read", async () => {
    const { app, stripe, session } = await paying({ kind: "webhook-never", times: 1 });
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(app.seen).toEqual([]);
    expect((await stripe.checkout.sessions.retrieve(session.id)).payment_status).toBe("paid");
    expect((await stripe.events.list()).data).toHaveLength(2);
  });

  it("webhook-late", async () => {
    const { app } = await paying({ kind: "webhook-late", ms: 150, times: 1 });
    expect(app.seen).toEqual([]);
    await until(() => app.seen.length === 2);
  });

  it("webhook-twice", async () => {
    const { app } = await paying({ kind: "webhook-twice", times: 1 });
    expect(app.types()).toEqual(["payment_intent.succeeded", "payment_intent.succeeded", "checkout.session.completed", "checkout.session.completed"]);
    expect(new Set(app.seen.map((event) => event.id)).size).toBe(2);
  });

  it("webhook-out-of-order: the refund is told before the payment", async () => {
    const { app, stripe, session } = await paying({ kind: "webhook-out-of-order", times: 1 });
    expect(app.seen).toEqual([]);
    const { payment_intent: intent } = await stripe.checkout.sessions.retrieve(session.id);
    await stripe.refunds.create({ payment_intent: String(intent) });
    await until(() => app.seen.length === 3);
    expect(app.types()).toEqual(["charge.refunded", "checkout.session.completed", "payment_intent.succeeded"]);
  });

  it("api-down and api-slow", async () => {
    const { fault, stripe, port } = await aService();
    await fault({ kind: "api-down", times: 2 });
    expect(await refusal(stripe.events.list())).toMatchObject({ statusCode: 503 });
    expect((await aClient(port, { maxNetworkRetries: 1 }).events.list()).data).toEqual([]);
    await fault({ kind: "api-slow", ms: 300, times: 1 });
    expect((await refusal(stripe.events.list({}, { timeout: 100 }))).type).toBe("StripeConnectionError");
  });

  it("cut-response: done without an answer; the same key finds what was done", async () => {
    const { fault, stripe } = await aService();
    await fault({ kind: "cut-response", times: 2 });
    const once = { idempotencyKey: "cut" };
    expect((await refusal(stripe.checkout.sessions.create(aFee(), once))).type).toBe("StripeConnectionError");
    const { id } = await stripe.checkout.sessions.create(aFee(), once);
    expect((await stripe.checkout.sessions.list()).data.map((one) => one.id)).toEqual([id]);
  });
});
