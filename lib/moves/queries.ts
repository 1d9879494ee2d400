import "server-only";
import { and, asc, count, desc, eq, exists, inArray, isNull, or, sql, type SQL } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { acceptances, companies, companyMembers, equipment, equipmentAliases, legs, moveDrafts, moves, moveSeats, seatPeople, users, waits } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { heldSeat, presentMember, requireMember, requireMove, seenBy } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Membership, Viewer } from "@/lib/viewer/types";
import { joinAnswers } from "./answers";
import { caseFileOf } from "./case";
import { draftRoute, draftUnit } from "./draft";
import { PAGE_SIZE, type MoveFilter } from "./list-filter";
import { searchPatterns } from "./search";
import type { CaseFile, Draft, DraftRow, Equipment, MovePage, MoveRow, RowLeg } from "./types";
import { BODY_SHAPES } from "./vocabulary";

const CARRIER_WORK = { inspector: "inspects", billing: "bills", desk: "dispatches" } as const satisfies Record<string, keyof Membership>;

/** Seats of the viewer's whose turn it is. `wide` counts a carrier's seat even when the viewer does other work there. */
function isTurn(viewer: Viewer, wide: boolean): SQL {
  const sameLeg = or(isNull(moveSeats.legId), isNull(moves.waitingLegId), eq(moveSeats.legId, moves.waitingLegId));
  const works = Object.entries(CARRIER_WORK).map(([part, work]) => {
    const mine = viewer.memberships.filter((one) => one[work]).map((one) => one.companyId);
    const guest = exists(db().select({ one: sql`1` }).from(seatPeople)
      .where(and(eq(seatPeople.seatId, moveSeats.id), eq(seatPeople.userId, viewer.userId), isNull(seatPeople.removedAt), eq(seatPeople[work], true))));
    return and(eq(moves.waitingPart, part as keyof typeof CARRIER_WORK), wide ? undefined : or(inArray(moveSeats.companyId, mine), guest));
  });
  const asSeated = sql`${moveSeats.part} = ${moves.waitingPart}`;
  const turn = or(asSeated, and(eq(moveSeats.part, "carrier"), or(...works)));
  return exists(db().select({ one: sql`1` }).from(moveSeats).where(and(eq(moveSeats.moveId, moves.id), heldSeat(viewer), sameLeg, turn)));
}

function conditionOf(viewer: Viewer, filter: MoveFilter): SQL | undefined {
  const { q, waiting, stage, carrier } = filter;
  const turn = waiting === "me" ? isTurn(viewer, false) : waiting === "company" ? isTurn(viewer, true) : waiting ? eq(moves.waitingPart, waiting) : undefined;
  return and(
    seenBy(viewer),
    ...searchPatterns(q).map((pattern) => sql`${moves.searchText} like ${pattern} escape '\\\\'`),
    turn,
    stage === "all" ? undefined : stage === "open" ? eq(moves.state, "open") : eq(moves.stage, stage),
    carrier ? exists(db().select({ one: sql`1` }).from(legs).where(and(eq(legs.moveId, moves.id), eq(legs.carrierName, carrier)))) : undefined,
  );
}

/** Every order ends with the id, so that pages neither repeat nor skip a move. */
function orderOf({ sort, descending }: MoveFilter): SQL[] {
  const [way, back] = descending ? [desc, asc] : [asc, desc];
  const by: Record<MoveFilter["sort"], SQL[]> = {
    waiting: [sql`${moves.waitingSince} is null`, back(moves.waitingSince)],
    days: [back(moves.openedAt)],
    unit: [way(equipment.mark), way(sql`length(${equipment.number})`), way(equipment.number)],
    from: [way(moves.originName), way(moves.destinationName)],
    stage: [way(moves.stage)],
  };
  return [...by[sort], way(moves.id)];
}

const howMany = async (condition: SQL | undefined) => (await db().select({ n: count() }).from(moves).where(condition))[0]?.n ?? 0;

