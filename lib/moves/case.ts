import type { RestrictionId } from "@/lib/acceptance/vocabulary";
import type { HeldPart } from "@/lib/access/types";
import type { MoveFacts } from "@/lib/standing/types";
import { standingOf } from "@/lib/standing/rules";
import { conditionsFor, editableBy, mayStandIn, seenParts, tabCounts, towSpeedOf, turnOf } from "./case-rules";
import { splitDays, type Waited } from "./days-split";
import { denyCarrierChange, denyLegEdit, denyPayerChange } from "./leg-rules";
import type { CaseFile, CaseLeg, CaseUnit } from "./types";
import { BODY_SHAPES, type Axles } from "./vocabulary";

/** The rows that a case file is put together from. */
export type CaseRows = {
  head: Pick<CaseFile, "moveId" | "caseNumber" | "origin" | "destination" | "wantedFrom" | "wantedTo" | "note" | "openedAt" | "endedAt" | "version"> & { waitingSince: string | null };
  unit: Omit<CaseUnit, "shape" | "axles" | "airDate" | "airDateRegister"> & { shape: string; axles: number; facts: Readonly<Record<string, string>> };
  legs: readonly { legId: string; fromZone: string; toZone: string; version: number; onBoard: boolean }[];
  facts: MoveFacts;
  waits: readonly Waited[];
  acceptances: readonly { carrierName: string; restrictions: readonly RestrictionId[] }[];
  parts: HeldPart[];
  at: string;
};

const axlesOf = (axles: number): Axles => (axles === 4 ? 4 : 6);

function unitOf({ facts, ...unit }: CaseRows["unit"]): CaseUnit {
  return {
    ...unit,
    shape: BODY_SHAPES.find((shape) => shape === unit.shape) ?? "hood",
    axles: axlesOf(unit.axles),
    airDate: facts["air-date"] ?? null,
    airDateRegister: facts["air-date-register"] ?? null,
  };
}

function legsOf({ facts, legs, parts }: CaseRows): CaseLeg[] {
  return facts.legs.flatMap((leg) => {
    const row = legs.find((one) => one.legId === leg.legId);
    if (!row) return [];
    const { legId, seq, carrierName, carrierMark, fromPlace, toPlace, miles, payerName, takenOver, delivered } = leg;
    return [{
      legId, seq, carrierName, carrierMark, fromPlace, fromZone: row.fromZone, toPlace, toZone: row.toZone, miles, payerName, takenOver, delivered,
      onBoard: row.onBoard,
      stopped: leg.stoppingOpen > 0,
      fixedBecause: denyLegEdit(leg)?.message ?? null,
      carrierFixedBecause: denyCarrierChange(leg)?.message ?? null,
      payerFixedBecause: denyPayerChange(leg)?.message ?? null,
      conditions: conditionsFor(parts, facts, leg),
      version: row.version,
    }];
  });
}

function waitingOf({ head, parts, at, legs }: CaseRows, standing: ReturnType<typeof standingOf>): CaseFile["waiting"] {
  if (!standing.waiting) return null;
  const { part, legId, name, waitingFor, count } = standing.waiting;
  return { part, legId, name, waitingFor, count, since: head.waitingSince ?? at, ...turnOf(parts, { part, legId }), standIn: mayStandIn(parts, waitingFor, legs.find((leg) => leg.legId === legId)?.onBoard ?? true) };
}

/** Puts a case file together for one viewer. */
export function caseFileOf(rows: CaseRows): CaseFile {
  const { head: { waitingSince: _since, ...head }, facts, parts, at } = rows;
  const standing = standingOf(facts);
  return {
    ...head, at, parts,
    state: facts.state,
    stage: standing.stage,
    unit: unitOf(rows.unit),
    ownerName: facts.ownerName,
    contractorName: facts.contractor?.name ?? null,
    receiverName: facts.receiver?.name ?? null,
    towSpeed: towSpeedOf(rows.acceptances),
    waiting: waitingOf(rows, standing),
    progressMil: standing.progressMil,
    legs: legsOf(rows),
    days: splitDays(rows.waits, head.endedAt ?? at),
    see: seenParts(parts, facts.legs),
    may: editableBy(parts, facts.state === "open"),
    counts: tabCounts(facts),
  };
}
