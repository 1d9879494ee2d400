import { expect, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { letterTo, linkIn } from "../support/mail";
import { addPhoto, photosSent } from "../support/photos";
import { COMPANIES, NAMES, PLACES, type Journey } from "./cast";

const threadOf = (page: Page) => page.getByRole("list", { name: "Answers and replies" }).locator("> li");

/** The inspector on a phone: a visit without air, then a finding about the brakes that stops the move. */
export async function visitAndFind(journey: Journey): Promise<void> {
  const { moveId, people: { inspector: { page } } } = journey;
  await page.goto(routes.findings(moveId));
  await page.getByRole("link", { name: "Record a visit" }).click();
  await expect(page.getByRole("textbox", { name: "Where the unit was looked at" })).toHaveValue(PLACES.from);
  await page.getByRole("radio", { name: "No air on the unit" }).check();
  await page.getByRole("button", { name: "Record the visit" }).click();
  await expect(page).toHaveURL(routes.findings(moveId));
  await page.getByRole("link", { name: "Post a finding" }).click();
  await page.getByRole("combobox", { name: "What it is about" }).selectOption({ label: "Piston travel" });
  await expect(page.getByText("Brakes without air")).toBeVisible();
  await page.getByRole("combobox", { name: "Where on the unit" }).selectOption("brake-rigging-r");
  await page.getByRole("textbox", { name: "What was seen or measured" }).fill("Travel looks long on the rear truck, left cylinder.");
  await page.getByRole("textbox", { name: "Reading with its unit" }).fill("8 1/4 in");
  await addPhoto(page, "piston-as-found.jpg");
  await page.getByRole("radio", { name: /^Stops the move/ }).check();
  await page.getByRole("button", { name: "Post the finding" }).click();
  await expect(page).toHaveURL(/\/findings\/fnd_[0-9a-f]{28}$/);
  journey.findingPath = new URL(page.url()).pathname;
  await expect(page.getByText("Taken without air")).toBeVisible();
  await photosSent(page);
}

/** While a stopping finding is open the acceptance is refused, with all that is missing. */
export async function acceptanceRefused({ moveId, legIds: [leg = ""], people: { inspector: { page } } }: Journey): Promise<void> {
  await page.goto(routes.accept(moveId, leg));
  const missing = page.getByRole("note").filter({ hasText: "It can’t be signed yet" });
  await expect(missing.getByRole("listitem")).toHaveCount(1);
  await page.getByRole("textbox", { name: "Your name" }).fill(NAMES.inspector);
  await page.getByRole("button", { name: "Sign the acceptance" }).click();
  const refused = page.getByRole("main").getByRole("alert");
  await expect(refused).toContainText("Not signed.");
  await expect(refused).toContainText((await missing.getByRole("listitem").first().innerText()).trim());
}

type Answer = { text: string; reading?: string; photo?: string };

async function answer(page: Page, { text, reading, photo }: Answer): Promise<void> {
  await page.getByRole("button", { name: /^(Answer|Add to the answer)$/ }).click();
  const form = page.getByRole("form", { name: "Answer" });
  await form.getByRole("textbox", { name: "What was done, or found when looking" }).fill(text);
  if (reading) await form.getByRole("textbox", { name: "Reading now, with its unit" }).fill(reading);
  if (photo) await addPhoto(form, photo);
  await form.getByRole("button", { name: "Send the answer" }).click();
  await expect(threadOf(page).last()).toContainText(text);
  await photosSent(page);
}

/** The contractor comes by the letter that the finding sent; the inspector wants more. */
export async function firstRound({ findingPath, people: { contractor, inspector } }: Journey): Promise<void> {
  const { page } = contractor;
  await page.goto(linkIn(await letterTo(contractor.email, /posted F-01$/), "findings"));
  await expect(page.getByRole("heading", { level: 2, name: /Piston travel/ })).toBeVisible();
  await answer(page, { text: "Measured again with a tape.", reading: "6 3/4 in", photo: "tape-at-cylinder.jpg" });
  const inspecting = inspector.page;
  await inspecting.goto(findingPath);
  await expect(threadOf(inspecting).last()).toContainText("6 3/4 in");
  await inspecting.getByRole("button", { name: "Not cleared…" }).click();
  const form = inspecting.getByRole("form", { name: "Not cleared" });
  await form.getByRole("textbox", { name: "Why the answer does not clear it" }).fill("Measured without air, so it says nothing.");
  await form.getByRole("textbox", { name: "What would satisfy" }).fill("The travel of both cylinders with 90 psi, and the gauge in the picture.");
  await form.getByRole("button", { name: "Not cleared", exact: true }).click();
  await expect(threadOf(inspecting)).toHaveCount(2);
}

/** With what was asked for the second answer is enough, and every round stays to be read. */
export async function secondRound({ findingPath, people: { contractor, inspector } }: Journey): Promise<void> {
  const { page } = contractor;
  await page.goto(findingPath);
  await expect(threadOf(page).last()).toContainText("The travel of both cylinders with 90 psi");
  await answer(page, { text: "Both cylinders with 90 psi from our compressor: 6 1/2 and 6 5/8 in.", reading: "6 5/8 in", photo: "gauge-90-psi.jpg" });
  const inspecting = inspector.page;
  await inspecting.goto(findingPath);
  await inspecting.getByRole("button", { name: "Clear finding" }).click();
  await inspecting.getByRole("form", { name: "Clear the finding" }).getByRole("button", { name: "Clear finding" }).click();
  await expect(threadOf(inspecting)).toHaveCount(4);
  const [one, two, three, four] = await threadOf(inspecting).all();
  await expect(one ?? inspecting.locator("none")).toContainText("Answer, round 1");
  await expect(two ?? inspecting.locator("none")).toContainText("Not cleared, round 1");
  await expect(three ?? inspecting.locator("none")).toContainText("Answer, round 2");
  await expect(four ?? inspecting.locator("none")).toContainText("Cleared");
}

/** The first carrier's inspector signs, with restrictions. */
export async function acceptFirstLeg({ moveId, legIds: [leg = ""], people: { inspector: { page } } }: Journey): Promise<void> {
  await page.goto(routes.accept(moveId, leg));
  await page.getByRole("checkbox", { name: "25 mph at most" }).check();
  await page.getByRole("checkbox", { name: "Do not hump" }).check();
  await page.getByRole("textbox", { name: "Restrictions in words" }).fill("Behind the road power.");
  await page.getByRole("textbox", { name: "The carrier’s number for it" }).fill("QF-2291");
  const signed = page.getByRole("region", { name: "What is signed" });
  await expect(signed).toContainText("25 mph at most");
  await signed.getByRole("textbox", { name: "Your name" }).fill(NAMES.inspector);
  await page.getByRole("button", { name: "Sign the acceptance" }).click();
  await expect(page).toHaveURL(routes.findings(moveId));
  const leg1 = page.getByRole("region", { name: COMPANIES.carrierA });
  await expect(leg1).toContainText("Accepted, no. QF-2291");
  await expect(leg1).toContainText("Do not hump");
}

/** The second carrier sees what the first one found and what was answered, and accepts after a visit of its own. */
export async function acceptSecondLeg({ moveId, legIds: [, leg = ""], findingPath, people: { second: { page } } }: Journey): Promise<void> {
  await page.goto(routes.findings(moveId));
  await expect(page.getByRole("region", { name: COMPANIES.carrierA })).toContainText("Piston travel");
  await page.goto(findingPath);
  await expect(threadOf(page)).toHaveCount(4);
  for (const name of ["piston-as-found.jpg", "tape-at-cylinder.jpg", "gauge-90-psi.jpg"]) await expect(page.getByRole("img", { name: `Photo ${name}` })).toBeVisible();
  await expect(page.getByRole("button", { name: /^Clear|^Not cleared/ })).toHaveCount(0);
  await page.goto(routes.visit(moveId, leg));
  await page.getByRole("radio", { name: "Air was on the unit" }).check();
  await page.getByRole("textbox", { name: "Where the air came from" }).fill("the contractor’s compressor");
  await page.getByRole("textbox", { name: "Pressure in psi" }).fill("90");
  await page.getByRole("button", { name: "Record the visit" }).click();
  await expect(page).toHaveURL(routes.findings(moveId));
  await page.goto(routes.accept(moveId, leg));
  await page.getByRole("checkbox", { name: "45 mph at most" }).check();
  await page.getByRole("textbox", { name: "Your name" }).fill(NAMES.second);
  await page.getByRole("button", { name: "Sign the acceptance" }).click();
  await expect(page.getByRole("region", { name: COMPANIES.carrierB })).toContainText("Accepted");
}