/** One page of the moves that the viewer sees, with the numbers at its head. Takes the same number of queries however many there are. */
export async function listMoves(viewer: Viewer, filter: MoveFilter, now = new Date()): Promise<MovePage> {
  const condition = conditionOf(viewer, filter);
  const found = await db().select({
    moveId: moves.id, caseNumber: moves.caseNumber, state: moves.state, stage: moves.stage, originName: moves.originName, destinationName: moves.destinationName, progressMil: moves.progressMil,
    openedAt: moves.openedAt, closedAt: moves.closedAt, cancelledAt: moves.cancelledAt, mark: equipment.mark, number: equipment.number, shape: equipment.shape,
    part: moves.waitingPart, waitingLegId: moves.waitingLegId, waitingName: moves.waitingName, waitingFor: moves.waitingFor, waitingCount: moves.waitingCount, since: moves.waitingSince,
    you: sql`${isTurn(viewer, false)}`.mapWith(Boolean), company: sql`${isTurn(viewer, true)}`.mapWith(Boolean),
  }).from(moves).innerJoin(equipment, eq(equipment.moveId, moves.id)).where(condition).orderBy(...orderOf(filter)).limit(PAGE_SIZE).offset((filter.page - 1) * PAGE_SIZE);
  const routesOf = await legsOfMoves(found.map((row) => row.moveId));
  const rows = found.map(({ closedAt, cancelledAt, part, waitingLegId, waitingName, waitingFor, waitingCount, since, you, company, shape, openedAt, ...row }): MoveRow => ({
    ...row,
    shape: BODY_SHAPES.find((one) => one === shape) ?? "hood",
    openedAt: openedAt.toISOString(),
    endedAt: (closedAt ?? cancelledAt)?.toISOString() ?? null,
    legs: routesOf.get(row.moveId) ?? [],
    waiting: part && waitingFor ? { part, legId: waitingLegId, name: waitingName ?? "", waitingFor, count: waitingCount, since: (since ?? openedAt).toISOString(), you, yourCompany: company && !you } : null,
  }));
  const open = and(seenBy(viewer), eq(moves.state, "open"));
  const [total, openCount, waitingOnYou] = await Promise.all([howMany(condition), howMany(open), howMany(and(open, isTurn(viewer, true)))]);
  return { rows, total, open: openCount, waitingOnYou, filter, at: now.toISOString() };
}

async function legsOfMoves(moveIds: string[]): Promise<Map<string, RowLeg[]>> {
  const rows = await db().select({ moveId: legs.moveId, legId: legs.id, seq: legs.seq, carrierName: legs.carrierName }).from(legs).where(inArray(legs.moveId, moveIds)).orderBy(asc(legs.seq));
  const found = new Map<string, RowLeg[]>();
  for (const { moveId, ...leg } of rows) found.set(moveId, [...(found.get(moveId) ?? []), leg]);
  return found;
}

/** Carriers of the moves that the viewer sees, for the list's filter. */
export async function listCarrierNames(viewer: Viewer): Promise<string[]> {
  const rows = await db().selectDistinct({ name: legs.carrierName }).from(legs).innerJoin(moves, eq(moves.id, legs.moveId)).where(seenBy(viewer)).orderBy(asc(legs.carrierName)).limit(200);
  return rows.map((row) => row.name);
}

/** Drafts of the viewer's companies, the latest first. */
export async function listDrafts(viewer: Viewer): Promise<DraftRow[]> {
  const rows = await db().select({ draftId: moveDrafts.id, companyName: companies.name, body: moveDrafts.body, updatedAt: moveDrafts.updatedAt }).from(moveDrafts)
    .innerJoin(companies, eq(companies.id, moveDrafts.companyId)).where(inArray(moveDrafts.companyId, viewer.memberships.map((one) => one.companyId))).orderBy(desc(moveDrafts.updatedAt)).limit(50);
  return rows.map(({ body, updatedAt, ...row }) => ({ ...row, unit: draftUnit(body), route: draftRoute(body), updatedAt: updatedAt.toISOString() }));
}

/** One draft of the viewer's company; refuses `not_found` for everybody else. */
export async function getDraft(viewer: Viewer, draftId: string, reader: Reader = db()): Promise<Draft> {
  const [row] = await reader.select({ draftId: moveDrafts.id, companyId: moveDrafts.companyId, body: moveDrafts.body, version: moveDrafts.version, updatedAt: moveDrafts.updatedAt })
    .from(moveDrafts).where(eq(moveDrafts.id, draftId));
  if (!row || !viewer.memberships.some((one) => one.companyId === row.companyId)) throw new AppError("not_found", "No such draft.");
  requireMember(viewer, row.companyId);
  return { ...row, updatedAt: row.updatedAt.toISOString() };
}

