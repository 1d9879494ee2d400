import "server-only";
import { and, eq, inArray, isNull, lte, or, sql } from "drizzle-orm";
import { db, type Tx } from "@/db/client";
import { acceptances, attempts, companies, companyMembers, legs, moves, moveSeats, quotes, seatPeople, users, waits } from "@/db/schema";
import { denyAction, partFor, type Action, type Doing } from "@/lib/access/policy";
import { lockMove, type SeenMove } from "@/lib/access/scope";
import type { EnteredFor, HeldPart } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import { AppError, refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import type { CaseNews, MailPayloads } from "@/lib/outbox/types";
import { appendRecord, type NewEntry, type Speaker } from "@/lib/record/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { dayThere } from "./day";
import { unsafeGatherFacts } from "./queries";
import { standingOf } from "./rules";

const RETRY = new Set([1213, 1020]);
/** Waiting for a row took too long; trying again would only let the person wait longer. */
const WAITED_TOO_LONG = 1205;
const DUPLICATE = 1062;
const MAX_TRIES = 4;

/** MariaDB's number behind a failed query; drivers rename, numbers stay. */
export function unsafeErrno(error: unknown): number | null {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    if ("errno" in at && typeof at.errno === "number") return at.errno;
  }
  return null;
}

class Replay extends Error {}

/** The one way to write: everything in one transaction, tried again whole when rows collide. The same key again gets the first answer; with another body it is refused. */
export async function write<T>(viewer: Pick<Viewer, "userId">, attempt: Attempt, body: (tx: Tx) => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries += 1) {
    try {
      return await db().transaction(async (tx) => {
        await claimKey(tx, viewer.userId, attempt);
        const answer = (await body(tx)) ?? null;
        const kept = JSON.parse(JSON.stringify(answer)) as T;
        await tx.update(attempts).set({ answer: kept }).where(and(eq(attempts.userId, viewer.userId), eq(attempts.key, attempt.key)));
        return kept;
      });
    } catch (error) {
      if (error instanceof Replay) return replay<T>(viewer.userId, attempt);
      const errno = unsafeErrno(error) ?? 0;
      if (errno !== WAITED_TOO_LONG && !RETRY.has(errno)) throw error;
      if (errno === WAITED_TOO_LONG || tries === MAX_TRIES) throw new AppError("busy", "Somebody else is writing to the same case. Nothing was saved; try again.", { cause: error, retryAfterSeconds: 2 });
      await new Promise((resolve) => setTimeout(resolve, tries * 20 + (process.hrtime()[1] % 30)));
    }
  }
}

async function claimKey(tx: Tx, userId: string, { key, door, bodyHash, at }: Attempt) {
  try {
    await tx.insert(attempts).values({ userId, key, door, bodyHash, at, answer: null });
  } catch (error) {
    if (unsafeErrno(error) === DUPLICATE) throw new Replay("", { cause: error });
    throw error;
  }
}

async function replay<T>(userId: string, { key, door, bodyHash }: Attempt): Promise<T> {
  const [first] = await db().select().from(attempts).where(and(eq(attempts.userId, userId), eq(attempts.key, key)));
  if (!first || first.door !== door || first.bodyHash !== bodyHash) throw new AppError("key_reused", "This idempotency key was used for something else.");
  return first.answer as T;
}

/** What a command on a move works with. */
export type MoveWrite = {
  tx: Tx;
  move: SeenMove;
  parts: HeldPart[];
  at: Date;
  /** Refuses unless the viewer may do it; gives the part in which they do. From then on entries speak in that part. */
  allow: (doing: Doing) => HeldPart;
  /** Appends to the move's record; gives the entry's id. */
  append: (entry: NewEntry) => Promise<string>;
  /** Puts news into the outbox for everybody who acts in a part (on a leg, where given), but for the speaker. */
  tell: (to: { part: Part; legId?: string | null }, kind: NewsKind, news: CaseNews, dedupe: string) => Promise<void>;
};
type NewsKind = { [K in keyof MailPayloads]: MailPayloads[K] extends CaseNews ? K : never }[keyof MailPayloads];

