import "server-only";
import { and, asc, eq, getTableColumns } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { equipment, findingEntries, findings, inspections, legs } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import type { HeldPart } from "@/lib/access/types";
import { AppError } from "@/lib/errors";
import { unsafePhotosOf } from "@/lib/evidence/queries";
import { mayOnLeg } from "@/lib/inspections/may";
import { unsafeInspectedLegs } from "@/lib/inspections/queries";
import { placeName } from "@/lib/moves/places";
import type { Viewer } from "@/lib/viewer/types";
import { findComponent } from "./components";
import { unitFormOf } from "./places";
import { ACTION_OF, denyState, FINDING_ACTS, type FindingAct } from "./rules";
import type { FindingDetail, FindingEntry, FindingsBoard, FindingView, FoundUnit } from "./types";
import { findingLabel, whereWords } from "./words";

function requireFindings(parts: readonly HeldPart[]): void {
  if (!maySee(parts, "findings")) throw new AppError("not_your_part", "Findings are not part of what you see on this move.");
}

/** All findings of a move, every carrier's: the next one sees what was answered before. */
export async function listFindings(viewer: Viewer, moveId: string, now = new Date()): Promise<FindingsBoard> {
  const { move, parts } = await requireMove(viewer, moveId);
  requireFindings(parts);
  const unit = await unsafeUnit(db(), moveId);
  const rows = await findingRows(db(), moveId);
  const said = await entryRows(db(), eq(findingEntries.moveId, moveId));
  const photos = await unsafePhotosOf(db(), "finding", rows.map(({ finding }) => finding.id));
  const route = await unsafeInspectedLegs(db(), moveId);
  return {
    moveId, at: now.toISOString(), unit,
    findings: rows.map((row) => viewOf(row, unit, said.filter((entry) => entry.findingId === row.finding.id), photos.get(row.finding.id)?.length ?? 0)),
    mayPost: route.map((leg) => ({ legId: leg.legId, may: move.state === "open" ? mayOnLeg(parts, "finding.post", leg) : null })),
  };
}

/** One finding with its thread and photos. */
export async function getFinding(viewer: Viewer, moveId: string, findingId: string, now = new Date()): Promise<FindingDetail> {
  const { move, parts } = await requireMove(viewer, moveId);
  requireFindings(parts);
  const unit = await unsafeUnit(db(), moveId);
  const rows = await findingRows(db(), moveId);
  const row = rows.find(({ finding }) => finding.id === findingId);
  if (!row) throw new AppError("not_found", "No such finding.");
  const said = await entryRows(db(), eq(findingEntries.findingId, findingId));
  const photos = (await unsafePhotosOf(db(), "finding", [findingId])).get(findingId) ?? [];
  const entryPhotos = await unsafePhotosOf(db(), "finding-entry", said.map(({ id }) => id));
  const view = viewOf(row, unit, said, photos.length);
  const leg = (await unsafeInspectedLegs(db(), moveId)).find((one) => one.legId === view.legId);
  const mayAct = (act: FindingAct) => (leg && move.state === "open" && denyState(view.state, act) === null ? mayOnLeg(parts, ACTION_OF[act], leg) : null);
  return {
    ...view, moveId, now: now.toISOString(), unit, total: rows.length, photos,
    entries: said.map((entry): FindingEntry => {
      const { findingId: _finding, at, ...rest } = entry;
      return { ...rest, at: at.toISOString(), photos: entryPhotos.get(entry.id) ?? [] };
    }),
    may: Object.fromEntries(FINDING_ACTS.map((act) => [act, mayAct(act)])) as FindingDetail["may"],
  };
}

/** No viewer: rooms that have checked one. The unit as findings show it. */
export async function unsafeUnit(reader: Reader, moveId: string): Promise<FoundUnit> {
  const [unit] = await reader.select({ mark: equipment.mark, number: equipment.number, shape: equipment.shape, axles: equipment.axles, fEnd: equipment.fEnd }).from(equipment).where(eq(equipment.moveId, moveId));
  return { mark: unit?.mark ?? "", number: unit?.number ?? "", form: unit ? unitFormOf(unit) : null };
}

const findingRows = (reader: Reader, moveId: string) =>
  reader.select({ finding: getTableColumns(findings), carrierName: legs.carrierName, zone: legs.fromZone, visitNumber: inspections.number, visitedOn: inspections.visitedOn, inspectorName: inspections.inspectorName, air: inspections.air })
    .from(findings).innerJoin(legs, eq(legs.id, findings.legId)).innerJoin(inspections, eq(inspections.id, findings.inspectionId))
    .where(eq(findings.moveId, moveId)).orderBy(asc(findings.number));
type FindingRow = Awaited<ReturnType<typeof findingRows>>[number];

const entryRows = (reader: Reader, where: ReturnType<typeof eq>) =>
  reader.select({
    id: findingEntries.id, findingId: findingEntries.findingId, round: findingEntries.round, kind: findingEntries.kind, text: findingEntries.text, reading: findingEntries.reading, wouldSatisfy: findingEntries.wouldSatisfy,
    byName: findingEntries.byName, byCompanyName: findingEntries.byCompanyName, enteredFor: findingEntries.enteredFor, at: findingEntries.at,
  }).from(findingEntries).where(where).orderBy(asc(findingEntries.at), asc(findingEntries.id));
type EntryRow = Awaited<ReturnType<typeof entryRows>>[number];

function viewOf({ finding, ...joined }: FindingRow, unit: FoundUnit, said: readonly EntryRow[], photoCount: number): FindingView {
  const { number, placeNote, byUserId: _by, moveId: _move, at, ...shown } = finding;
  const component = findComponent(finding.componentId);
  const place = finding.placeId && unit.form ? placeName(finding.placeId, unit.form.axles) : finding.placeId;
  return {
    ...shown, ...joined, label: findingLabel(number), component: component?.label ?? finding.componentId, group: component?.group ?? null, where: whereWords(place, placeNote), photoCount,
    sentBack: finding.state === "open" && finding.rounds > 0, stateSince: (said.at(-1)?.at ?? at).toISOString(), at: at.toISOString(),
  };
}

/** No viewer: the acceptance room has checked one. The findings of a leg as a signature covers them. */
export async function unsafeFindingsOfLeg(reader: Reader, moveId: string, legId: string) {
  const rows = await reader.select({ id: findings.id, number: findings.number, componentId: findings.componentId, placeId: findings.placeId, severity: findings.severity, state: findings.state, rounds: findings.rounds })
    .from(findings).where(and(eq(findings.moveId, moveId), eq(findings.legId, legId))).orderBy(asc(findings.number));
  return rows.map(({ number, ...row }) => ({ ...row, label: findingLabel(number), component: findComponent(row.componentId)?.label ?? row.componentId }));
}

/** No viewer: a command has checked one. What was said last about a finding. */
export async function unsafeLastEntry(reader: Reader, findingId: string) {
  return (await entryRows(reader, eq(findingEntries.findingId, findingId))).at(-1) ?? null;
}