const unitColumns = { mark: equipment.mark, number: equipment.number, fEnd: equipment.fEnd, shape: equipment.shape, axles: equipment.axles, weightLb: equipment.weightLb, model: equipment.model,
  builtYear: equipment.builtYear, brakeSchedule: equipment.brakeSchedule, bearings: equipment.bearings, alignment: equipment.alignment };

/** No viewer: the caller has checked. The unit as kept, with the other names it goes by. */
export async function unsafeEquipmentOf(reader: Reader, moveId: string) {
  const [row] = await reader.select({ ...unitColumns, facts: equipment.facts, version: equipment.version }).from(equipment).where(eq(equipment.moveId, moveId));
  if (!row) throw new AppError("not_found", "No such move.");
  const others = await reader.select({ alias: equipmentAliases.alias }).from(equipmentAliases).where(eq(equipmentAliases.moveId, moveId)).orderBy(asc(equipmentAliases.id));
  const { facts, version, ...columns } = row;
  return { columns, facts, version, aliases: others.map((one) => one.alias) };
}

/** The unit's answers to the requirement catalogue. */
export async function getEquipment(viewer: Viewer, moveId: string): Promise<Equipment> {
  const { parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "equipment")) throw new AppError("not_your_part", "The unit’s papers are not part of what you do on this move.");
  const { columns, facts, aliases, version } = await unsafeEquipmentOf(db(), moveId);
  return { moveId, answers: joinAnswers(columns, facts), aliases, version };
}

/** Legs whose carrier has people here. */
async function legsOnBoard(moveId: string): Promise<Set<string | null>> {
  const seat = and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "carrier"), isNull(moveSeats.removedAt));
  const members = await db().selectDistinct({ legId: moveSeats.legId }).from(moveSeats).innerJoin(companyMembers, and(eq(companyMembers.companyId, moveSeats.companyId), presentMember))
    .innerJoin(users, and(eq(users.id, companyMembers.userId), isNull(users.disabledAt))).where(seat);
  const guests = await db().selectDistinct({ legId: moveSeats.legId }).from(moveSeats).innerJoin(seatPeople, and(eq(seatPeople.seatId, moveSeats.id), isNull(seatPeople.removedAt)))
    .innerJoin(users, and(eq(users.id, seatPeople.userId), isNull(users.disabledAt))).where(seat);
  return new Set([...members, ...guests].map((row) => row.legId));
}

/** The whole head of a case with its route and conditions, for whoever sits on the move. */
export async function getCaseFile(viewer: Viewer, moveId: string, now = new Date()): Promise<CaseFile> {
  const { parts } = await requireMove(viewer, moveId);
  const [head] = await db().select().from(moves).where(eq(moves.id, moveId));
  if (!head) throw new AppError("not_found", "No such move.");
  const unit = await unsafeEquipmentOf(db(), moveId);
  const rows = await db().select({ legId: legs.id, fromZone: legs.fromZone, toZone: legs.toZone, version: legs.version }).from(legs).where(eq(legs.moveId, moveId));
  const onBoard = await legsOnBoard(moveId);
  const waited = await db().select({ part: waits.part, name: waits.name, since: waits.since, until: waits.until }).from(waits).where(eq(waits.moveId, moveId)).orderBy(asc(waits.since));
  const accepted = await db().select({ carrierName: legs.carrierName, restrictions: acceptances.restrictions }).from(acceptances).innerJoin(legs, eq(legs.id, acceptances.legId))
    .where(and(eq(acceptances.moveId, moveId), isNull(acceptances.withdrawnAt)));
  const { id, caseNumber, wantedFrom, wantedTo, note, version } = head;
  return caseFileOf({
    head: {
      moveId: id, caseNumber, wantedFrom, wantedTo, note, version,
      origin: { name: head.originName, place: head.originPlace, zone: head.originZone },
      destination: { name: head.destinationName, place: head.destinationPlace, zone: head.destinationZone },
      openedAt: head.openedAt.toISOString(),
      endedAt: (head.closedAt ?? head.cancelledAt)?.toISOString() ?? null,
      waitingSince: head.waitingSince?.toISOString() ?? null,
    },
    unit: { ...unit.columns, facts: unit.facts, aliases: unit.aliases },
    legs: rows.map((row) => ({ ...row, onBoard: onBoard.has(row.legId) })),
    facts: await unsafeGatherFacts(db(), moveId),
    waits: waited.map((one) => ({ ...one, since: one.since.toISOString(), until: one.until?.toISOString() ?? null })),
    acceptances: accepted,
    parts,
    at: now.toISOString(),
  });
}