/** Writes to one move: its row locked, policy and state checked, and afterwards whose turn it is worked out anew. */
export async function writeOnMove<T>(viewer: Viewer, attempt: Attempt, moveId: string, body: (ctx: MoveWrite) => Promise<T>): Promise<T> {
  return write(viewer, attempt, async (tx) => {
    const { move, parts } = await lockMove(tx, viewer, moveId);
    if (move.state !== "open") throw new AppError("not_yet", move.state === "closed" ? "The move is closed; nothing on it changes any more." : "The move was cancelled; nothing on it changes any more.");
    const answer = await body(contextOf(tx, viewer, move, parts, attempt.at));
    await refreshStanding(tx, moveId, attempt.at);
    return answer;
  });
}

function contextOf(tx: Tx, viewer: Viewer, move: SeenMove, parts: HeldPart[], at: Date): MoveWrite {
  let speaking: HeldPart | null = parts[0] ?? null;
  const companyName = async () => {
    if (!speaking) return null;
    const [row] = await tx.select({ name: companies.name }).from(companies).where(eq(companies.id, speaking.companyId));
    return row?.name ?? null;
  };
  return {
    tx, move, parts, at,
    allow: (doing) => {
      refuse(denyAction(parts, doing));
      const held = partFor(parts, doing);
      if (!held) throw new AppError("not_your_part", "This is not your part on the move.");
      return (speaking = held);
    },
    append: async (entry) => {
      const by: Speaker = { userId: viewer.userId, name: viewer.name, companyId: speaking?.companyId ?? null, companyName: await companyName(), part: speaking?.part ?? null };
      return appendRecord(tx, move.id, by, entry, at);
    },
    tell: async (to, kind, news, dedupe) => {
      for (const person of await peopleIn(tx, move.id, to)) {
        if (person.userId !== viewer.userId) await putMail(tx, { kind, to: person.email, payload: news, dedupe: `${dedupe}:${person.userId}`, moveId: move.id } as Parameters<typeof putMail>[1], at);
      }
    },
  };
}

/** Everybody who acts in a part on a move: admitted members with that work, and those invited to the seat alone. */
export async function peopleIn(tx: Pick<Tx, "select">, moveId: string, { part, legId = null }: { part: Part; legId?: string | null }) {
  const seatPart = part === "inspector" || part === "billing" || part === "desk" ? "carrier" : part;
  const work = { inspector: "inspects", billing: "bills", desk: "dispatches" }[part as string] as "inspects" | "bills" | "dispatches" | undefined;
  const seat = and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, seatPart), isNull(moveSeats.removedAt), legId && (seatPart === "carrier" || seatPart === "payer") ? eq(moveSeats.legId, legId) : undefined);
  const members = await tx.select({ userId: users.id, email: users.email, name: users.name }).from(moveSeats)
    .innerJoin(companyMembers, and(eq(companyMembers.companyId, moveSeats.companyId), isNull(companyMembers.removedAt), sql`${companyMembers.admittedAt} is not null`, work ? eq(companyMembers[work], true) : undefined))
    .innerJoin(users, and(eq(users.id, companyMembers.userId), isNull(users.disabledAt))).where(seat);
  const guests = await tx.select({ userId: users.id, email: users.email, name: users.name }).from(moveSeats)
    .innerJoin(seatPeople, and(eq(seatPeople.seatId, moveSeats.id), isNull(seatPeople.removedAt), work ? eq(seatPeople[work], true) : undefined))
    .innerJoin(users, and(eq(users.id, seatPeople.userId), isNull(users.disabledAt))).where(seat);
  return [...new Map([...members, ...guests].map((person) => [person.userId, person])).values()];
}

