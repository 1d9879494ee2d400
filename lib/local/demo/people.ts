import type { Db } from "@/db/client";
import { accounts, companies, companyMembers, users } from "@/db/schema";
import { auth } from "@/lib/auth";
import { newId } from "@/lib/ids";
import { unsafeViewerOf } from "@/lib/viewer/queries";
import type { Viewer } from "@/lib/viewer/types";
import { DEMO_PASSWORD, DEMO_PEOPLE, type DemoPerson } from "../demo-people";

const MARKS: Record<string, string> = { "Quillan & Sandbar": "ZQSR", "Sable Mountain Lines": "ZSML" };

/** The demo's people by key, and its companies by name. */
export type DemoCast = { people: Record<string, Viewer>; companyIds: Record<string, string> };

/** Makes the companies and the people with checked addresses and one password. */
export async function makePeople(db: Db, at: Date): Promise<DemoCast> {
  const companyIds: Record<string, string> = {};
  for (const name of new Set<string>(DEMO_PEOPLE.map((one) => one.company).filter(Boolean))) {
    const id = newId("company");
    companyIds[name] = id;
    await db.insert(companies).values({ id, name, nameKey: name.toLowerCase(), mark: MARKS[name] ?? null, createdAt: at });
  }
  const password = await (await auth().$context).password.hash(DEMO_PASSWORD);
  const people: Record<string, Viewer> = {};
  for (const one of DEMO_PEOPLE) people[one.key] = await makePerson(db, one, companyIds[one.company] ?? null, password, at);
  return { people, companyIds };
}

async function makePerson(db: Db, { name, email, works }: DemoPerson, companyId: string | null, password: string, at: Date): Promise<Viewer> {
  const id = newId("user");
  const { siteAdmin = false, ...rest } = works;
  await db.insert(users).values({ id, name, email, emailVerified: true, siteAdmin, createdAt: at, updatedAt: at });
  await db.insert(accounts).values({ id: newId("account"), accountId: id, providerId: "credential", userId: id, password, createdAt: at, updatedAt: at });
  if (companyId) await db.insert(companyMembers).values({ companyId, userId: id, joinedAt: at, admittedAt: at, ...rest });
  const viewer = await unsafeViewerOf(id, null);
  if (!viewer) throw new Error(`the demo's ${name} could not be made`);
  return viewer;
}

