import { expect, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { letterTo } from "../support/mail";
import { COMPANIES, type Journey } from "./cast";

export const TOTAL = "$4,185.50";
const LINES = [["Line haul", "Stillwater to Ardenne, 174 miles", "3,485.50", "$3,485.50"], ["Special handling", "Dead in tow, in the head-end consist", "700.00", "$700.00"]] as const;

const legOf = (page: Page, words: string) => page.getByRole("region", { name: words });
const FIRST = `Leg 1, ${COMPANIES.carrierA}`;

/** The clerk asks for two things. */
export async function quote({ moveId, people: { clerk: { page } } }: Journey): Promise<void> {
  await page.goto(routes.fees(moveId));
  await legOf(page, FIRST).getByRole("link", { name: "Give a quote" }).click();
  await page.getByRole("button", { name: "Add a line" }).click();
  for (const [at, [kind, what, typed]] of LINES.entries()) {
    const line = page.getByRole("group", { name: `Line ${at + 1}` });
    await line.getByRole("combobox", { name: "For" }).selectOption({ label: kind });
    await line.getByRole("textbox", { name: "What" }).fill(what);
    await line.getByRole("textbox", { name: "Amount" }).fill(typed);
  }
  await expect(page.getByText(`Total ${TOTAL}`)).toBeVisible();
  await page.getByRole("textbox", { name: "Your reference" }).fill("Price list 7");
  await page.getByRole("button", { name: "Give the quote" }).click();
  await expect(page).toHaveURL(routes.fees(moveId));
  await expect(legOf(page, FIRST).getByText("Waiting for agreement")).toBeVisible();
}

/** The payer agrees, is declined once, then pays; every button is pressed twice by an impatient hand. */
export async function agreeAndPay({ moveId, people: { payer: { page } } }: Journey): Promise<void> {
  await page.goto(routes.fees(moveId));
  await page.getByRole("button", { name: "Agree to quote 1…" }).click();
  const dialog = page.getByRole("dialog", { name: `Agree to ${TOTAL}` });
  await dialog.getByRole("button", { name: "Agree", exact: true }).dblclick();
  await expect(dialog).toBeHidden();
  await page.getByRole("button", { name: `Pay ${TOTAL} by card` }).dblclick();
  await page.waitForURL(/\/pay\/cs_/);
  const first = page.url();
  await page.getByRole("button", { name: "Decline" }).click();
  await expect(page.getByRole("alert")).toContainText("The card was declined");
  await page.getByRole("link", { name: "Leave" }).click();
  await page.getByRole("button", { name: `Go on paying ${TOTAL}` }).dblclick();
  await page.waitForURL(/\/pay\/cs_/);
  expect(page.url().split("?")[0]).toBe(first.split("?")[0]);
  await page.getByRole("button", { name: `Pay ${TOTAL}` }).dblclick();
  await page.waitForURL(/\/fees\/paid\?session=/);
  await expect(page.getByRole("main").getByRole("status").filter({ hasText: /^Paid/ })).toContainText(`${TOTAL} to ${COMPANIES.carrierA} for quote 1`, { timeout: 20_000 });
}

/** One payment is booked, the clerk sees it, and both sides have the receipt. */
export async function paidOnce({ moveId, unit, people: { payer, clerk } }: Journey): Promise<void> {
  await clerk.page.goto(routes.fees(moveId));
  const leg = legOf(clerk.page, FIRST);
  await expect(leg.getByText("Paid", { exact: true }).first()).toBeVisible();
  const tries = leg.getByRole("region", { name: "Tries to pay" }).getByRole("listitem");
  await expect(tries).toHaveCount(1);
  await expect(tries).toContainText("A card was declined.");
  for (const { email } of [payer, clerk]) {
    const receipt = await letterTo(email, /^Receipt/);
    expect(receipt.subject).toContain(unit);
    for (const words of [...LINES.map((line) => line[3]), TOTAL, COMPANIES.payer, COMPANIES.carrierA]) expect(receipt.text).toContain(words);
  }
}

/** Whoever neither pays nor is paid sees that billing is cleared, and no amount. */
export async function amountsHidden({ moveId, people: { contractor, receiver, second } }: Journey): Promise<void> {
  for (const { page } of [contractor, receiver, second]) {
    await page.goto(routes.move(moveId));
    await expect(page.getByRole("main")).toContainText("Billing cleared");
    await expect(page.getByRole("main")).not.toContainText("$");
  }
}

/** The second carrier gives credit instead. */
export async function agreeCredit({ moveId, people: { second: { page } } }: Journey): Promise<void> {
  await page.goto(routes.fees(moveId));
  const leg = legOf(page, `Leg 2, ${COMPANIES.carrierB}`);
  await leg.getByRole("button", { name: "Credit agreed…" }).click();
  const dialog = page.getByRole("dialog", { name: "Credit agreed" });
  await dialog.getByRole("textbox", { name: "What was agreed" }).fill("Credit account 20417");
  await dialog.getByRole("button", { name: "Clear billing" }).click();
  await expect(dialog).toBeHidden();
  await expect(leg.getByText("Credit agreed", { exact: true })).toBeVisible();
}
