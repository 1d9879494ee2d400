import { expect, type Page } from "@playwright/test";
import { routes } from "@/lib/routes";
import { readDoor } from "../support/doors";
import { COMPANIES, PLACES, type Journey } from "./cast";

const box = (page: Page, name: string | RegExp) => page.getByRole("textbox", { name, exact: true });
const choose = (page: Page, name: string | RegExp, label: string) => page.getByRole("combobox", { name }).selectOption({ label });
const kept = (page: Page) => expect(page.getByText(/^Saved \d\d:\d\d\.$/)).toBeVisible();

/** A day so many days from today, as a date field takes it. */
const dayFromNow = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

/** Names the company that owns the unit. */
export async function makeCompany({ people: { owner: { page } } }: Journey): Promise<void> {
  await page.getByRole("navigation", { name: "Main" }).getByRole("link", { name: "Companies" }).click();
  await page.getByRole("link", { name: "Add a company" }).first().click();
  await box(page, "Company").fill(COMPANIES.owner);
  await page.getByRole("button", { name: "Add the company" }).click();
  await expect(page.getByRole("heading", { name: COMPANIES.owner })).toBeVisible();
}

/** Describes the unit, and leaves before anything else is known. */
export async function beginDraft({ number, people: { owner: { page } } }: Journey): Promise<void> {
  await page.goto(routes.moves());
  await page.getByRole("link", { name: "Open a move" }).first().click();
  await box(page, "Reporting mark").fill("ZVRX");
  await box(page, "Number").fill(number);
  await box(page, "Other marks and numbers it is known by").fill(`VRT ${number}, ZVR 83`);
  await choose(page, "What kind of body does it have?", "Hood unit");
  await choose(page, "Which end is stencilled F?", "Long hood");
  await choose(page, "How many axles does it have?", "Six axles");
  await box(page, "Which model is it?").fill("Six-axle road unit, 2,000 hp");
  await choose(page, "Which kind of journal bearings does it have?", "Roller, sealed, end cap turns with the axle");
  await choose(page, "Which brake equipment does it have?", "26-L");
  await kept(page);
  await page.getByRole("navigation", { name: "Main" }).getByRole("link", { name: "Moves" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Moves" })).toBeVisible();
}

async function fillEnds(page: Page): Promise<void> {
  const ends = [["Where it stands", PLACES.origin, PLACES.from, "Central"], ["Where it goes", PLACES.destination, PLACES.to, "Mountain"]] as const;
  for (const [group, name, place, zone] of ends) {
    const end = page.getByRole("group", { name: group });
    await end.getByRole("textbox", { name: "What it is called" }).fill(name);
    await end.getByRole("textbox", { name: "Town or station" }).fill(place);
    await end.getByRole("combobox", { name: "Time zone there" }).selectOption({ label: zone });
  }
}

async function fillLegs(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Add the next carrier" }).click();
  const [first, second] = [page.getByRole("group", { name: "Leg 1" }), page.getByRole("group", { name: "Leg 2" })];
  await first.getByRole("textbox", { name: "Carrier", exact: true }).fill(COMPANIES.carrierA);
  await first.getByRole("textbox", { name: "Its code" }).fill("ZQSF");
  await first.getByRole("textbox", { name: "Miles" }).fill("174");
  await first.getByRole("textbox", { name: "Interchange with the next carrier" }).fill(PLACES.interchange);
  await first.getByRole("combobox", { name: "Time zone there" }).selectOption({ label: "Mountain" });
  await first.getByRole("radio", { name: /Another company/ }).check();
  await first.getByRole("textbox", { name: "Name of the company that pays" }).fill(COMPANIES.payer);
  await second.getByRole("textbox", { name: "Carrier", exact: true }).fill(COMPANIES.carrierB);
  await second.getByRole("textbox", { name: "Its code" }).fill("ZTML");
  await second.getByRole("radio", { name: /Our company/ }).check();
}

/** Takes the draft up where it was left, says the rest, and opens the move. */
export async function openMove(journey: Journey): Promise<void> {
  const { unit, number, people: { owner: { page } } } = journey;
  await page.getByRole("region", { name: "Drafts, not open yet" }).getByRole("link", { name: unit }).click();
  await expect(box(page, "Number")).toHaveValue(number);
  await expect(box(page, "Other marks and numbers it is known by")).toHaveValue(`VRT ${number}, ZVR 83`);
  await expect(page.getByRole("combobox", { name: "Which end is stencilled F?" })).toHaveValue("long-hood");
  await fillEnds(page);
  await fillLegs(page);
  await page.getByLabel("Not before").fill(dayFromNow(5));
  await page.getByLabel("Wanted by").fill(dayFromNow(40));
  await box(page, "What everybody on the case should know").fill("Gate code from the elevator’s office.");
  await page.getByRole("button", { name: "Open the move" }).click();
  await expect(page).toHaveURL(/\/moves\/mov_[0-9a-f]{28}$/);
  journey.moveId = new URL(page.url()).pathname.split("/").at(-1) ?? "";
  await expect(page.getByRole("heading", { level: 1 })).toContainText(number);
  await expect(page.getByRole("main")).toContainText("Invite the contractor who prepares the unit.");
  const movement = await readDoor<{ legs: { legId: string }[] }>(page, routes.api.movement(journey.moveId));
  journey.legIds = movement.legs.map((leg) => leg.legId);
  expect(journey.legIds).toHaveLength(2);
}
