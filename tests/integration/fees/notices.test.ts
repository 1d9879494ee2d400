import { count, eq } from "drizzle-orm";
import { afterAll, beforeEach, describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { moves, paymentEvents } from "@/db/schema";
import { withDatabase } from "../../support/database";
import { expectConsoleError } from "../../support/fail-on-console-error";
import { openBench, seedAgreed, sign, stateOf, tellDoor, type SentEvent } from "./bench";

const bench = await openBench();
const database = withDatabase({ STRIPE_API_BASE: bench.url });
afterAll(() => bench.close());

beforeEach(() => bench.fault({ kind: "off" }));

const SETTLED = { quote: "paid", payments: ["paid"], unbalanced: [] };

/** A paid page whose notices were held back: they are handed over by the test. */
async function seedPaid() {
  const move = await seedAgreed();
  const { url, paymentId } = await move.pay();
  await bench.fault({ kind: "webhook-never" });
  await bench.onPage(url, "pay");
  await bench.fault({ kind: "off" });
  const [payment] = (await stateOf(move)).tries;
  const own = (await bench.events()).filter((event) => JSON.stringify(event.data.object).includes(paymentId));
  const of = (type: string) => own.find((event) => event.type === type) as SentEvent;
  return { ...move, paymentId, sessionId: payment?.sessionId ?? "", completed: of("checkout.session.completed"), succeeded: of("payment_intent.succeeded") };
}

const textOf = ({ state: _state, ...event }: SentEvent & { attempts?: unknown }) => JSON.stringify({ ...event, attempts: undefined });
const tellSigned = (body: string, given = {}) => tellDoor(body, sign(body, given));
const eventCount = async () => (await db().select({ n: count() }).from(paymentEvents))[0]?.n ?? 0;

async function expectOnce(move: { moveId: string; quoteId: string }) {
  const after = await stateOf(move);
  expect(after).toMatchObject(SETTLED);
  expect(after.postings).toHaveLength(4);
  expect(after.receipts).toHaveLength(2);
  expect(after.cleared).toHaveLength(1);
  expect(after.entries.filter((entry) => entry.kind === "payment.paid")).toHaveLength(1);
}

it("the same notice fifty times at once is answered 200 each time and booked once", async () => {
  const move = await seedPaid();
  const body = textOf(move.completed);
  const answers = await Promise.all(Array.from({ length: 50 }, () => tellSigned(body)));
  expect(new Set(answers.map((answer) => answer.status))).toEqual(new Set([200]));
  await expectOnce(move);
  expect((await stateOf(move)).events).toHaveLength(1);
});

it("twice from the payment service itself is booked once", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  bench.statuses.length = 0;
  await bench.fault({ kind: "webhook-twice" });
  await bench.onPage(url, "pay");
  expect(bench.statuses).toEqual([200, 200, 200, 200]);
  await expectOnce(move);
});

it("both notices of one change, in either order and at once, have one effect", async () => {
  const [one, two, both] = [await seedPaid(), await seedPaid(), await seedPaid()];
  for (const event of [one.completed, one.succeeded]) await tellSigned(textOf(event));
  for (const event of [two.succeeded, two.completed]) await tellSigned(textOf(event));
  await Promise.all([both.succeeded, both.completed].map((event) => tellSigned(textOf(event))));
  for (const move of [one, two, both]) await expectOnce(move);
});

it("a notice of money given back that comes before the payment's own ends in the present state, flagged", async () => {
  const move = await seedPaid();
  const page = await bench.stripe.checkout.sessions.retrieve(move.sessionId);
  await bench.stripe.refunds.create({ payment_intent: String(page.payment_intent) });
  await expect.poll(async () => (await stateOf(move)).quote).toBe("paid");
  await tellSigned(textOf(move.completed));
  await expectOnce(move);
  const after = await stateOf(move);
  expect(after.entries.some((entry) => entry.kind === "payment.flagged" && entry.detail.why === "Money went back at the payment service.")).toBe(true);
});

it("an old notice of an open page does not undo a payment", async () => {
  const move = await seedPaid();
  await tellSigned(textOf(move.completed));
  const stale = { ...move.completed, id: "evt_stale", type: "checkout.session.expired", data: { object: { ...move.completed.data.object, status: "expired", payment_status: "unpaid" } } };
  await tellSigned(textOf(stale));
  await expectOnce(move);
});

it("three days late, after the move was closed: booked, flagged for a clerk, the move as it was", async () => {
  const move = await seedPaid();
  const root = await database.root();
  await root.query("update moves set state = 'closed', stage = 'closed' where id = ?", [move.moveId]);
  await root.end();
  expect((await tellSigned(textOf(move.completed))).status).toBe(200);
  await expectOnce(move);
  const after = await stateOf(move);
  expect(after.events).toMatchObject([{ flagged: true, outcome: "Paid after work on the move had ended." }]);
  expect(await db().select({ state: moves.state, stage: moves.stage }).from(moves).where(eq(moves.id, move.moveId))).toEqual([{ state: "closed", stage: "closed" }]);
});

