import "server-only";
import { and, asc, count, eq, isNull, sql } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import {
  acceptances, arrivals, billingClearances, companies, findings, inspections, instructions, legs, moveSeats, moves, payments, prepItems, quotes, releases, sightings, signatures,
} from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import { dayThere } from "./day";
import type { LegFacts, MoveFacts, PhaseFacts } from "./types";

/** What a move has come to, for whoever may see it. Amounts are not among the facts. */
export async function getFacts(viewer: Viewer, moveId: string): Promise<MoveFacts> {
  await requireMove(viewer, moveId);
  return unsafeGatherFacts(db(), moveId);
}

const ofMove = <T>(rows: T[], legId: string, key: (row: T) => string) => rows.filter((row) => key(row) === legId);

/** No viewer: the caller has checked, and stands in the transaction whose writes the facts must show. */
export async function unsafeGatherFacts(reader: Reader, moveId: string, now = new Date()): Promise<MoveFacts> {
  const [head] = await reader.select({ state: moves.state, ownerCompanyId: moves.ownerCompanyId, ownerName: companies.name }).from(moves)
    .innerJoin(companies, eq(companies.id, moves.ownerCompanyId)).where(eq(moves.id, moveId));
  if (!head) throw new AppError("not_found", "No such move.");
  const seats = await reader.select({ part: moveSeats.part, companyId: moveSeats.companyId, name: companies.name }).from(moveSeats)
    .innerJoin(companies, eq(companies.id, moveSeats.companyId)).where(and(eq(moveSeats.moveId, moveId), isNull(moveSeats.removedAt)));
  const seat = (part: "contractor" | "receiver") => {
    const found = seats.find((one) => one.part === part);
    return found ? { companyId: found.companyId, name: found.name } : null;
  };
  const [arrival] = await reader.select({ id: arrivals.id }).from(arrivals).where(eq(arrivals.moveId, moveId));
  const prep = await prepFacts(reader, moveId);
  return { ...head, contractor: seat("contractor"), receiver: seat("receiver"), ...prep, arrived: Boolean(arrival), legs: await legFacts(reader, moveId, now) };
}

async function prepFacts(reader: Reader, moveId: string) {
  const rows = await reader.select({ phase: prepItems.phase, total: count(), left: sql<number>`coalesce(sum(${prepItems.state} = 'to-do'), 0)`.mapWith(Number),
    restoreTotal: sql<number>`coalesce(sum(${prepItems.restoreState} <> 'none' and ${prepItems.state} = 'done'), 0)`.mapWith(Number),
    restoreLeft: sql<number>`coalesce(sum(${prepItems.restoreState} in ('later', 'to-restore') and ${prepItems.state} = 'done'), 0)`.mapWith(Number) })
    .from(prepItems).where(eq(prepItems.moveId, moveId)).groupBy(prepItems.phase);
  const signed = await reader.select({ kind: signatures.kind }).from(signatures).where(and(eq(signatures.moveId, moveId), isNull(signatures.liftedAt)));
  const phase = (name: "where-it-stands" | "when-coupled"): PhaseFacts => {
    const row = rows.find((one) => one.phase === name);
    return { total: row?.total ?? 0, left: row?.left ?? 0, signed: signed.some((one) => one.kind === `prep-${name}`) };
  };
  const sum = (key: "restoreTotal" | "restoreLeft") => rows.reduce((total, row) => total + row[key], 0);
  return { standing: phase("where-it-stands"), coupled: phase("when-coupled"), restoreTotal: sum("restoreTotal"), restoreLeft: sum("restoreLeft") };
}

