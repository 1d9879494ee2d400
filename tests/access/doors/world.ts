import { randomBytes } from "node:crypto";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { moves } from "@/db/schema";
import { seedUser } from "../../support/factories";
import { signedIn } from "../../support/session";
import type { Persona } from "../personas";
import type { DoorIds } from "../rows/doors";
import { seedCase, type Case } from "../scenario";
import { accepted, drafted, followed, found, instructed, invited, itemOf, mailFailed, photographed, quoted, seatOf, sessionOf, sighted } from "../steps";

/** A case with one of everything that a path can name, and the keys of those who come to its doors. */
export type World = {
  ids: DoorIds;
  /** Of the same kinds, and of nothing. */
  ofNothing: DoorIds;
  caseNumber: string;
  cookieOf: (persona: Persona) => Promise<string>;
  /** Somebody who has never been here: each door has its own, since tries are counted for each. */
  stranger: () => Promise<string>;
};

async function idsOf(of: Case): Promise<DoorIds> {
  const { owner, contractor, inspectorA } = of.people;
  const { inspectionId, findingId } = await found(of, of.legA);
  return {
    moveId: of.moveId, legId: of.legA, inspectionId, findingId, itemId: (await itemOf(of)).itemId, acceptanceId: await accepted(of, of.legA), quoteId: await quoted(of, of.legA), instructionId: await instructed(of, of.legA),
    sightingId: await sighted(of, of.legA, "seen"), photoId: await photographed(of, contractor), seatId: await seatOf(of, "contractor"), invitationId: await invited(of, of.companies.receiver, "receiver"), followId: await followed(of),
    draftId: await drafted(of), companyId: of.companies.owner, userId: inspectorA.userId, sessionId: await sessionOf(owner), outboxId: await mailFailed(),
  };
}

const made = (id: string) => `${id.slice(0, 4)}${randomBytes(14).toString("hex")}`;

export async function openWorld(): Promise<World> {
  const of = await seedCase();
  const ids = await idsOf(of);
  const [head] = await db().select({ caseNumber: moves.caseNumber }).from(moves).where(eq(moves.id, of.moveId));
  return {
    ids,
    ofNothing: Object.fromEntries(Object.entries(ids).map(([name, id]) => [name, made(id)])) as DoorIds,
    caseNumber: head?.caseNumber ?? "",
    cookieOf: (persona) => signedIn(of.people[persona].userId),
    stranger: async () => signedIn(await seedUser("O. Stranger")),
  };
}
