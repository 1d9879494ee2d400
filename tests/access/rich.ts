import { and, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { accounts, followLinks, invitations, legs, moves, moveSeats, outbox, payments, photos } from "@/db/schema";
import { announcePhoto } from "@/lib/evidence/commands";
import { agreeQuote, giveQuote, voidQuote } from "@/lib/fees/commands/quotes";
import { answerFinding, postFinding } from "@/lib/findings/commands";
import { newId, sha256Hex } from "@/lib/ids";
import { recordVisit } from "@/lib/inspections/commands";
import { finishItem } from "@/lib/prep/commands";
import { anAttempt, seedMove, seedSeat } from "../support/factories";
import { SEATED, SEE_WORK, type Persona } from "./personas";
import { amount, type Secret } from "./secrets";
import { seedCase, type Case } from "./scenario";
import { arrived, drafted, itemOf, sessionOf } from "./steps";

/** A case that has come a long way and holds every kind of secret, for reads alone. */
export type Rich = Case & { findingId: string; photoId: string; draftId: string; quoteId: string; sessionId: string; paymentSession: string };

/** Opens the rich case to a notify party. */
export const FOLLOW_TOKEN = "notify-party-of-the-rich-case";

const NOBODY: readonly Persona[] = [];
const A_MONEY: readonly Persona[] = ["owner", "payer", "clerkA"];
const B_MONEY: readonly Persona[] = ["owner", "clerkB"];

const secret = (what: string, may: readonly Persona[], ...texts: string[]): Secret => ({ what, may, texts });

const FEES_A = [7_310_903, 1_190_407] as const;
const FEES_B = [6_420_811, 2_280_509] as const;

const linesOf = ([haul, look]: readonly [number, number], words: string) => [
  { kind: "line-haul" as const, description: `${words} haul`, amountCents: haul },
  { kind: "inspection" as const, description: `${words} look`, amountCents: look },
];
const feeTexts = ([haul, look]: readonly [number, number], words: string) => [words, ...amount(haul), ...amount(look), ...amount(haul + look)];
const quoteOf = (moveId: string, legId: string, fees: readonly [number, number], words: string) => ({ moveId, legId, reference: `${words} ref`, note: `${words} note`, goodUntil: null, lines: linesOf(fees, words), enteredFor: null });

/** Through the commands, so that the record tells of it too. */
async function withMoney({ moveId, legA, legB, people }: Case) {
  const withdrawn = await giveQuote(people.clerkA, quoteOf(moveId, legA, FEES_A, "zinnober-a first"), anAttempt());
  await voidQuote(people.clerkA, { moveId, quoteId: withdrawn.quoteId, why: "zinnober-a typed wrong", enteredFor: null }, anAttempt());
  const { quoteId } = await giveQuote(people.clerkA, quoteOf(moveId, legA, FEES_A, "zinnober-a"), anAttempt());
  await agreeQuote(people.payer, { moveId, quoteId }, anAttempt());
  await giveQuote(people.clerkB, quoteOf(moveId, legB, FEES_B, "zinnober-b"), anAttempt());
  const paymentSession = "cs_test_karmin";
  await db().insert(payments).values({
    id: newId("payment"), moveId, quoteId, attempt: 1, amountCents: FEES_A[0] + FEES_A[1], state: "open", sessionId: paymentSession, sessionUrl: "http://127.0.0.1:1/karmin-page", intentId: "pi_karmin",
    begunBy: people.payer.userId, begunAt: new Date(), expiresAt: new Date(Date.now() + 3600_000),
  });
  const secrets = [
    secret("the fees of carrier A", A_MONEY, ...feeTexts(FEES_A, "zinnober-a")),
    secret("the fees of carrier B", B_MONEY, ...feeTexts(FEES_B, "zinnober-b")),
    secret("names at the payment service", NOBODY, paymentSession, "karmin-page", "pi_karmin"),
  ];
  return { quoteId, paymentSession, secrets };
}

/** Hashes, tokens and sealed letters: no answer holds any of them. */
async function withKeys(of: Case): Promise<Secret[]> {
  const { owner } = of.people;
  const at = new Date();
  const soon = new Date(Date.now() + 24 * 3600_000);
  const shared = { createdAt: at, expiresAt: soon };
  const [letter, follow, password, token] = [sha256Hex("letter of invitation"), sha256Hex(FOLLOW_TOKEN), "scrypt$indigo$hash", "indigo-session-token"];
  const [seat] = await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, of.moveId), eq(moveSeats.part, "receiver")));
  await db().insert(invitations).values({ ...shared, id: newId("invitation"), moveId: of.moveId, seatId: seat?.id ?? null, companyId: of.companies.receiver, email: "ocker-invited@example.test", tokenHash: letter, invitedBy: owner.userId });
  await db().insert(followLinks).values({ ...shared, id: newId("follow"), moveId: of.moveId, label: "The museum’s friends", email: "ocker-follows@example.test", tokenHash: follow, createdBy: owner.userId });
  await db().insert(accounts).values({ id: newId("account"), accountId: owner.userId, providerId: "credential", userId: owner.userId, password, createdAt: at, updatedAt: at });
  await sessionOf(owner, token);
  await db().insert(outbox).values({ id: newId("outbox"), dedupe: newId("outbox"), kind: "invitation", moveId: of.moveId, toAddress: "ocker-outbox@example.test", payload: "sealed-indigo-payload", messageId: "<indigo@example.test>", runAt: at, createdAt: at });
  return [
    secret("the hash of an invitation", NOBODY, letter), secret("the hash of a follow link", NOBODY, follow), secret("a password’s hash", NOBODY, password), secret("a session’s token", NOBODY, token),
    secret("a letter that waits to be sent", NOBODY, "sealed-indigo-payload", "<indigo@example.test>"), secret("whom a letter goes to", NOBODY, "ocker-outbox@example.test"),
    secret("to which address an invitation or a follow link went", ["owner"], "ocker-invited@example.test", "ocker-follows@example.test"),
  ];
}

