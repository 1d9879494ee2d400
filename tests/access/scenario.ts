import { and, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { companyMembers, equipment, legs, moves, moveSeats, prepItems, seatPeople } from "@/db/schema";
import { newId } from "@/lib/ids";
import type { Viewer } from "@/lib/viewer/types";
import { seedMove, seedUser, viewerOf, type SeededMove } from "../support/factories";
import type { Persona } from "./personas";
import type { Secret } from "./secrets";

/** A move with everybody who could come to it. */
export type Case = { moveId: string; legA: string; legB: string; people: Record<Persona, Viewer>; companies: Record<"owner" | "contractor" | "receiver" | "payer" | "carrierA" | "carrierB", string>; secrets: Secret[] };

const companyOf = (viewer: Viewer): string => {
  const [first] = viewer.memberships;
  if (!first) throw new Error(`${viewer.name} belongs to no company.`);
  return first.companyId;
};

/** Invited to the first carrier's seat alone, to inspect; that company has not admitted them. */
async function seedGuest(moveId: string, companyId: string): Promise<Viewer> {
  const userId = await seedUser("G. Lone");
  const at = new Date();
  const [seat] = await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.companyId, companyId)));
  if (!seat) throw new Error("The first carrier has no seat.");
  await db().insert(companyMembers).values({ companyId, userId, inspects: true, joinedAt: at });
  await db().insert(seatPeople).values({ seatId: seat.id, userId, inspects: true, joinedAt: at });
  return viewerOf(userId);
}

/** Carrier A has a manager, who also dispatches. */
async function managing(viewer: Viewer): Promise<Viewer> {
  await db().update(companyMembers).set({ manager: true }).where(eq(companyMembers.userId, viewer.userId));
  return viewerOf(viewer.userId);
}

/** Names are kept apart from the people, so that `SeededMove` may grow. */
const peopleOf = ({ owner, contractor, receiver, payer, inspectorA, clerkA, deskA, inspectorB, clerkB, deskB, outsider, removed }: SeededMove) =>
  ({ owner, contractor, receiver, payer, inspectorA, clerkA, deskA, inspectorB, clerkB, deskB, outsider, removed });

/** A case among people of its own. */
export async function seedCase(): Promise<Case> {
  const seeded = await seedMove();
  const [legA, legB] = seeded.legIds;
  const seated = { ...peopleOf(seeded), deskA: await managing(seeded.deskA) };
  const companies = {
    owner: companyOf(seated.owner), contractor: companyOf(seated.contractor), receiver: companyOf(seated.receiver), payer: companyOf(seated.payer),
    carrierA: companyOf(seated.inspectorA), carrierB: companyOf(seated.inspectorB),
  };
  const guest = await seedGuest(seeded.moveId, companies.carrierA);
  const siteAdmin = await viewerOf(await seedUser("S. Admin", { siteAdmin: true }));
  const people = { ...seated, guest, siteAdmin };
  return { moveId: seeded.moveId, legA, legB, people, companies, secrets: Object.entries(people).map(([name, { email }]) => ({ what: `the address of ${name}`, texts: [email], may: [name as Persona] })) };
}

/** The same case once more for the same people, untouched: a tenth of the writes that new people would take. */
async function copyOf(first: Case): Promise<Case> {
  const moveId = newId("move");
  const [legA, legB] = [newId("leg"), newId("leg")];
  const legOf = (id: string | null) => (id === first.legA ? legA : id === first.legB ? legB : null);
  const [move] = await db().select().from(moves).where(eq(moves.id, first.moveId));
  const [unit] = await db().select().from(equipment).where(eq(equipment.moveId, first.moveId));
  if (!move || !unit) throw new Error("The first case is gone.");
  await db().insert(moves).values({ ...move, id: moveId, caseNumber: `98-${moveId.slice(-6)}` });
  await db().insert(equipment).values({ ...unit, moveId });
  await db().insert(legs).values((await db().select().from(legs).where(eq(legs.moveId, first.moveId))).map((leg) => ({ ...leg, moveId, id: legOf(leg.id) ?? "" })));
  const seats = (await db().select().from(moveSeats).where(eq(moveSeats.moveId, first.moveId))).map((seat) => ({ ...seat, moveId, id: newId("seat"), legId: legOf(seat.legId), legKey: legOf(seat.legId) ?? "-" }));
  await db().insert(moveSeats).values(seats);
  const alone = seats.find(({ part, legId }) => part === "carrier" && legId === legA);
  await db().insert(seatPeople).values({ seatId: alone?.id ?? "", userId: first.people.guest.userId, inspects: true, joinedAt: new Date() });
  await db().insert(prepItems).values((await db().select().from(prepItems).where(eq(prepItems.moveId, first.moveId))).map((item) => ({ ...item, moveId, id: newId("prep") })));
  const guest = { ...first.people.guest, guestSeatIds: [...first.people.guest.guestSeatIds, alone?.id ?? ""] };
  return { ...first, people: { ...first.people, guest }, moveId, legA, legB };
}

let first: Promise<Case> | undefined;

/** An untouched case; all of them are of the same people. */
export const nextCase = async (): Promise<Case> => copyOf(await (first ??= seedCase()));
