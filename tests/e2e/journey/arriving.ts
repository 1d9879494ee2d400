import { expect, type Page } from "@playwright/test";
import { twinsOf } from "@/lib/prep/labels";
import type { PrepItem, PrepList } from "@/lib/prep/types";
import { routes } from "@/lib/routes";
import { readDoor, writeDoor } from "../support/doors";
import { addPhoto, photosSent } from "../support/photos";
import { NAMES, type Journey } from "./cast";

/** The receiver looks the unit over, with a photo, and signs. */
export async function recordArrival({ moveId, people: { receiver: { page } } }: Journey): Promise<void> {
  await page.goto(routes.movement(moveId));
  await page.getByRole("button", { name: "Record the arrival" }).click();
  await page.getByRole("textbox", { name: "Condition" }).fill("As on the photos from departure; caps and covers in place.");
  await addPhoto(page.getByRole("region", { name: /^Arrival at/ }), "arrived-left-side.jpg");
  await page.getByRole("textbox", { name: "Your name" }).fill(NAMES.receiver);
  await page.getByRole("button", { name: "Sign the arrival" }).click();
  await expect(page.getByText(`Signed by ${NAMES.receiver}`)).toBeVisible();
  await photosSent(page);
}

const waitingTwins = async (page: Page, moveId: string): Promise<PrepItem[]> =>
  twinsOf((await readDoor<PrepList>(page, routes.api.prep(moveId))).items).filter((item) => item.restoreState === "to-restore");

async function restoreByHand(page: Page, item: PrepItem, act: "Put back" | "Keep as it is", note: string): Promise<void> {
  const board = page.getByRole("region", { name: "Put back after the tow" });
  const line = board.getByRole("listitem").filter({ has: page.getByRole("button", { name: item.restoreAction ?? "" }) }).first();
  await line.getByRole("button", { expanded: false }).first().click();
  await line.getByRole("textbox", { name: /^Note, or why/ }).fill(note);
  await line.getByRole("button", { name: act, exact: true }).click();
  await expect(line.getByRole("button", { name: item.restoreAction ?? "" })).toContainText(act === "Put back" ? NAMES.contractor : "kept as it is");
}

/** Two are put back by hand, the receiver keeps one, the rest goes by the door. */
export async function restore({ moveId, people: { contractor, receiver } }: Journey): Promise<void> {
  const [one, two, three] = await waitingTwins(contractor.page, moveId);
  if (!one || !two || !three) throw new Error("too few items have a way back");
  await contractor.page.goto(routes.prep(moveId));
  await restoreByHand(contractor.page, one, "Put back", "");
  await restoreByHand(contractor.page, two, "Put back", "Done with the shop’s crew.");
  await receiver.page.goto(routes.prep(moveId));
  await restoreByHand(receiver.page, three, "Keep as it is", "The unit goes on display.");
  for (const item of await waitingTwins(contractor.page, moveId)) {
    await writeDoor(contractor.page, routes.api.restoreItem(moveId, item.id, "restored"), { version: item.version, note: "", photoIds: [] });
  }
  await receiver.page.reload();
  await expect(receiver.page.getByText("All put back or kept")).toBeVisible();
}

/** The receiver closes the move; from then on the case can only be read. */
export async function close({ moveId, people: { receiver: { page }, contractor } }: Journey): Promise<void> {
  await page.goto(routes.movement(moveId));
  await page.getByRole("button", { name: "Close the move…" }).click();
  const closing = page.getByRole("region", { name: "Closing" });
  await closing.getByRole("textbox", { name: "Your name" }).fill(NAMES.receiver);
  await closing.getByRole("button", { name: "Sign and close" }).click();
  await expect(closing).toContainText("The case stays readable.");
  await contractor.page.goto(routes.prep(moveId));
  await expect(contractor.page.getByText("Nothing on it changes any more.")).toBeVisible();
}
