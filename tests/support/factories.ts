import { randomUUID } from "node:crypto";
import { db } from "@/db/client";
import { companies, companyMembers, equipment, legs, moves, moveSeats, prepItems, users } from "@/db/schema";
import type { SeatPart } from "@/lib/access/vocabulary";
import { newId, sha256Hex } from "@/lib/ids";
import { refreshStanding } from "@/lib/standing/commands";
import { unsafeViewerOf } from "@/lib/viewer/queries";
import type { Attempt, Viewer } from "@/lib/viewer/types";

/** A fresh try of a write; pass `key` and `body` to repeat one. */
export const anAttempt = (given: Partial<Attempt> & { body?: string } = {}): Attempt => {
  const { body = randomUUID(), ...rest } = given;
  return { key: randomUUID(), door: "POST /test", bodyHash: sha256Hex(body), at: new Date(), ...rest };
};

let counter = 0;

/** A person with a checked address. */
export async function seedUser(name = "Ada Okoro", given: { email?: string; siteAdmin?: boolean; emailVerified?: boolean } = {}): Promise<string> {
  const id = newId("user");
  counter += 1;
  const at = new Date();
  await db().insert(users).values({ id, name, email: given.email ?? `person${counter}.${id.slice(-6)}@example.test`, emailVerified: given.emailVerified ?? true, siteAdmin: given.siteAdmin ?? false, createdAt: at, updatedAt: at });
  return id;
}

export async function seedCompany(name = "Sample Works", given: { mark?: string } = {}): Promise<string> {
  const id = newId("company");
  await db().insert(companies).values({ id, name, nameKey: name.toLowerCase(), mark: given.mark ?? null, createdAt: new Date() });
  return id;
}

type Works = { manager?: boolean; inspects?: boolean; bills?: boolean; dispatches?: boolean };

export async function seedMember(companyId: string, userId: string, works: Works = {}): Promise<void> {
  await db().insert(companyMembers).values({ companyId, userId, joinedAt: new Date(), admittedAt: new Date(), ...works });
}

/** A person of a new company of their own, as a viewer. */
export async function seedPerson(name: string, companyId: string, works: Works = {}): Promise<Viewer> {
  const userId = await seedUser(name);
  await seedMember(companyId, userId, works);
  return viewerOf(userId);
}

export async function viewerOf(userId: string): Promise<Viewer> {
  const viewer = await unsafeViewerOf(userId, null);
  if (!viewer) throw new Error("no such user");
  return viewer;
}

export async function seedSeat(moveId: string, companyId: string, part: SeatPart, legId: string | null = null): Promise<string> {
  const id = newId("seat");
  await db().insert(moveSeats).values({ id, moveId, companyId, part, legId, legKey: legId ?? "-", createdAt: new Date() });
  return id;
}

/** One prep item of a phase; `done` counts as worked off. */
export async function seedPrepItem(moveId: string, given: { templateId?: string; phase?: "where-it-stands" | "when-coupled"; done?: boolean; restore?: boolean } = {}): Promise<string> {
  const id = newId("prep");
  const { templateId = "P1", phase = "where-it-stands", done = false, restore = true } = given;
  await db().insert(prepItems).values({
    id, moveId, templateId, group: "power-plant", phase, order: 1, action: "Exhaust stack capped", why: "Rain runs into the engine", needsPhoto: false, needsTag: false, published: true,
    state: done ? "done" : "to-do", restoreAction: restore ? "Remove the cap" : null, restoreState: restore ? "later" : "none",
  });
  return id;
}

export type SeededMove = {
  moveId: string; legIds: [string, string];
  owner: Viewer; contractor: Viewer; receiver: Viewer; payer: Viewer;
  inspectorA: Viewer; clerkA: Viewer; deskA: Viewer; inspectorB: Viewer; clerkB: Viewer; deskB: Viewer;
  outsider: Viewer; removed: Viewer;
};