/** Through the commands as well. */
async function withWork(of: Case) {
  const { moveId, legA, people: { inspectorA, contractor } } = of;
  const { itemId, version } = await itemOf(of);
  await finishItem(contractor, { moveId, itemId, version, value: "umbra-value", tagNumber: "umbra-tag", note: "umbra-prep note", photoIds: [] }, anAttempt());
  const { photo } = await announcePhoto(contractor, { moveId, clientId: crypto.randomUUID(), name: "umbra-photo.jpg", type: "image/jpeg", sizeBytes: 1000, sha256: sha256Hex("umbra"), widthPx: 800, heightPx: 600 }, anAttempt());
  await db().update(photos).set({ state: "kept", proofKey: `sepia-proof-${moveId}`, originalKey: `sepia-original-${moveId}`, previewKey: `sepia-preview-${moveId}` }).where(eq(photos.id, photo.id));
  const { inspectionId } = await recordVisit(inspectorA, { moveId, legId: legA, visitedOn: "2026-01-05", place: "Sand Hollow", zone: "America/Chicago", inspectorName: "V. Sorrel", air: "off", airSource: null, airPsi: null, note: "umbra-visit note", enteredFor: null }, anAttempt());
  const finding = { componentId: "flat-spot", placeId: null, placeNote: "umbra-place", observed: "umbra-observed flat spots", reading: "umbra-2 in", condition: "umbra-condition", severity: "stops-move" as const, noPhotoReason: "umbra-dark", enteredFor: null };
  const { findingId } = await postFinding(inspectorA, { ...finding, moveId, inspectionId, photoIds: [] }, anAttempt());
  await answerFinding(contractor, { moveId, findingId, version: 1, text: "umbra-answer", reading: "umbra-0 in", photoIds: [photo.id] }, anAttempt());
  const secrets = [secret("what was found and done on the unit", SEE_WORK, "umbra-"), secret("a file’s key at the file service", NOBODY, "sepia-")];
  return { findingId, photoId: photo.id, secrets };
}

/** Two other cases: one of other companies, and one that seats carrier A's company too, to which the guest was never invited. */
async function withNeighbors(of: Case): Promise<Secret[]> {
  const named = async (word: string) => {
    const other = await seedMove();
    await db().update(moves).set({ originName: `${word} siding`, note: `${word} note`, searchText: `${word} siding` }).where(eq(moves.id, other.moveId));
    await db().update(legs).set({ carrierName: `${word} lines` }).where(eq(legs.moveId, other.moveId));
    return other;
  };
  const [strange, sister] = [await named("malachit"), await named("lapis")];
  await seedSeat(sister.moveId, of.companies.carrierA, "carrier", sister.legIds[1]);
  return [secret("a case of others", NOBODY, strange.moveId, "malachit"), secret("another case of carrier A", ["inspectorA", "clerkA", "deskA"], sister.moveId, "lapis")];
}

export async function seedRich(): Promise<Rich> {
  const of = await seedCase();
  const { findingId, photoId, secrets: work } = await withWork(of);
  const { quoteId, paymentSession, secrets: money } = await withMoney(of);
  await arrived(of, "to-restore", "umbra-arrival condition");
  const keys = await withKeys(of);
  const draftId = await drafted(of, { words: "bister-draft" });
  const sessionId = await sessionOf(of.people.owner);
  await db().update(moves).set({ note: "chrom-note of the case" }).where(eq(moves.id, of.moveId));
  const own = [secret("a draft of the owner", ["owner"], "bister-draft", draftId), secret("a session of the owner", ["owner"], sessionId), secret("the case", SEATED, of.moveId, "chrom-note")];
  return { ...of, findingId, photoId, draftId, quoteId, sessionId, paymentSession, secrets: [...of.secrets, ...work, ...money, ...keys, ...await withNeighbors(of), ...own] };
}
