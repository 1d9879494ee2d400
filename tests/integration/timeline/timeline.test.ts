import { eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { followLinks } from "@/db/schema";
import { agreeQuote, giveQuote } from "@/lib/fees/commands/quotes";
import { giveQuoteInput } from "@/lib/fees/input";
import { makeSighting, retractSighting } from "@/lib/movement/commands";
import { getMovement } from "@/lib/movement/queries";
import { endFollowLink, makeFollowLink } from "@/lib/parties/commands/follow";
import { unsafeOpenFollow } from "@/lib/timeline/commands";
import { getTimeline, unsafeFollow } from "@/lib/timeline/queries";
import type { Entry, Timeline } from "@/lib/timeline/types";
import { plainText } from "@/lib/timeline/words";
import { LIMITS } from "@/lib/viewer/limits";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove, type SeededMove } from "../../support/factories";
import { seedFinding, seedPrepSignature } from "../../support/inspecting";
import { aSighting, seedPlaced, seedReady, sight } from "../../support/moving";

const database = withDatabase();

const ALL = 500;
const entriesOf = (timeline: Timeline): Entry[] => timeline.rows.flatMap((row) => (row.type === "day" ? row.entries : []));
const words = (timeline: Timeline) => entriesOf(timeline).map((entry) => plainText(entry.parts));

/** A quote on each leg whose amounts are found nowhere else. */
async function quoteBoth({ moveId, legIds, clerkA, clerkB, payer }: SeededMove) {
  const ask = (legId: string, amount: string) => giveQuoteInput.parse({ moveId, legId, reference: "", note: "", goodUntil: "", lines: [{ kind: "line-haul", description: "Line haul", amount }], enteredFor: null });
  const { quoteId } = await giveQuote(clerkA, ask(legIds[0], "73,119.41"), anAttempt());
  await agreeQuote(payer, { moveId, quoteId }, anAttempt());
  await giveQuote(clerkB, ask(legIds[1], "8,228.57"), anAttempt());
}

const CANARIES = { first: /73,?119\.?41/, second: /8,?228\.?57/ };

it("amounts are read by the owner, by the leg's payer and by its payee, and by nobody else", async () => {
  const move = await seedMove({ prepDone: true });
  await quoteBoth(move);
  const found = async (viewer: SeededMove["owner"]) => {
    const text = JSON.stringify(await getTimeline(viewer, move.moveId, ALL));
    return { first: CANARIES.first.test(text), second: CANARIES.second.test(text) };
  };
  expect(await found(move.owner)).toEqual({ first: true, second: true });
  expect(await found(move.payer)).toEqual({ first: true, second: false });
  expect(await found(move.clerkA)).toEqual({ first: true, second: false });
  expect(await found(move.clerkB)).toEqual({ first: false, second: true });
  for (const viewer of [move.contractor, move.inspectorA, move.inspectorB, move.deskA, move.deskB, move.receiver]) expect(await found(viewer), viewer.name).toEqual({ first: false, second: false });
});

it("an outsider and a removed member find nothing", async () => {
  const { moveId, outsider, removed } = await seedMove();
  for (const viewer of [outsider, removed]) await expect(getTimeline(viewer, moveId, ALL)).rejects.toMatchObject({ code: "not_found" });
});

it("a named payer reads the leg that they pay and the way, not findings, prep or the other leg", async () => {
  const move = await seedPlaced();
  await seedFinding(move, { observed: "Canary words of an inspector" });
  const timeline = await getTimeline(move.payer, move.moveId, ALL);
  const text = JSON.stringify(timeline);
  expect(text).not.toContain("Canary words");
  expect(text).not.toContain("Acceptance of Sable");
  const kinds = new Set(entriesOf(timeline).map((entry) => entry.kind));
  expect([...kinds].sort()).toEqual(["acceptance.signed", "billing.cleared", "finding.posted", "inspection.visited", "instruction.given", "sighting.made", "unit.released"].sort());
  expect(words(timeline)).toEqual(expect.arrayContaining(["Posted a finding", "Placed, Ardell, Sable Mountain Lines"]));
  expect(words(await getTimeline(move.owner, move.moveId, ALL)).some((line) => /^Found F-01, .*flat spot/i.test(line))).toBe(true);
});

it("the newest comes first, each at the time when it happened and in the zone of its place", async () => {
  const { moveId, owner } = await seedPlaced();
  const entries = entriesOf(await getTimeline(owner, moveId, ALL));
  const moments = entries.map((entry) => entry.at);
  expect(moments).toEqual([...moments].sort().reverse());
  const sightings = entries.filter((entry) => entry.kind === "sighting.made");
  expect(sightings.map((entry) => entry.zone)).toEqual(Array(5).fill("America/Denver"));
  expect(sightings.at(-1)).toMatchObject({ enteredLate: 3, by: "D. Sand", company: "Quillan & Sandbar" });
});

it("before the unit is pulled times are those of the origin", async () => {
  const move = await seedMove({ prepDone: true });
  await seedFinding(move);
  for (const entry of entriesOf(await getTimeline(move.owner, move.moveId, ALL))) expect(entry.zone).toBe("America/Chicago");
});

it("what was taken back or corrected stays, struck through with its reason", async () => {
  const { moveId, legIds: [leg], deskA, owner } = await seedReady();
  const wrong = await sight(deskA, moveId, leg, "pulled", { hoursAgo: 9 });
  await makeSighting(deskA, aSighting(moveId, leg, "pulled", { hoursAgo: 8, corrects: wrong.sightingId }), anAttempt());
  const seen = await sight(deskA, moveId, leg, "seen", { hoursAgo: 5 });
  await retractSighting(deskA, { moveId, sightingId: seen.sightingId, why: "Another unit", enteredFor: null }, anAttempt());
  const struck = entriesOf(await getTimeline(owner, moveId, ALL)).filter((entry) => entry.struck).map((entry) => [plainText(entry.parts), entry.struck]);
  expect(struck).toEqual([["Seen, Ardell, Quillan & Sandbar", "Another unit"], ["Pulled, Ardell, Quillan & Sandbar", "Corrected by a newer sighting."]]);
});

