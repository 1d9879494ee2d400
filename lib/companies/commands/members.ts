import "server-only";
import { and, eq, inArray, isNull } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { companyMembers, moveSeats, seatPeople } from "@/db/schema";
import { requireMember } from "@/lib/access/scope";
import { AppError, refuse } from "@/lib/errors";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { AdmitMember, ChangeMember, OneMember } from "../input";
import { denyLastManager } from "../rules";
import { lockManaged } from "./company";

const rowOf = ({ companyId, userId }: OneMember) => and(eq(companyMembers.companyId, companyId), eq(companyMembers.userId, userId), isNull(companyMembers.removedAt));

/** Everybody present; read under the company's lock, so that two managers can't take each other's right at once. */
async function present(tx: Tx, companyId: string) {
  return tx.select().from(companyMembers).where(and(eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt))).for("update");
}

async function requirePresent(tx: Tx, one: OneMember) {
  const members = await present(tx, one.companyId);
  const row = members.find((member) => member.userId === one.userId);
  if (!row) throw new AppError("not_found", "No such person in this company.");
  return { row, admitted: members.filter((member) => member.admittedAt) };
}

/** Admits a guest: from now on they see all of the company's moves. */
export async function admitMember(viewer: Viewer, { companyId, userId, ...works }: AdmitMember, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    await lockManaged(tx, viewer, companyId);
    const { row } = await requirePresent(tx, { companyId, userId });
    await tx.update(companyMembers).set({ ...works, admittedAt: row.admittedAt ?? attempt.at }).where(rowOf({ companyId, userId }));
    await appendSiteLog(tx, { kind: "member.admitted", byUserId: viewer.userId, detail: { companyId, userId, ...works } }, attempt.at);
    return { companyId, userId };
  });
}

/** Changes what a member does for the company, and whether they manage it. */
export async function changeMember(viewer: Viewer, { companyId, userId, manager, ...works }: ChangeMember, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    await lockManaged(tx, viewer, companyId);
    const { row, admitted } = await requirePresent(tx, { companyId, userId });
    if (!row.admittedAt) throw new AppError("not_yet", "Admit this person first.");
    refuse(denyLastManager(admitted, userId, manager));
    await tx.update(companyMembers).set({ manager, ...works }).where(rowOf({ companyId, userId }));
    await appendSiteLog(tx, { kind: "member.changed", byUserId: viewer.userId, detail: { companyId, userId, manager, ...works } }, attempt.at);
    return { companyId, userId };
  });
}

/** Takes a person out of the company, from its moves at once; a manager may, and everybody for themselves. */
export async function removeMember(viewer: Viewer, { companyId, userId }: OneMember, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    if (userId === viewer.userId) requireMember(viewer, companyId);
    else await lockManaged(tx, viewer, companyId);
    const { admitted } = await requirePresent(tx, { companyId, userId });
    refuse(denyLastManager(admitted, userId, false));
    await tx.update(companyMembers).set({ removedAt: attempt.at, manager: false }).where(rowOf({ companyId, userId }));
    const seats = tx.select({ id: moveSeats.id }).from(moveSeats).where(eq(moveSeats.companyId, companyId));
    await tx.update(seatPeople).set({ removedAt: attempt.at }).where(and(eq(seatPeople.userId, userId), isNull(seatPeople.removedAt), inArray(seatPeople.seatId, seats)));
    await appendSiteLog(tx, { kind: "member.removed", byUserId: viewer.userId, detail: { companyId, userId } }, attempt.at);
    return { companyId, userId };
  });
}