/** An open move over two carriers' legs with every part seated, one prep item per phase, and two people without a seat: an outsider and a removed member of the owner. */
export async function seedMove(given: { prepDone?: boolean } = {}): Promise<SeededMove> {
  const names = ["Vellum Ridge Heritage Line", "Ibarra Rail Mechanical", "Alder Gap Museum", "Fenn Valley Fund", "Quillan & Sandbar", "Sable Mountain Lines", "Marrow Pit"];
  const [own, con, rec, pay, carA, carB, out] = (await Promise.all(names.map((name) => seedCompany(name)))) as [string, string, string, string, string, string, string];
  const owner = await seedPerson("R. Okafor", own, { manager: true });
  const removedId = await seedUser("L. Former");
  await db().insert(companyMembers).values({ companyId: own, userId: removedId, joinedAt: new Date(), admittedAt: new Date(), removedAt: new Date() });
  const moveId = newId("move");
  const [legA, legB] = [newId("leg"), newId("leg")];
  const at = new Date();
  await db().insert(moves).values({
    id: moveId, caseNumber: `99-${moveId.slice(-6)}`, ownerCompanyId: own, originName: "Sand Hollow elevator", originPlace: "Sand Hollow", originZone: "America/Chicago",
    destinationName: "Vellum Ridge shops", destinationPlace: "Quill Creek", destinationZone: "America/Denver", searchText: "zvrx 2783 sand hollow quill creek", openedBy: owner.userId, openedAt: at,
  });
  await db().insert(equipment).values({ moveId, mark: "ZVRX", number: "2783", fEnd: "short-hood", shape: "hood", axles: 6, weightLb: 362_400, brakeSchedule: "26-L", bearings: "roller-rotating-cap", alignment: "alignment-control", facts: {} });
  await db().insert(legs).values([
    { id: legA, moveId, seq: 1, carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", carrierCompanyId: carA, fromPlace: "Sand Hollow", fromZone: "America/Chicago", toPlace: "Ardell", toZone: "America/Denver", payerName: "Fenn Valley Fund", payerCompanyId: pay },
    { id: legB, moveId, seq: 2, carrierName: "Sable Mountain Lines", carrierMark: "ZSML", carrierCompanyId: carB, fromPlace: "Ardell", fromZone: "America/Denver", toPlace: "Quill Creek", toZone: "America/Denver", payerName: "Vellum Ridge Heritage Line", payerCompanyId: own },
  ]);
  const seats: [string, SeatPart, string | null][] = [[own, "owner", null], [con, "contractor", null], [rec, "receiver", null], [pay, "payer", legA], [own, "payer", legB], [carA, "carrier", legA], [carB, "carrier", legB]];
  for (const [companyId, part, legId] of seats) await seedSeat(moveId, companyId, part, legId);
  await seedPrepItem(moveId, { templateId: "P1", done: given.prepDone ?? false });
  await seedPrepItem(moveId, { templateId: "A9", phase: "when-coupled", done: false, restore: false });
  await db().transaction((tx) => refreshStanding(tx, moveId, at));
  const person = (name: string, companyId: string, works: Works = {}) => seedPerson(name, companyId, works);
  return {
    moveId, legIds: [legA, legB], owner,
    contractor: await person("T. Ibarra", con, { manager: true }), receiver: await person("M. Alder", rec), payer: await person("F. Fenn", pay),
    inspectorA: await person("V. Sorrel", carA, { inspects: true }), clerkA: await person("B. Quill", carA, { bills: true }), deskA: await person("D. Sand", carA, { dispatches: true }),
    inspectorB: await person("I. Sable", carB, { inspects: true }), clerkB: await person("C. Mount", carB, { bills: true }), deskB: await person("E. Ridge", carB, { dispatches: true }),
    outsider: await person("O. Marrow", out, { manager: true, inspects: true, bills: true, dispatches: true }), removed: await viewerOf(removedId),
  };
}
