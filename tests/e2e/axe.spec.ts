import { expect, test, type Browser, type Page } from "@playwright/test";
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { filesNamed } from "./support/files";
import { takeFaults } from "./support/people";
import { findWorld, PAGES, titleOf, type PageRow, type World } from "./support/pages";
import { pageAs } from "./support/demo";

type Found = { id: string; impact: string; nodes: { target: string[]; failureSummary: string }[] };
type Axe = { run: (context: Document, options: object) => Promise<{ violations: Found[] }> };

const AXE = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");
const RULES = { runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"], rules: { "target-size": { enabled: true } }, resultTypes: ["violations"] };
const DESK = { width: 1280, height: 900 };
const PHONE = { width: 390, height: 844 };
const NARROW = { width: 320, height: 640 };

/** What the rules of accessibility say against the page as it stands. */
async function violations(page: Page): Promise<string[]> {
  if (!(await page.evaluate(() => "axe" in window))) await page.evaluate(AXE);
  const found = await page.evaluate(async (options) => (await (window as unknown as { axe: Axe }).axe.run(document, options)).violations, RULES);
  return found.flatMap(({ id, nodes }) => nodes.map(({ target, failureSummary }) => `${id} at ${target.join(" ")}: ${failureSummary.replaceAll(/\s+/g, " ")}`));
}

/** By how much the page is wider than the window, with what sticks out. */
const sticksOut = (page: Page) =>
  page.evaluate(() => {
    const over = document.documentElement.scrollWidth - document.documentElement.clientWidth;
    if (over <= 0) return [];
    const wide = [...document.querySelectorAll("body *")].filter((one) => one.getBoundingClientRect().right > document.documentElement.clientWidth + 1);
    return [`by ${over} px`, ...wide.slice(-3).map((one) => `${one.tagName} ${one.className.toString().slice(0, 80)}`)];
  });

test.describe("Every page, as who uses it", () => {
  let world: World;
  const pages = new Map<string, Page>();

  const pageOf = async (browser: Browser, { who }: PageRow): Promise<Page> => {
    const known = pages.get(who ?? "nobody");
    if (known) return known;
    const page = await pageAs(browser, who, { viewport: DESK, reducedMotion: "reduce" });
    pages.set(who ?? "nobody", page);
    return page;
  };

  test.beforeAll(async ({ browser }) => {
    world = await findWorld(browser);
  });

  test("each page of the site has a row", () => {
    const known = new Set(PAGES.map(({ file }) => file));
    expect(["page.tsx", "not-found.tsx"].flatMap((name) => filesNamed("app", name)).filter((file) => !known.has(file))).toEqual([]);
  });

  test("what is wrong is seen", async ({ browser }) => {
    const page = await pageAs(browser, null, { viewport: NARROW });
    await page.goto("/", { waitUntil: "networkidle" });
    await page.evaluate(() => {
      const wrong = document.createElement("p");
      wrong.innerHTML = '<img src="data:,"><span style="display:block;width:900px;color:#999;background:#aaa">hardly read</span><button style="width:9px;height:9px;padding:0"></button><a href="#x" style="font-size:2px">x</a>';
      document.querySelector("main")?.append(wrong);
      const script = document.createElement("script");
      script.src = "https://elsewhere.example/x.js";
      document.querySelector("main")?.append(script);
      console.error("a complaint");
    });
    const rules = (await violations(page)).map((words) => words.split(" ")[0]);
    expect(rules).toEqual(expect.arrayContaining(["image-alt", "color-contrast", "button-name"]));
    expect(await sticksOut(page)).not.toEqual([]);
    await expect.poll(() => takeFaults(page.context()).join()).toMatch(/content policy|a complaint/);
    await page.context().close();
  });

  for (const row of PAGES) {
    test(titleOf(row), async ({ browser }) => {
      const page = await pageOf(browser, row);
      takeFaults(page.context());
      await page.setViewportSize(DESK);
      await page.emulateMedia({ colorScheme: "light" });
      const answer = await page.goto(row.path(world));
      expect(answer?.status(), "answers").toBe(row.status ?? 200);
      await page.waitForLoadState("networkidle");
      await row.open?.(page);
      const found: Record<string, string[]> = { light: await violations(page) };
      await page.emulateMedia({ colorScheme: "dark" });
      found.dark = await violations(page);
      await page.setViewportSize(PHONE);
      found["dark, on a phone"] = await violations(page);
      await page.emulateMedia({ colorScheme: "light" });
      found["light, on a phone"] = await violations(page);
      found["sideways at 390"] = await sticksOut(page);
      await page.setViewportSize(NARROW);
      found["sideways at 320"] = await sticksOut(page);
      found["complaints of the browser"] = takeFaults(page.context(), row.what === "with faults" || row.status ? [/status of 4\d\d/] : []);
      expect(Object.fromEntries(Object.entries(found).filter(([, faults]) => faults.length > 0))).toEqual({});
    });
  }
});