async function legFacts(reader: Reader, moveId: string, now: Date): Promise<LegFacts[]> {
  const rows = await reader.select({ legId: legs.id, seq: legs.seq, carrierName: legs.carrierName, carrierMark: legs.carrierMark, carrierCompanyId: legs.carrierCompanyId,
    fromPlace: legs.fromPlace, fromZone: legs.fromZone, toPlace: legs.toPlace, miles: legs.miles, payerName: legs.payerName, payerCompanyId: legs.payerCompanyId })
    .from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  const visits = await reader.select({ legId: inspections.legId, n: count() }).from(inspections).where(eq(inspections.moveId, moveId)).groupBy(inspections.legId);
  const found = await reader.select({ legId: findings.legId, state: findings.state, severity: findings.severity, n: count() }).from(findings)
    .where(eq(findings.moveId, moveId)).groupBy(findings.legId, findings.state, findings.severity);
  const accepted = await reader.select({ legId: acceptances.legId, number: acceptances.number, validUntil: acceptances.validUntil }).from(acceptances).where(and(eq(acceptances.moveId, moveId), isNull(acceptances.withdrawnAt)));
  const asked = await reader.select({ legId: quotes.legId, state: quotes.state, goodUntil: quotes.goodUntil, waiting: sql<number>`(select count(*) from ${payments} where ${payments}.quote_id = ${quotes}.id and ${payments}.state in ('begun', 'open'))`.mapWith(Number) })
    .from(quotes).where(eq(quotes.moveId, moveId));
  const cleared = await reader.select({ legId: billingClearances.legId }).from(billingClearances).where(eq(billingClearances.moveId, moveId));
  const told = await reader.select({ legId: instructions.legId }).from(instructions).where(and(eq(instructions.moveId, moveId), isNull(instructions.withdrawnAt)));
  const released = await reader.select({ legId: releases.legId }).from(releases).where(eq(releases.moveId, moveId));
  const seen = await reader.select({ legId: sightings.legId, kind: sightings.kind }).from(sightings).where(and(eq(sightings.moveId, moveId), isNull(sightings.retractedAt)));

  return rows.map(({ fromZone, ...leg }) => {
    const mine = ofMove(found, leg.legId, (row) => row.legId);
    const sum = (test: (row: (typeof mine)[number]) => boolean) => mine.filter(test).reduce((total, row) => total + row.n, 0);
    const kinds = new Set(ofMove(seen, leg.legId, (row) => row.legId).map((row) => row.kind));
    const offers = ofMove(asked, leg.legId, (row) => row.legId).filter((row) => row.state !== "voided");
    const acceptance = accepted.find((row) => row.legId === leg.legId);
    const takenOver = kinds.has(leg.seq === 1 ? "pulled" : "received");
    // Once the carrier has the unit, the day by which it wanted to take it no longer matters.
    const lapsed = !takenOver && acceptance?.validUntil != null && acceptance.validUntil < dayThere(now, fromZone);
    const quote = (["paid", "agreed", "given"] as const).find((state) => offers.some((row) => row.state === state)) ?? "none";
    return {
      ...leg,
      visits: visits.find((row) => row.legId === leg.legId)?.n ?? 0,
      findings: sum(() => true),
      openFindings: sum((row) => row.state === "open" && row.severity !== "note"),
      answeredFindings: sum((row) => row.state === "answered" && row.severity !== "note"),
      stoppingOpen: sum((row) => row.severity === "stops-move" && (row.state === "open" || row.state === "answered")),
      unansweredBeforePickup: sum((row) => row.severity === "answer-before-pickup" && row.state === "open"),
      accepted: Boolean(acceptance) && !lapsed,
      acceptanceNumber: acceptance?.number ?? null,
      acceptanceLapsedOn: lapsed ? (acceptance?.validUntil ?? null) : null,
      quote,
      quoteLapsed: quote === "given" && offers.every((row) => row.goodUntil !== null && row.goodUntil < dayThere(now, fromZone)),
      paymentOpen: offers.some((row) => row.waiting > 0),
      billingCleared: cleared.some((row) => row.legId === leg.legId),
      instructed: told.some((row) => row.legId === leg.legId),
      released: released.some((row) => row.legId === leg.legId),
      takenOver,
      delivered: kinds.has("delivered"),
      atDestination: kinds.has("at-destination") || kinds.has("notified"),
      placed: kinds.has("placed"),
    };
  });
}