describe("a forged notice is refused and writes nothing", () => {
  const now = () => Math.floor(Date.now() / 1000);
  const forgeries: [string, (body: string) => Promise<Response>][] = [
    ["no signature", (body) => tellDoor(body, null)],
    ["an empty signature", (body) => tellDoor(body, "")],
    ["another secret", (body) => tellSigned(body, { secret: "whsec_another" })],
    ["a timestamp older than five minutes", (body) => tellSigned(body, { timestamp: now() - 301 })],
    ["a timestamp moved without signing again", (body) => tellDoor(body, sign(body, { timestamp: now() - 301 }).replace(/t=\d+/, `t=${now()}`))],
    ["another layout of the same content", (body) => tellDoor(JSON.stringify(JSON.parse(body), null, 2), sign(body))],
    ["one changed byte", (body) => tellDoor(body.replace("418500", "418501"), sign(body))],
    ["two signatures, both wrong", (body) => tellDoor(body, `${sign(body, { secret: "whsec_a" })},v1=${"0".repeat(64)}`)],
    ["a signature of an older scheme", (body) => tellDoor(body, sign(body).replace("v1=", "v0="))],
    ["one megabyte, signed", (body) => tellSigned(body.replace(/}$/, `,"padding":"${"x".repeat(1_000_000)}"}`))],
    ["no body", () => tellDoor("", sign(""))],
    ["signed text that is no JSON", () => tellSigned("not json")],
    ["signed JSON that is no notice", () => tellSigned("[1,2]")],
  ];
  it.each(forgeries)("%s", async (_, forge) => {
    const move = await seedPaid();
    const before = await eventCount();
    expect((await forge(textOf(move.completed))).status).toBe(400);
    expect(await eventCount()).toBe(before);
    expect(await stateOf(move)).toMatchObject({ quote: "agreed", payments: ["open"], postings: [] });
  });

  it("the true one beside a wrong signature, and one four minutes old, are taken", async () => {
    const move = await seedPaid();
    const body = textOf(move.completed);
    expect((await tellDoor(body, `${sign(body, { timestamp: now() - 240 })},v1=${"0".repeat(64)}`)).status).toBe(200);
    await expectOnce(move);
  });
});

describe("a signed notice that does not fit is flagged and not booked", () => {
  const changes: [string, Record<string, unknown>][] = [
    ["amount", { amount_total: 100 }],
    ["currency", { currency: "cad" }],
    ["move", { metadata: { moveId: "mov_other" } }],
    ["page", { id: "cs_test_other" }],
  ];
  it.each(changes)("another %s", async (_, change) => {
    const move = await seedPaid();
    const object = { ...move.completed.data.object, ...change, ...("metadata" in change ? { metadata: { paymentId: move.paymentId, quoteId: move.quoteId, ...(change.metadata as object) } } : {}) };
    const body = textOf({ ...move.completed, id: `evt_${move.paymentId}`, data: { object } });
    expect((await tellSigned(body)).status).toBe(200);
    expect((await tellSigned(body.replace("evt_", "evt_again_"))).status).toBe(200);
    const after = await stateOf(move);
    expect(after).toMatchObject({ quote: "agreed", payments: ["open"], postings: [], receipts: [], events: [{ flagged: true }, { flagged: true }] });
    expect(after.entries.filter((entry) => entry.kind === "payment.flagged")).toHaveLength(1);
    // The true notice still books it.
    await tellSigned(textOf(move.completed));
    await expectOnce(move);
  });

  it("a page whose sum is not what our books ask is not booked, however true its notice", async () => {
    const move = await seedPaid();
    const root = await database.root();
    await root.query("update payments set amount_cents = amount_cents + 1 where id = ?", [move.paymentId]);
    await root.end();
    await tellSigned(textOf(move.completed));
    await tellSigned(textOf(move.succeeded));
    expect(await stateOf(move)).toMatchObject({ quote: "agreed", payments: ["open"], postings: [], cleared: [] });
  });
});

it("a notice about somebody else's payment is kept and changes nothing", async () => {
  const move = await seedPaid();
  const object = { ...move.completed.data.object, id: "cs_test_stranger", client_reference_id: null, metadata: {} };
  const body = textOf({ ...move.completed, id: "evt_stranger", data: { object } });
  for (let n = 0; n < 2; n += 1) expect((await tellSigned(body)).status).toBe(200);
  expect(await db().select().from(paymentEvents).where(eq(paymentEvents.eventId, "evt_stranger"))).toMatchObject([{ paymentId: null, flagged: true }]);
  expect(await stateOf(move)).toMatchObject({ quote: "agreed", payments: ["open"] });
});

it("killed half way through, nothing is kept, and the notice sent again does all of it", async () => {
  const move = await seedPaid();
  const root = await database.root();
  await root.query("create trigger stop_half_way before insert on billing_clearances for each row signal sqlstate '45000' set message_text = 'stopped half way'");
  expectConsoleError(/stopped half way|billing_clearances/);
  expect((await tellSigned(textOf(move.completed))).status).toBe(500);
  expect(await stateOf(move)).toMatchObject({ quote: "agreed", payments: ["open"], postings: [], events: [], receipts: [] });
  await root.query("drop trigger stop_half_way");
  await root.end();
  expect((await tellSigned(textOf(move.completed))).status).toBe(200);
  await expectOnce(move);
});

it("while the payment service does not answer, its notice is not taken and can be sent again", async () => {
  const move = await seedPaid();
  await bench.fault({ kind: "api-down" });
  expectConsoleError(/not available/);
  expect((await tellSigned(textOf(move.completed))).status).toBe(500);
  await bench.fault({ kind: "off" });
  expect((await tellSigned(textOf(move.completed))).status).toBe(200);
  await expectOnce(move);
});
