import { asc, eq } from "drizzle-orm";
import type { Db } from "@/db/client";
import { legs, moves, moveSeats, prepItems } from "@/db/schema";
import type { SeatPart } from "@/lib/access/vocabulary";
import { listAcceptances } from "@/lib/acceptance/queries";
import { signAcceptance } from "@/lib/acceptance/commands";
import type { RestrictionId } from "@/lib/acceptance/vocabulary";
import { newId } from "@/lib/ids";
import { openMove } from "@/lib/moves/commands";
import { openMoveInput } from "@/lib/moves/input";
import { fillPrep, finishItem, signPhase, skipItem } from "@/lib/prep/commands";
import { getPrep } from "@/lib/prep/queries";
import type { PrepPhase } from "@/lib/prep/vocabulary";
import { appendRecord } from "@/lib/record/commands";
import { refreshStanding } from "@/lib/standing/commands";
import type { Viewer } from "@/lib/viewer/types";
import type { DemoClock } from "./clock";
import type { DemoCast } from "./people";
import { takePhoto } from "./photos";
import type { Picture } from "./pictures";

/** What the scenario's cases are played with. */
export type DemoStage = { db: Db; clock: DemoClock; cast: DemoCast };

export const who = (stage: DemoStage, key: string): Viewer => {
  const viewer = stage.cast.people[key];
  if (!viewer) throw new Error(`nobody in the demo is called ${key}`);
  return viewer;
};

/** Opens a case as its owner would, through the same form. */
export async function openCase(stage: DemoStage, form: Record<string, unknown>, at: Date) {
  const owner = who(stage, "owner");
  const input = openMoveInput.parse({ companyId: stage.cast.companyIds["Vellum Ridge Heritage Line"], aliases: [], note: "Demo: everything in this case is invented.", ...form });
  const { moveId } = await openMove(owner, input, stage.clock.attempt(at), fillPrep);
  const legIds = (await stage.db.select({ id: legs.id }).from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq))).map((leg) => leg.id);
  return { moveId, legIds };
}

/** Seats a company as if its people had followed their invitation. */
export async function seat(stage: DemoStage, moveId: string, key: string, part: SeatPart, legId: string | null, at: Date): Promise<void> {
  const person = who(stage, key);
  const company = person.memberships[0];
  if (!company) throw new Error(`${key} works nowhere`);
  await stage.db.transaction(async (tx) => {
    await tx.select({ id: moves.id }).from(moves).where(eq(moves.id, moveId)).for("update");
    await tx.insert(moveSeats).values({ id: newId("seat"), moveId, companyId: company.companyId, part, legId, legKey: legId ?? "-", createdAt: at });
    if (part === "carrier" && legId) await tx.update(legs).set({ carrierCompanyId: company.companyId }).where(eq(legs.id, legId));
    if (part === "payer" && legId) await tx.update(legs).set({ payerCompanyId: company.companyId, payerName: company.companyName }).where(eq(legs.id, legId));
    const by = { userId: person.userId, name: person.name, companyId: company.companyId, companyName: company.companyName, part };
    await appendRecord(tx, moveId, by, { kind: "party.joined", legId, detail: { name: person.name, company: company.companyName, part } }, at);
    await refreshStanding(tx, moveId, at);
  });
}

/** What is written or shown for items that ask for it, by template id; `skip` says why an item does not apply. */
export type PrepNotes = Record<string, { value?: string; tag?: string; photo?: Picture; skip?: string }>;

/** Works off the items of one phase, all but those in `leave`. */
export async function prepare(stage: DemoStage, moveId: string, phase: PrepPhase, notes: PrepNotes, at: Date, leave: readonly string[] = []): Promise<void> {
  const contractor = who(stage, "contractor");
  const { clock, db } = stage;
  const rows = await db.select().from(prepItems).where(eq(prepItems.moveId, moveId)).orderBy(asc(prepItems.order));
  const taken = new Map<Picture, string>();
  const once = async (picture: Picture) => taken.get(picture) ?? taken.set(picture, await takePhoto(clock, contractor, moveId, picture, at)).get(picture) ?? "";
  let tags = 410;
  for (const item of rows.filter((row) => row.phase === phase && row.state === "to-do" && !leave.includes(row.templateId))) {
    const note = notes[item.templateId] ?? {};
    const base = { moveId, itemId: item.id, version: item.version };
    if (note.skip) {
      await skipItem(contractor, { ...base, why: note.skip }, clock.attempt(at));
      continue;
    }
    tags += 1;
    const picture = note.photo ?? (item.needsPhoto ? notes["any"]?.photo : undefined);
    const photoIds = picture && item.needsPhoto ? [await once(picture)] : [];
    const value = item.valueLabel ? (note.value ?? "as found, in order") : null;
    await finishItem(contractor, { ...base, value, tagNumber: item.needsTag ? (note.tag ?? `0${tags}`) : null, note: null, photoIds }, clock.attempt(at));
  }
}

export async function signPrep(stage: DemoStage, moveId: string, phase: PrepPhase, at: Date): Promise<void> {
  const contractor = who(stage, "contractor");
  const view = (await getPrep(contractor, moveId)).phases.find((one) => one.phase === phase);
  await signPhase(contractor, { moveId, phase, name: contractor.name, rowsHash: view?.rowsHash ?? "" }, stage.clock.attempt(at));
}

/** The inspector's acceptance of a leg, over what its page shows. */
export async function accept(stage: DemoStage, key: string, moveId: string, legId: string, given: { number: string; restrictions: RestrictionId[]; restrictionNote?: string }, at: Date): Promise<void> {
  const inspector = who(stage, key);
  const shown = (await listAcceptances(inspector, moveId)).legs.find((leg) => leg.legId === legId);
  await signAcceptance(inspector, { moveId, legId, restrictions: given.restrictions, restrictionNote: given.restrictionNote ?? null, number: given.number, validUntil: null, name: inspector.name, rowsHash: shown?.rowsHash ?? "", enteredFor: null }, stage.clock.attempt(at));
}
