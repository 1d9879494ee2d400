import type { Browser, BrowserContext, BrowserContextOptions, Page } from "@playwright/test";
import { and, asc, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { companies, equipment, findings, inspections, legs, payments, users } from "@/db/schema";
import { DEMO_PEOPLE, type DemoKey } from "@/lib/local/demo-people";
import { signedIn } from "../../support/session";
import { listen } from "./people";

/** A case of the demo scenario, by the number of its unit. */
export type DemoCase = { moveId: string; legIds: string[]; findingIds: string[]; inspectionIds: string[]; sessionIds: string[] };

export async function demoCase(number: string): Promise<DemoCase> {
  const [unit] = await db().select({ moveId: equipment.moveId }).from(equipment).where(eq(equipment.number, number)).orderBy(asc(equipment.moveId));
  if (!unit) throw new Error(`the demo has no unit ${number}`);
  const { moveId } = unit;
  const ofMove = async (rows: Promise<{ id: string | null }[]>) => (await rows).flatMap(({ id }) => id ?? []);
  return {
    moveId,
    legIds: await ofMove(db().select({ id: legs.id }).from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq))),
    findingIds: await ofMove(db().select({ id: findings.id }).from(findings).where(eq(findings.moveId, moveId)).orderBy(asc(findings.id))),
    inspectionIds: await ofMove(db().select({ id: inspections.id }).from(inspections).where(eq(inspections.moveId, moveId)).orderBy(asc(inspections.id))),
    sessionIds: await ofMove(db().select({ id: payments.sessionId }).from(payments).where(and(eq(payments.moveId, moveId), eq(payments.state, "paid")))),
  };
}

const person = (key: DemoKey) => {
  const found = DEMO_PEOPLE.find((one) => one.key === key);
  if (!found) throw new Error(`nobody in the demo is called ${key}`);
  return found;
};

export const emailOf = (key: DemoKey): string => person(key).email;

/** The company that somebody of the demo works for. */
export async function companyOf(key: DemoKey): Promise<string> {
  const [row] = await db().select({ id: companies.id }).from(companies).where(eq(companies.name, person(key).company));
  return row?.id ?? "";
}

/** Signs a person of the demo in without the page for it: that one hashes a password on purpose slowly, and counts the tries. */
export async function signInAs(context: BrowserContext, key: DemoKey): Promise<void> {
  const [row] = await db().select({ id: users.id }).from(users).where(eq(users.email, emailOf(key)));
  if (!row) throw new Error(`${key} has no account`);
  const [name = "", value = ""] = (await signedIn(row.id)).split("=");
  const host = new URL(process.env.APP_URL ?? "http://localhost:4000").hostname;
  // A browser takes the prefix of this cookie from a secure address only; it sends it to this machine's plain one as well.
  await context.addCookies([{ name, value, url: `https://${host}`, httpOnly: true, secure: true, sameSite: "Lax" }]);
}

/** A page in a browser of its own, signed in as somebody of the demo or as nobody. */
export async function pageAs(browser: Browser, key: DemoKey | null, options: BrowserContextOptions = {}): Promise<Page> {
  const context = await browser.newContext(options);
  await listen(context);
  if (key) await signInAs(context, key);
  return context.newPage();
}