/** Works out whose turn it is and writes it to the move; an interval of waiting ends when the answer changes. Takes the transaction that changed something. */
export async function refreshStanding(tx: Tx, moveId: string, at: Date): Promise<void> {
  const { stage, waiting, progressMil } = standingOf(await unsafeGatherFacts(tx, moveId, at));
  const [before] = await tx.select({ part: moves.waitingPart, legId: moves.waitingLegId, companyId: moves.waitingCompanyId, what: moves.waitingFor, since: moves.waitingSince }).from(moves).where(eq(moves.id, moveId));
  const same = before && (before.part ?? null) === (waiting?.part ?? null) && (before.legId ?? null) === (waiting?.legId ?? null)
    && (before.what ?? null) === (waiting?.waitingFor ?? null) && (before.companyId ?? null) === (waiting?.companyId ?? null);
  await tx.update(moves).set({
    stage, progressMil,
    waitingPart: waiting?.part ?? null, waitingLegId: waiting?.legId ?? null, waitingCompanyId: waiting?.companyId ?? null, waitingName: waiting?.name ?? null,
    waitingFor: waiting?.waitingFor ?? null, waitingCount: waiting?.count ?? null, waitingSince: waiting ? (same ? (before.since ?? at) : at) : null,
  }).where(eq(moves.id, moveId));
  if (same) return;
  await tx.update(waits).set({ until: at }).where(and(eq(waits.moveId, moveId), isNull(waits.until)));
  if (waiting) await tx.insert(waits).values({ id: newId("wait"), moveId, part: waiting.part, legId: waiting.legId, name: waiting.name, waitingFor: waiting.waitingFor, since: at });
}

/** No viewer: a day that has passed changes whose turn it is without anybody writing. Looks at open moves with an acceptance or a quote whose last day lies behind. */
export async function unsafeRefreshLapsed(now: Date): Promise<void> {
  const yesterday = new Date(now.getTime() - 86_400_000).toISOString().slice(0, 10);
  const accepted = db().select({ moveId: acceptances.moveId }).from(acceptances).where(and(isNull(acceptances.withdrawnAt), lte(acceptances.validUntil, yesterday)));
  const quoted = db().select({ moveId: quotes.moveId }).from(quotes).where(and(eq(quotes.state, "given"), lte(quotes.goodUntil, yesterday)));
  const rows = await db().select({ moveId: moves.id }).from(moves).where(and(eq(moves.state, "open"), or(inArray(moves.id, accepted), inArray(moves.id, quoted))));
  for (const { moveId } of rows) {
    await db().transaction(async (tx) => {
      await tx.select({ id: moves.id }).from(moves).where(eq(moves.id, moveId)).for("update");
      await refreshStanding(tx, moveId, now);
    });
  }
}

/** The carrier of a leg as a step needs it: refuses when the leg is not on this move. */
export async function requireLeg(tx: Pick<Tx, "select">, moveId: string, legId: string) {
  const [leg] = await tx.select().from(legs).where(and(eq(legs.id, legId), eq(legs.moveId, moveId)));
  if (!leg) throw new AppError("not_found", "No such leg on this move.");
  return leg;
}

/** Checks a carrier's step: done by the carrier itself, or entered for one that is not on board. */
export async function allowOnLeg(ctx: MoveWrite, action: Action, legId: string, given: Omit<EnteredFor, "carrierName"> | null) {
  const leg = await requireLeg(ctx.tx, ctx.move.id, legId);
  const enteredFor: EnteredFor | null = given ? { ...given, carrierName: leg.carrierName } : null;
  if (enteredFor && enteredFor.heardOn > dayThere(ctx.at, leg.fromZone)) throw new AppError("bad_input", "Some entries need another look.", { fields: { "enteredFor.heardOn": ["This day has not come yet."] } });
  const carrierOnBoard = (await peopleIn(ctx.tx, ctx.move.id, { part: "carrier", legId })).length > 0;
  const held = ctx.allow({ action, legId, enteredFor, carrierOnBoard });
  return { leg, held, enteredFor };
}
