import { expect, type APIRequestContext, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { join } from "../support/arriving";
import { COMPANIES, NAMES, PLACES, type Journey, type Role } from "./cast";

type Work = "Inspects" | "Quotes" | "Gives movement";
type Asked = { role: Exclude<Role, "owner">; slot: string; company: string; path: string; works?: Work[]; nameless?: true };

const FIRST = `Carrier of leg 1: ${COMPANIES.carrierA}`;

/** Whom the owner asks to what, and where their letter leads. */
const ASKED: readonly Asked[] = [
  { role: "contractor", slot: "Contractor", company: COMPANIES.contractor, path: "prep" },
  { role: "inspector", slot: FIRST, company: COMPANIES.carrierA, path: "findings", works: ["Inspects"] },
  { role: "clerk", slot: FIRST, company: COMPANIES.carrierA, path: "fees", works: ["Quotes"] },
  { role: "desk", slot: FIRST, company: COMPANIES.carrierA, path: "movement", works: ["Gives movement"] },
  { role: "second", slot: `Carrier of leg 2: ${COMPANIES.carrierB}`, company: COMPANIES.carrierB, path: "findings", works: ["Inspects", "Quotes", "Gives movement"] },
  { role: "receiver", slot: "Receiver", company: COMPANIES.receiver, path: "", nameless: true },
  { role: "payer", slot: `Payer of leg 1, ${PLACES.from} to ${PLACES.interchange}`, company: COMPANIES.payer, path: "fees" },
];

async function invite(page: Page, { role, slot, company, works = [], nameless }: Asked, email: string): Promise<void> {
  await page.getByRole("combobox", { name: "Part" }).selectOption({ label: slot });
  const name = page.getByRole("textbox", { name: "Name of the company" });
  if ((await name.count()) > 0) await name.fill(company);
  await page.getByRole("textbox", { name: "E-mail address" }).first().fill(email);
  if (!nameless) await page.getByRole("textbox", { name: "Name of the person" }).fill(NAMES[role]);
  for (const work of works) await page.getByRole("checkbox", { name: new RegExp(`^${work}`) }).check();
  await page.getByRole("button", { name: "Send the letter" }).click();
  await expect(page.getByText("Done. The list above shows it.")).toBeVisible();
  await expect(page.getByRole("table", { name: "Letters of invitation" }).getByRole("row").filter({ hasText: email })).toContainText("Not opened yet");
}

/** The owner writes to each of them from the People tab. */
export async function inviteAll({ moveId, people }: Journey): Promise<void> {
  const { page } = people.owner;
  await page.getByRole("navigation", { name: "Parts of the case" }).getByRole("link", { name: "People" }).click();
  await expect(page).toHaveURL(routes.people(moveId));
  for (const asked of ASKED) await invite(page, asked, people[asked.role].email);
}

/** Each follows the letter and lands where their work is; that a scanner opened it before changed nothing. */
export async function joinAll({ moveId, unit, people }: Journey, request: APIRequestContext): Promise<void> {
  for (const { role, company, path, nameless } of ASKED) {
    const person = people[role];
    await join(person, { unit, company, name: nameless ? NAMES[role] : null }, request);
    await expect(person.page).toHaveURL(`${routes.move(moveId)}${path ? `/${path}` : ""}`);
  }
  const { page } = people.owner;
  await page.reload();
  const letters = page.getByRole("table", { name: "Letters of invitation" });
  await expect(letters.getByText("Joined", { exact: true })).toHaveCount(ASKED.length);
  await expect(page.getByRole("table", { name: "Companies on this move" })).not.toContainText("Nobody has joined yet");
}