it("pages grow from the newest and say how many there are", async () => {
  const { moveId, owner } = await seedPlaced();
  const whole = await getTimeline(owner, moveId, ALL);
  const part = await getTimeline(owner, moveId, 4);
  expect(part).toMatchObject({ shown: 4, total: whole.total });
  expect(words(part)).toEqual(words(whole).slice(0, words(part).length));
});

it("the foot of the page says whether the record is as it was written", async () => {
  const move = await seedReady();
  const { entries, brokenAt } = (await getTimeline(move.owner, move.moveId, ALL)).chain;
  expect({ entries: entries > 3, brokenAt }).toEqual({ entries: true, brokenAt: null });
  const admin = await database.root();
  await admin.query("update record set by_name = 'Somebody else' where move_id = ? and seq = 2", [move.moveId]);
  await admin.end();
  expect((await getTimeline(move.owner, move.moveId, ALL)).chain).toMatchObject({ brokenAt: 2 });
});

it("quiet days say whom they waited on", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  await seedFinding(move);
  const later = new Date(Date.now() + 5 * 24 * 3600_000);
  const { rows, days } = await getTimeline(move.owner, move.moveId, ALL, later);
  expect(rows[0]).toMatchObject({ type: "quiet", days: 5, goesOn: true, name: "Ibarra Rail Mechanical" });
  expect(days).toMatchObject({ total: 5, parts: [{ label: "Contractor", days: 5 }] });
});

/** A link of a move, as its token. */
async function linkOf({ moveId, owner }: SeededMove) {
  const { url, followId } = await makeFollowLink(owner, { moveId, label: "Canary label", email: null }, anAttempt());
  return { token: url.split("/").at(-1) ?? "", followId };
}

it("by a link one follows the unit: no name of a person, no money, no reason that somebody typed", async () => {
  const move = await seedPlaced(quoteBoth);
  const placed = (await getMovement(move.deskB, move.moveId)).sightings.find((one) => one.kind === "placed");
  await sight(move.deskB, move.moveId, move.legIds[1], "placed", { note: "Canary note", train: "CANARY7", corrects: placed?.id });
  expect(JSON.stringify(await getTimeline(move.owner, move.moveId, ALL))).toMatch(CANARIES.first);
  const { token } = await linkOf(move);
  const view = await unsafeOpenFollow(token, "203.0.113.7", new Date());
  expect(view).toMatchObject({ unit: { mark: "ZVRX", number: "2783" }, from: { name: "Sand Hollow elevator" }, to: { name: "Vellum Ridge shops" }, stage: "Placed", handings: [{ carrier: "Quillan & Sandbar", takenOver: true }, { carrier: "Sable Mountain Lines", takenOver: true }] });
  const text = JSON.stringify(view);
  for (const name of ["Okafor", "Ibarra", "Alder", "Fenn", "Sorrel", "D. Sand", "E. Ridge", "I. Sable", "C. Mount", "B. Quill", "Canary", "CANARY7", "B-4410", "Account 7", "QS-118"]) expect(text, name).not.toContain(name);
  for (const canary of Object.values(CANARIES)) expect(text).not.toMatch(canary);
  const lines = view?.days.flatMap((day) => day.entries.map((entry) => entry.text)) ?? [];
  expect(lines).toEqual(expect.arrayContaining(["Placed at Ardell, Sable Mountain Lines", "Pulled at Ardell, Quillan & Sandbar", "Released by the owner to Quillan & Sandbar", "Accepted for movement by Quillan & Sandbar"]));
});

it("a wrong, an ended and an expired link are alike: none of them leads anywhere", async () => {
  const move = await seedReady();
  const now = new Date();
  const ended = await linkOf(move);
  await endFollowLink(move.owner, { moveId: move.moveId, followId: ended.followId }, anAttempt());
  const expired = await linkOf(move);
  await db().update(followLinks).set({ expiresAt: new Date(now.getTime() - 1) }).where(eq(followLinks.id, expired.followId));
  const good = await linkOf(move);
  for (const token of [ended.token, expired.token, `${good.token}x`, good.token.slice(1), "", "../../etc", "a".repeat(500)]) expect(await unsafeFollow(token, now), token).toBeNull();
  expect(await unsafeFollow(good.token, now)).not.toBeNull();
});

it("an open page is one use, however often it reads itself again", async () => {
  const move = await seedReady();
  const { token, followId } = await linkOf(move);
  const at = (minutes: number) => new Date(Date.now() + minutes * 60_000);
  for (const minutes of [0, 1, 2, 3, 30]) await unsafeOpenFollow(token, "203.0.113.8", at(minutes));
  const [link] = await db().select({ uses: followLinks.uses, last: followLinks.lastUsedAt }).from(followLinks).where(eq(followLinks.id, followId));
  expect(link).toMatchObject({ uses: 2, last: expect.any(Date) });
});

it("an address that tries too many links is refused, whether they are good or not", async () => {
  const { token } = await linkOf(await seedReady());
  const now = new Date();
  for (let tries = 0; tries < LIMITS["follow-address"].max; tries += 1) expect(await unsafeOpenFollow("A".repeat(32), "198.51.100.9", now)).toBeNull();
  await expect(unsafeOpenFollow(token, "198.51.100.9", now)).rejects.toMatchObject({ code: "too_many" });
  expect(await unsafeOpenFollow(token, "198.51.100.10", now)).not.toBeNull();
});
