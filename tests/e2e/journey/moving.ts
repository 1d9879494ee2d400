import { expect, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { COMPANIES, NAMES, type Journey, type Role } from "./cast";

const legOf = (page: Page, carrier: string) => page.getByRole("region", { name: carrier });

async function instruct(page: Page, moveId: string, carrier: string, bill: string): Promise<void> {
  await page.goto(routes.movement(moveId));
  const leg = legOf(page, carrier);
  await leg.getByRole("button", { name: "Give the instruction" }).click();
  await leg.getByRole("textbox", { name: "Bill-of-lading number" }).fill(bill);
  await leg.getByRole("textbox", { name: "Clearance number" }).fill("C-1187");
  await leg.getByRole("textbox", { name: "Instruction" }).fill("Behind the road power, not in a hump yard.");
  await leg.getByRole("button", { name: "Give the instruction" }).click();
  await expect(leg.getByRole("definition").filter({ hasText: bill })).toBeVisible();
}

export const instructFirst = ({ moveId, people: { desk } }: Journey) => instruct(desk.page, moveId, COMPANIES.carrierA, "QF 118-40772");
export const instructSecond = ({ moveId, people: { second } }: Journey) => instruct(second.page, moveId, COMPANIES.carrierB, "TM 7-2291");

/** The owner tenders the unit. */
export async function release({ moveId, people: { owner: { page } } }: Journey): Promise<void> {
  await page.goto(routes.movement(moveId));
  await page.getByRole("button", { name: "Release the unit…" }).click();
  const dialog = page.getByRole("dialog", { name: "Release the unit" });
  await expect(dialog).toContainText("The hand brake stays applied and the wheels stay chocked.");
  await dialog.getByRole("textbox", { name: "Note to the carrier" }).fill("Key at the elevator’s office.");
  await dialog.getByRole("textbox", { name: "Your name" }).fill(NAMES.owner);
  await dialog.getByRole("button", { name: "Sign and release" }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByText(`Signed by ${NAMES.owner}`)).toBeVisible();
}

type Sighting = { by: Role; carrier: string; opener: string; kind: string; train?: string };

/** What the desks record of the way, in its order. */
export async function sight({ moveId, people }: Journey, { by, carrier, opener, kind, train }: Sighting): Promise<void> {
  const { page } = people[by];
  await page.goto(routes.movement(moveId));
  const leg = legOf(page, carrier);
  await leg.getByRole("button", { name: opener }).click();
  const what = leg.getByRole("combobox", { name: "What happened" });
  const label = (await what.getByRole("option").allTextContents()).find((text) => text.startsWith(kind)) ?? kind;
  await what.selectOption({ label });
  const where = leg.getByRole("textbox", { name: "Where" });
  if ((await where.inputValue()) === "") await where.fill("Stillwater yard");
  if (train) await leg.getByRole("textbox", { name: "Train" }).fill(train);
  await leg.getByRole("button", { name: "Record it" }).click();
  await expect(leg.getByRole("listitem").filter({ hasText: kind }).first()).toBeVisible();
  await expect(leg.getByRole("button", { name: "Record it" })).toHaveCount(0);
}

/** Before everything stands the desk is refused, and told what is missing. */
export async function pullRefused({ moveId, people: { desk: { page } } }: Journey): Promise<void> {
  await page.goto(routes.movement(moveId));
  const leg = legOf(page, COMPANIES.carrierA);
  await leg.getByRole("button", { name: "Record that it was pulled" }).click();
  await leg.getByRole("button", { name: "Record it" }).click();
  await expect(leg.getByRole("alert")).toContainText("Not recorded.");
  await leg.getByRole("button", { name: "Leave it" }).click();
}
