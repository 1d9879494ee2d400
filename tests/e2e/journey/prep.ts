import { expect, type Locator, type Page } from "@playwright/test";
import { GROUP_LABELS } from "@/lib/prep/labels";
import type { PrepItem, PrepList } from "@/lib/prep/types";
import type { PrepPhase } from "@/lib/prep/vocabulary";
import type { MovePhoto } from "@/lib/evidence/types";
import { routes } from "@/lib/routes";
import { readDoor, writeDoor } from "../support/doors";
import { addPhoto, photosSent } from "../support/photos";
import { NAMES, type Journey } from "./cast";

const prepOf = (page: Page, moveId: string) => readDoor<PrepList>(page, routes.api.prep(moveId));

async function itemOf(page: Page, moveId: string, templateId: string): Promise<PrepItem> {
  const item = (await prepOf(page, moveId)).items.find((one) => one.templateId === templateId);
  if (!item) throw new Error(`no item ${templateId} on this list`);
  return item;
}

const phaseOf = (page: Page, words: string) => page.getByRole("region", { name: words });
const FIRST = "Prep, where it stands";
const COUPLED = "Prep, when coupled";

/** The line of an item, which opens when its button is pressed. */
function lineOf(page: Page, { action }: PrepItem): { line: Locator; opener: Locator } {
  const line = page.getByRole("listitem").filter({ has: page.getByRole("button", { name: action }) });
  return { line, opener: line.getByRole("button", { name: action }) };
}

/** Opens the line of an item; a finished group is folded up and is unfolded first. */
async function openLine(page: Page, item: PrepItem): Promise<{ line: Locator; opener: Locator }> {
  const found = lineOf(page, item);
  const group = phaseOf(page, item.phase === "when-coupled" ? COUPLED : FIRST).getByRole("heading", { level: 3, name: GROUP_LABELS[item.group] });
  await expect(group).toBeVisible();
  if (!(await found.opener.isVisible())) await group.click();
  await found.opener.click();
  return found;
}

type Proof = { value?: string; tag?: string; photo?: string; skip?: string };

/** Works one item off in its line, as somebody beside the unit does. */
async function workByHand(page: Page, item: PrepItem, { value, tag, photo, skip }: Proof): Promise<void> {
  const { line, opener } = await openLine(page, item);
  if (item.caution) await expect(line).toContainText(item.caution);
  if (skip) {
    await line.getByRole("button", { name: "Does not apply to this unit" }).click();
    await line.getByRole("textbox", { name: "Why it does not apply" }).fill(skip);
    await line.getByRole("button", { name: "It does not apply" }).click();
    return expect(opener).toContainText(`does not apply: ${skip}`);
  }
  if (value && item.valueLabel) await line.getByRole("textbox", { name: item.valueLabel }).fill(value);
  if (tag) await line.getByRole("textbox", { name: "Tag number" }).fill(tag);
  if (photo) await addPhoto(line, photo);
  await line.getByRole("button", { name: "Done", exact: true }).click();
  await expect(opener).toHaveAttribute("aria-expanded", "false");
  await expect(opener).toContainText(NAMES.contractor);
  if (tag) await expect(opener).toContainText(`tag ${tag}`);
  if (photo) await expect(opener).toContainText("1 photo");
}

/** The bulk of a phase through the same door that the page uses, with a photo that was sent before. */
async function workTheRest(page: Page, moveId: string, phase: PrepPhase, photoId: string): Promise<void> {
  const { items } = await prepOf(page, moveId);
  let tag = 500;
  for (const item of items.filter((one) => one.phase === phase && one.state === "to-do")) {
    tag += 1;
    const body = { version: item.version, value: item.valueLabel ? "As found, in order" : "", tagNumber: item.needsTag ? `0${tag}` : "", note: "", photoIds: item.needsPhoto ? [photoId] : [] };
    await writeDoor(page, routes.api.prepItem(moveId, item.id, "done"), body);
  }
}

async function sign(page: Page, words: string): Promise<void> {
  const phase = phaseOf(page, words);
  await phase.getByRole("textbox", { name: "Your name" }).fill(NAMES.contractor);
  await phase.getByRole("button", { name: "Sign this phase" }).click();
  await expect(phase.getByText(`Signed by ${NAMES.contractor}`)).toBeVisible();
}

/** Four by hand: a photo, a tag, a value, and one that does not apply; then the rest, and the signature. */
export async function prepareWhereItStands(journey: Journey): Promise<void> {
  const { moveId, people: { contractor: { page } } } = journey;
  await page.goto(routes.prep(moveId));
  await workByHand(page, await itemOf(page, moveId, "P2"), { photo: "intakes-closed.jpg" });
  await workByHand(page, await itemOf(page, moveId, "E1"), { tag: "0418", photo: "battery-switch.jpg" });
  await workByHand(page, await itemOf(page, moveId, "B8"), { value: "Front left step bent" });
  await workByHand(page, await itemOf(page, moveId, "E9"), { skip: "no radio fitted" });
  await photosSent(page);
  const photos = await readDoor<MovePhoto[]>(page, routes.api.photos(moveId));
  journey.photoId = photos.find((one) => one.name === "intakes-closed.jpg")?.id ?? "";
  await expect(phaseOf(page, FIRST).getByRole("button", { name: "Sign this phase" })).toHaveCount(0);
  await workTheRest(page, moveId, "where-it-stands", journey.photoId);
  await page.reload();
  await expect(phaseOf(page, FIRST).getByText("Complete, not signed")).toBeVisible();
  await sign(page, FIRST);
}

/** A signed item is opened again: the signature falls, everybody sees why, and it is given anew. */
export async function reopenAndSignAgain({ moveId, people: { contractor: { page }, inspector } }: Journey): Promise<void> {
  const item = await itemOf(page, moveId, "B8");
  const { line } = await openLine(page, item);
  await line.getByRole("button", { name: "Open it again…" }).click();
  await line.getByRole("textbox", { name: "Why it is opened again" }).fill("The step was straightened.");
  await line.getByRole("button", { name: "Open it again", exact: true }).click();
  await expect(phaseOf(page, FIRST).getByText("Changed since signed")).toBeVisible();
  await inspector.page.goto(routes.prep(moveId));
  await expect(phaseOf(inspector.page, FIRST)).toContainText("Changed since signed");
  await workByHand(page, await itemOf(page, moveId, "B8"), { value: "Nothing; the step was straightened" });
  await sign(page, FIRST);
  await expect(phaseOf(page, FIRST).getByText("Changed since signed")).toHaveCount(0);
}

/** What waits for the carrier's engine: one by hand, the rest by the door, and its own signature. */
export async function prepareWhenCoupled({ moveId, photoId, people: { contractor: { page } } }: Journey): Promise<void> {
  await page.goto(routes.prep(moveId));
  await workByHand(page, await itemOf(page, moveId, "C5"), { value: "The conductor", photo: "chain-slack.jpg" });
  await photosSent(page);
  await workTheRest(page, moveId, "when-coupled", photoId);
  await page.reload();
  await sign(page, COUPLED);
}
