import { expect, type Browser, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { letterTo, linkIn } from "../support/mail";
import { aPerson, expectQuiet } from "../support/people";
import { TOTAL } from "./paying";
import { COMPANIES, everybody, NAMES, type Journey, type Role } from "./cast";

const waitOn = (page: Page) => page.getByRole("heading", { name: "What waits now" }).locator("xpath=following-sibling::div[1]");

/** Everybody reads whose turn it is: the one whose turn it is as a task, the others by that one's name. */
export async function turnIs(journey: Journey, whose: Role, { task, others }: { task: string; others: string }): Promise<void> {
  for (const person of everybody(journey)) {
    await person.page.goto(routes.move(journey.moveId));
    await expect(waitOn(person.page)).toContainText(person === journey.people[whose] ? task : others);
  }
}

/** The owner makes a link for somebody who only wants to know where the unit is. */
export async function makeFollowLink(journey: Journey): Promise<void> {
  const { page } = journey.people.owner;
  const email = `friends.${journey.number}@journey.example`;
  await page.goto(routes.people(journey.moveId));
  await page.getByRole("textbox", { name: "Who follows" }).fill("Friends of the line");
  await page.getByRole("textbox", { name: "E-mail address" }).last().fill(email);
  await page.getByRole("button", { name: "Make a link" }).click();
  await expect(page.getByText(`The link is made, and on its way to ${email}`)).toBeVisible();
  journey.followUrl = linkIn(await letterTo(email, /Follow the move/), "follow");
}

/** Who follows sees the unit and its way, without a name of a person, an address, or an amount. */
export async function follow({ followUrl, number, people }: Journey, browser: Browser, seen: readonly string[]): Promise<void> {
  const friend = await aPerson(browser, "friend", "none");
  await friend.page.goto(followUrl);
  await expect(friend.page.getByRole("heading", { level: 1 })).toContainText(number);
  for (const words of seen) await expect(friend.page.getByRole("main")).toContainText(words);
  const source = await friend.page.content();
  for (const secret of [...Object.values(NAMES), ...Object.values(people).map(({ email }) => email), COMPANIES.payer, "4,185", "418550", "348550", "20417", "$"]) {
    const shown = secret === "$" ? await friend.page.getByRole("main").innerText() : source;
    expect(shown, `the page says "${secret}"`).not.toContain(secret);
  }
  expectQuiet([friend]);
  await friend.context.close();
}

/** Everybody seated reads the timeline, whose record is whole; the amounts only who pays or is paid. */
export async function timeline(journey: Journey): Promise<void> {
  const { people: { owner, payer, clerk, contractor, receiver, second } } = journey;
  for (const { page } of everybody(journey)) {
    await page.goto(`${routes.timeline(journey.moveId)}?show=1000`);
    await expect(page.getByText(/^Record intact, \d+ entries/)).toBeVisible();
    await expect(page.getByRole("main")).toContainText(`Closed the move, signed by ${NAMES.receiver}`);
  }
  for (const { page } of [owner, payer, clerk]) await expect(page.getByRole("main")).toContainText(TOTAL);
  for (const { page } of [contractor, receiver, second]) await expect(page.getByRole("main")).not.toContainText("$");
}
