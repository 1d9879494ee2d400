import { expect, test, type Page } from "@playwright/test";
import { DEMO_PASSWORD } from "@/lib/local/demo-people";
import { routes } from "@/lib/routes";
import { demoCase, emailOf, pageAs } from "./support/demo";
import { expectQuiet, takeFaults } from "./support/people";

const MOST_TABS = 80;

/** Who has the focus, as a screen reader would say it. */
const focused = (page: Page) =>
  page.evaluate(() => {
    const one = document.activeElement;
    const labels = one instanceof HTMLInputElement || one instanceof HTMLTextAreaElement ? [...(one.labels ?? [])].map((label) => label.textContent).join(" ") : "";
    return `${one?.tagName.toLowerCase()} ${labels || one?.textContent || ""}`.replaceAll(/\s+/g, " ").trim().slice(0, 120);
  });

/** Whether the focus can be seen: a line around it that is as wide and as dark as the page says. */
const focusShows = (page: Page) =>
  page.evaluate(() => {
    const one = document.activeElement;
    if (!one || one === document.body) return false;
    const marked = one instanceof HTMLInputElement && one.type === "file" ? one.closest("label") : one;
    const { outlineStyle, outlineWidth } = getComputedStyle(marked ?? one);
    const box = (marked ?? one).getBoundingClientRect();
    return outlineStyle !== "none" && Number.parseFloat(outlineWidth) >= 2 && box.width > 0 && box.bottom > 0 && box.top < innerHeight;
  });

/** Goes on with Tab until the focus is on what fits; every stop on the way can be seen. */
async function tabTo(page: Page, wanted: RegExp): Promise<void> {
  const seen: string[] = [];
  for (let tab = 0; tab < MOST_TABS; tab += 1) {
    await page.keyboard.press("Tab");
    const words = await focused(page);
    // Behind the last stop the focus leaves the page and comes in again at its beginning.
    if (words.startsWith("body")) continue;
    expect(await focusShows(page), `the focus on "${words}" can be seen`).toBe(true);
    if (wanted.test(words)) return;
    seen.push(words);
  }
  throw new Error(`${String(wanted)} was not reached: ${seen.join(" | ")}`);
}

test("Signing in, opening a finding and answering it takes no mouse", async ({ browser }) => {
  const page = await pageAs(browser, null);
  const { moveId, findingIds } = await demoCase("2783");
  await page.goto(routes.signIn(routes.findings(moveId)));
  await tabTo(page, /^input E-mail address/);
  await page.keyboard.type(emailOf("contractor"));
  await tabTo(page, /^input Password/);
  await page.keyboard.type(DEMO_PASSWORD);
  await page.keyboard.press("Enter");
  await expect(page).toHaveURL(routes.findings(moveId));
  await expect(page.getByRole("heading", { level: 2, name: "Sable Mountain Lines" })).toBeVisible();

  await tabTo(page, /^a Window/);
  await page.keyboard.press("Enter");
  await expect(page).toHaveURL(routes.finding(moveId, findingIds[4] ?? ""));
  await expect(page.getByRole("heading", { level: 2, name: /^Window/ })).toBeVisible();

  await tabTo(page, /^button (Answer|Add to the answer)$/);
  await page.keyboard.press("Enter");
  await expect(page.getByRole("form", { name: "Answer" })).toBeVisible();
  await tabTo(page, /^textarea What was done/);
  await page.keyboard.type("Screwed tight at all corners.");
  await tabTo(page, /^button Send the answer/);
  await page.keyboard.press("Enter");
  await expect(page.getByRole("list", { name: "Answers and replies" })).toContainText("Screwed tight at all corners.");
  await expect(page.getByRole("form", { name: "Answer" })).toHaveCount(0);
  expectQuiet([{ name: "contractor", email: "", context: page.context(), page }]);
  await page.context().close();
});

test("The skip link comes first and leads past the bar", async ({ browser }) => {
  for (const who of [null, "owner"] as const) {
    const page = await pageAs(browser, who);
    await page.goto(who ? routes.moves() : routes.home());
    await page.keyboard.press("Tab");
    expect(await focused(page)).toBe("a Skip to the page");
    expect(await focusShows(page)).toBe(true);
    await page.keyboard.press("Enter");
    await expect(page.getByRole("main")).toBeFocused();
    await page.keyboard.press("Tab");
    expect(await page.evaluate(() => document.activeElement?.closest("main") !== null)).toBe(true);
    await page.context().close();
  }
});

test("A dialog keeps the focus, ends with Escape, and gives the focus back", async ({ browser }) => {
  const page = await pageAs(browser, "owner");
  const { moveId } = await demoCase("2783");
  for (const { path, name } of [{ path: routes.fees(moveId), name: /^Agree to quote/ }, { path: routes.unit(moveId), name: "Cancel the move" }]) {
    await page.goto(path);
    const opener = page.getByRole("main").getByRole("button", { name });
    if ((await opener.count()) === 0) continue;
    await opener.focus();
    await page.keyboard.press("Enter");
    const dialog = page.getByRole("dialog");
    await expect(dialog).toBeVisible();
    for (let tab = 0; tab < 8; tab += 1) {
      await page.keyboard.press("Tab");
      expect(await page.evaluate(() => document.activeElement === document.body || document.activeElement?.closest("dialog") !== null)).toBe(true);
    }
    await page.keyboard.press("Escape");
    await expect(dialog).toBeHidden();
    await expect(opener).toBeFocused();
  }
  expect(takeFaults(page.context())).toEqual([]);
  await page.context().close();
});

test("A form that is refused leads from its summary to the field", async ({ browser }) => {
  const page = await pageAs(browser, "owner");
  await page.goto(routes.newCompany());
  await tabTo(page, /^button Add the company/);
  await page.keyboard.press("Enter");
  const summary = page.getByRole("main").getByRole("alert");
  await expect(summary).toBeVisible();
  await summary.getByRole("link").first().focus();
  await page.keyboard.press("Enter");
  await expect(page.getByRole("textbox", { name: "Company" })).toBeFocused();
  await page.context().close();
});
