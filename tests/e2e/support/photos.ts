import { expect, type Locator, type Page } from "@playwright/test";
import { aPhoto } from "./pictures";

/** Chooses a photo in the form that is open, and waits until the form has it: its proof has arrived. */
export async function addPhoto(scope: Page | Locator, name: string, size?: { width: number; height: number }): Promise<void> {
  await scope.getByLabel("Choose photos").setInputFiles(await aPhoto(name, size));
  await expect(scope.getByRole("img", { name: `Photo ${name}, taken by` })).toBeVisible({ timeout: 30_000 });
}

/** Every photo of the page has gone out whole; only then may the page be left without a question. */
export async function photosSent(page: Page): Promise<void> {
  await expect(page.getByRole("region", { name: "Photos on their way" })).toHaveCount(0, { timeout: 30_000 });
}
