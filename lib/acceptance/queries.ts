import "server-only";
import { desc, eq } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { acceptances, signatures } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { unsafeFindingsOfLeg, unsafeUnit } from "@/lib/findings/queries";
import { sha256Hex } from "@/lib/ids";
import { mayOnLeg } from "@/lib/inspections/may";
import { unsafeInspectedLegs } from "@/lib/inspections/queries";
import { dayAt } from "@/lib/moves/when";
import { canonicalJson } from "@/lib/record/canonical";
import { unsafeStandingSignature } from "@/lib/record/queries";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import { denyAcceptance } from "@/lib/standing/rules";
import type { Viewer } from "@/lib/viewer/types";
import { denyAnother } from "./rules";
import type { Acceptances, AcceptanceView } from "./types";

/** Per leg: the acceptance that stands, those that were withdrawn, and what is missing for one. */
export async function listAcceptances(viewer: Viewer, moveId: string, now = new Date()): Promise<Acceptances> {
  const { move, parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "findings")) throw new AppError("not_your_part", "Acceptances are not part of what you see on this move.");
  const facts = await unsafeGatherFacts(db(), moveId, now);
  const unit = await unsafeUnit(db(), moveId);
  const route = await unsafeInspectedLegs(db(), moveId);
  const rows = await acceptanceRows(moveId);
  return {
    moveId, at: now.toISOString(), unit: `${unit.mark} ${unit.number}`.trim(),
    legs: await Promise.all(facts.legs.map(async (fact) => {
      const leg = route.find((one) => one.legId === fact.legId);
      const covered = await unsafeCovered(db(), moveId, fact.legId);
      const own = rows.filter((row) => row.legId === fact.legId).map((row) => viewOf(row, covered, dayAt(now.toISOString(), leg?.zone ?? move.originZone)));
      const last = own.find((one) => !one.withdrawnAt) ?? null;
      const [standing, lapsed] = fact.acceptanceLapsedOn ? [null, last] : [last, null];
      const may = leg && move.state === "open" ? mayOnLeg(parts, "acceptance.sign", leg) : null;
      return {
        legId: fact.legId, seq: fact.seq, carrierName: fact.carrierName, fromPlace: fact.fromPlace, toPlace: fact.toPlace, zone: leg?.zone ?? move.originZone, onBoard: leg?.onBoard ?? false, takenOver: fact.takenOver,
        standing, lapsed, withdrawn: own.filter((one) => one.withdrawnAt), missing: standing ? [] : (denyAcceptance(facts, fact)?.missing ?? []),
        findings: covered.findings.map(({ id, label, component, severity, state }) => ({ id, label, component, severity, state })),
        maySign: denyAnother(fact) ? null : may, mayWithdraw: standing && !fact.takenOver ? may : null, rowsHash: unsafeCoveredHash(covered),
      };
    })),
  };
}

const acceptanceRows = (moveId: string) =>
  db().select({
    id: acceptances.id, legId: acceptances.legId, number: acceptances.number, restrictions: acceptances.restrictions, restrictionNote: acceptances.restrictionNote, validUntil: acceptances.validUntil,
    at: acceptances.at, withdrawnAt: acceptances.withdrawnAt, withdrawnWhy: acceptances.withdrawnWhy,
    name: signatures.name, enteredFor: signatures.enteredFor, statement: signatures.statement, rowsHash: signatures.rowsHash,
  }).from(acceptances).innerJoin(signatures, eq(signatures.id, acceptances.signatureId)).where(eq(acceptances.moveId, moveId)).orderBy(desc(acceptances.at));
type Row = Awaited<ReturnType<typeof acceptanceRows>>[number];
type Covered = Awaited<ReturnType<typeof unsafeCovered>>;

function viewOf({ legId: _leg, rowsHash, at, withdrawnAt, ...shown }: Row, covered: Covered, today: string): AcceptanceView {
  return {
    ...shown, at: at.toISOString(), withdrawnAt: withdrawnAt?.toISOString() ?? null, expired: shown.validUntil !== null && shown.validUntil < today,
    changed: !withdrawnAt && sha256Hex(canonicalJson(unsafeSignedRows(covered, shown))) !== rowsHash,
  };
}

/** No viewer: called where one was checked. The unit, the findings of the leg and the prep that an acceptance stands on. */
export async function unsafeCovered(reader: Reader, moveId: string, legId: string) {
  const { mark, number } = await unsafeUnit(reader, moveId);
  const prep = await unsafeStandingSignature(reader, moveId, "prep-where-it-stands", moveId);
  return { unit: { mark, number }, findings: await unsafeFindingsOfLeg(reader, moveId, legId), prep: prep ? { signatureId: prep.id, rowsHash: prep.rowsHash } : null };
}

/** No viewer: pure, but it belongs to what is read above. Hash of what a signature covers before its terms are chosen. */
export function unsafeCoveredHash(covered: Covered): string {
  return sha256Hex(canonicalJson(covered));
}

/** No viewer: pure, but it belongs to what is read above. Exactly what a signature covers: what was looked at, and the terms. */
export function unsafeSignedRows(covered: Covered, { number, restrictions, restrictionNote, validUntil }: Pick<AcceptanceView, "number" | "restrictions" | "restrictionNote" | "validUntil">) {
  return { ...covered, terms: { number, restrictions: [...restrictions].sort(), restrictionNote, validUntil } };
}
