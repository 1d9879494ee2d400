import "server-only";
import { eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { companies, companyMembers } from "@/db/schema";
import { requireMember } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { EditCompany, MakeCompany } from "../input";
import { changesSince } from "../rules";
import { companyKey } from "../words";

/** Makes a company; who makes it becomes its manager. Whether another of the name exists is nobody's to learn here. */
export async function makeCompany(viewer: Viewer, { name, mark, phone }: MakeCompany, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    const companyId = newId("company");
    await tx.insert(companies).values({ id: companyId, name, nameKey: companyKey(name), mark, phone, createdAt: attempt.at });
    await tx.insert(companyMembers).values({ companyId, userId: viewer.userId, manager: true, joinedAt: attempt.at, admittedAt: attempt.at });
    await appendSiteLog(tx, { kind: "company.made", byUserId: viewer.userId, detail: { companyId, name } }, attempt.at);
    return { companyId };
  });
}

/** The company with its row locked, for a manager of it. */
export async function lockManaged(tx: Tx, viewer: Viewer, companyId: string) {
  const member = requireMember(viewer, companyId);
  if (!member.manager) throw new AppError("not_your_part", "Only a manager of the company can do this.");
  const [company] = await tx.select().from(companies).where(eq(companies.id, companyId)).for("update");
  if (!company || company.mergedIntoId) throw new AppError("not_found", "No such company.");
  return company;
}

/** Changes name, mark and phone; refuses with what changed when somebody else was first. */
export async function editCompany(viewer: Viewer, { companyId, version, ...facts }: EditCompany, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    const kept = await lockManaged(tx, viewer, companyId);
    if (kept.version !== version) throw new AppError("stale", "Somebody else has changed the company meanwhile. Look at what changed, then save again.", { fields: changesSince(kept, facts) });
    await tx.update(companies).set({ ...facts, nameKey: companyKey(facts.name), version: version + 1 }).where(eq(companies.id, companyId));
    await appendSiteLog(tx, { kind: "company.changed", byUserId: viewer.userId, detail: { companyId, from: { name: kept.name, mark: kept.mark, phone: kept.phone }, to: facts } }, attempt.at);
    return { companyId, version: version + 1 };
  });
}
