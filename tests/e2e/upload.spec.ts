import { expect, test, type Browser, type Page } from "@playwright/test";
import type { MovePhoto } from "@/lib/evidence/types";
import { routes } from "@/lib/routes";
import { demoCase, pageAs, type DemoCase } from "./support/demo";
import { readDoor } from "./support/doors";
import { isSending, orderFault } from "./support/faults";
import { takeFaults } from "./support/people";
import { addPhoto, photosSent } from "./support/photos";
import { aPhoto } from "./support/pictures";

/** More than a proof may have, so that a cut behind it strikes an original. */
const BEHIND_A_PROOF = 1_100_000;
const LARGE = { width: 4200, height: 3000 };

test.describe("Photos from a yard with a poor signal", () => {
  test.setTimeout(90_000);
  let moving: DemoCase;

  test.beforeAll(async () => {
    moving = await demoCase("2783");
  });
  test.beforeEach(() => orderFault({ kind: "off" }));
  test.afterAll(() => orderFault({ kind: "off" }));

  const formPath = () => routes.postFinding(moving.moveId, moving.inspectionIds.at(-1) ?? "");
  const nameOf = (words: string) => `${words}-${Date.now()}.jpg`;

  async function openForm(browser: Browser): Promise<Page> {
    const page = await pageAs(browser, "nextInspector");
    await page.goto(formPath(), { waitUntil: "networkidle" });
    return page;
  }

  const photosCalled = async (page: Page, name: string) => (await readDoor<MovePhoto[]>(page, routes.api.photos(moving.moveId))).filter((photo) => photo.name === name);

  /** The photo arrived whole, once, and was found to be what the phone announced. */
  async function expectKept(page: Page, name: string, seconds = 30): Promise<void> {
    await expect.poll(async () => (await photosCalled(page, name)).map(({ state }) => state), { timeout: seconds * 1000 }).toEqual(["kept"]);
  }

  test("A file that breaks off in the middle goes on where it stopped", async ({ browser }) => {
    const page = await openForm(browser);
    const name = nameOf("cut");
    const starts: string[] = [];
    page.on("request", (request) => {
      if (isSending(request)) starts.push(request.headers().range ?? "");
    });
    // The proof uses up the first without reaching its mark.
    await orderFault({ kind: "cut-mid-file", times: 2, afterBytes: BEHIND_A_PROOF });
    await addPhoto(page, name, LARGE);
    await photosSent(page);
    await expectKept(page, name);
    expect(starts.slice(0, 2)).toEqual(["bytes=0-", "bytes=0-"]);
    expect(Number(/^bytes=(\d+)-$/.exec(starts.at(-1) ?? "")?.[1])).toBeGreaterThanOrEqual(BEHIND_A_PROOF);
    expect(takeFaults(page.context(), [/Failed to load resource/])).toEqual([]);
    await page.context().close();
  });

  test("A report that comes late counts once", async ({ browser }) => {
    const page = await openForm(browser);
    const name = nameOf("late");
    await orderFault({ kind: "callback-late", times: 2, ms: 2500 });
    await addPhoto(page, name);
    await photosSent(page);
    await expectKept(page, name);
    expect(takeFaults(page.context())).toEqual([]);
    await page.context().close();
  });

  test("An original whose report never comes is found by the round that looks for such", async ({ browser }) => {
    test.setTimeout(240_000);
    const page = await openForm(browser);
    const name = nameOf("never");
    let sent = 0;
    await page.route(isFile, async (route, request) => {
      sent += request.method() === "PUT" ? 1 : 0;
      if (sent === 2) await orderFault({ kind: "callback-never", times: 1 });
      await route.continue();
    });
    // From the original on the page can't ask either, as when the phone is put away.
    await page.route(`**${routes.api.photos(moving.moveId)}`, (route) => (sent >= 2 ? route.abort() : route.continue()));
    await addPhoto(page, name);
    await expect(page.getByRole("group", { name: "Photos" }).getByText(/Proof sent, original waiting/)).toBeVisible();
    await page.context().close({ reason: "the phone is put away" });
    const later = await pageAs(browser, "nextInspector");
    await later.goto(routes.move(moving.moveId));
    expect((await photosCalled(later, name)).map(({ state }) => state)).toEqual(["proof"]);
    await expectKept(later, name, 200);
    await later.context().close();
  });

  test("A photo that is cancelled is gone, and nothing more is sent of it", async ({ browser }) => {
    const page = await openForm(browser);
    const name = nameOf("cancelled");
    await orderFault({ kind: "slow", times: 20, ms: 4000 });
    await page.getByLabel("Choose photos").setInputFiles(await aPhoto(name));
    const row = page.getByRole("group", { name: "Photos" }).getByRole("listitem").filter({ hasText: name });
    await row.getByRole("button", { name: `Cancel ${name}` }).click();
    await expect(row).toHaveCount(0);
    await photosSent(page);
    await orderFault({ kind: "off" });
    await page.reload({ waitUntil: "networkidle" });
    await expect(page.getByRole("region", { name: "Photos on their way" })).toHaveCount(0);
    const states = (await photosCalled(page, name)).map(({ state }) => state);
    expect(states.filter((state) => state !== "registered")).toEqual([]);
    await page.context().close();
  });

  test("A finding is posted while the original of its photo is still to come", async ({ browser }) => {
    const page = await openForm(browser);
    const name = nameOf("pending");
    let sent = 0;
    let letGo: () => void = () => undefined;
    const held = new Promise<void>((resolve) => (letGo = resolve));
    await page.route(isFile, async (route, request) => {
      sent += request.method() === "PUT" ? 1 : 0;
      if (sent === 2 && request.method() === "PUT") await held;
      await route.continue();
    });
    await addPhoto(page, name);
    await page.getByRole("combobox", { name: "What it is about" }).selectOption("glazing");
    await page.getByRole("combobox", { name: "Where on the unit" }).selectOption("cab");
    await page.getByRole("textbox", { name: "What was seen or measured" }).fill("Crack in the left front pane.");
    await page.getByRole("radio", { name: /^Note/ }).check();
    await page.getByRole("button", { name: "Post the finding" }).click();
    await expect(page).toHaveURL(/\/findings\/fnd_/);
    await expect(page.getByText("Original pending")).toBeVisible();
    await expect(page.getByRole("region", { name: "Photos on their way" })).toContainText("1 original is still to come.");
    letGo();
    await photosSent(page);
    await expectKept(page, name);
    await expect(page.getByText("Original pending")).toHaveCount(0, { timeout: 30_000 });
    await page.getByRole("button", { name: `Photo ${name}` }).click();
    await expect(page.getByRole("dialog")).toContainText("Pocket camera");
    expect(takeFaults(page.context())).toEqual([]);
    await page.context().close();
  });

  test("A part of the page that did not come for want of a signal comes with the next try", async ({ browser }) => {
    const page = await pageAs(browser, "nextInspector");
    const html = await (await page.request.get(formPath())).text();
    let away = true;
    await page.route("**/_next/static/chunks/*.js", (route) => (away && !html.includes(new URL(route.request().url()).pathname) ? route.abort() : route.continue()));
    await page.goto(formPath(), { waitUntil: "networkidle" });
    const name = nameOf("again");
    await page.getByLabel("Choose photos").setInputFiles(await aPhoto(name));
    await expect(page.getByText("What opens the picture could not be fetched.")).toBeVisible();
    away = false;
    await page.getByRole("button", { name: `Remove ${name}` }).click();
    await addPhoto(page, name);
    await photosSent(page);
    await expectKept(page, name);
    await page.context().close();
  });
});

const isFile = (url: URL) => url.port === new URL(process.env.UPLOADTHING_INGEST_URL ?? "http://localhost:4028").port;
