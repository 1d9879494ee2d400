import { expect, test, type APIRequestContext } from "@playwright/test";
import { closeDb } from "@/db/client";
import { env } from "@/lib/env";
import { CHECKS } from "../access/doors/checks";
import { pathOf, readOf, type Send } from "../access/doors/knock";
import { openWorld, type World } from "../access/doors/world";
import { fingerprint } from "../access/fingerprint";
import { DOORS } from "../access/rows/doors";
import { PAGES, type PageRow } from "../access/rows/pages";

/** Written to meanwhile by the worker and by those who come. */
const OTHERS = ["users", "sessions", "outbox", "photos", "verifications"];

const overTheWire = (request: APIRequestContext): Send => async ({ method, path, headers, body }) => {
  const answer = await request.fetch(path, { method, headers, maxRedirects: 0, ...(body !== undefined && { data: Buffer.from(body) }) });
  return { status: answer.status(), type: answer.headers()["content-type"] ?? "", text: await answer.text(), location: answer.headers().location ?? null };
};

let world: World;
const origin = () => new URL(env().APP_URL).origin;

test.describe("doors", () => {
  test.beforeAll(async () => {
    world = await openWorld();
  });
  test.afterAll(() => closeDb());

  for (const door of DOORS) {
    test(`door ${door.door}`, async ({ request }) => {
      const before = await fingerprint(OTHERS);
      for (const check of CHECKS.filter((one) => one.applies(door))) {
        expect(await check.run({ door, send: overTheWire(request), world, origin: origin() }), check.title).toEqual([]);
      }
      expect(await fingerprint(OTHERS), "rows of the database").toBe(before);
    });
  }

  const opens = (page: PageRow, cookie: string | null, request: APIRequestContext, ids = world.ids) => overTheWire(request)({ ...readOf(page.page, ids, cookie), path: pathOf(`${page.page}${page.behind ?? ""}`, ids).replaceAll(/no-token/g, "0123456789abcdef0123456789abcdef") });
  const isIn = (page: PageRow, ...who: PageRow["who"][]) => who.includes(page.who);

  for (const page of PAGES) {
    test(`page ${page.page} without a session`, async ({ request }) => {
      const { status, location, text } = await opens(page, null, request);
      if (isIn(page, "anybody")) expect(status).toBe(200);
      else if (isIn(page, "link")) expect([200, 404]).toContain(status);
      else expect([status, location?.replace(/^https?:\/\/[^/]+/, "").split("?")[0]]).toEqual([307, "/sign-in"]);
      expect(text).not.toContain(world.caseNumber);
    });

    if (isIn(page, "case", "draft", "company", "administration")) {
      test(`page ${page.page} as a stranger`, async ({ request }) => {
        const cookie = await world.stranger();
        const [theirs, nothing] = [await opens(page, cookie, request), await opens(page, cookie, request, world.ofNothing)];
        expect([theirs.status, nothing.status]).toEqual([404, 404]);
        expect(theirs.text).not.toContain(world.caseNumber);
        expect(theirs.text).not.toContain("Vellum Ridge");
      });
    }
  }

  test("every page answers who it is for", async ({ request }) => {
    const cookies = await Promise.all((["owner", "inspectorA", "clerkA", "siteAdmin"] as const).map((persona) => world.cookieOf(persona)));
    const shut: string[] = [];
    for (const page of PAGES.filter((one) => !isIn(one, "link"))) {
      const statuses = await Promise.all(cookies.map(async (cookie) => (await opens(page, cookie, request)).status));
      // Somebody signed in is led on from the sign-in page, and from a form whose turn it is not.
      if (!statuses.some((status) => status === 200 || status === 307)) shut.push(`${page.page}: ${statuses.join(", ")}`);
    }
    expect(shut).toEqual([]);
  });

  test("a method that is none gets no further", async ({ request }) => {
    const cookie = await world.cookieOf("owner");
    expect((await request.fetch("/api/v1/account", { headers: { cookie } })).status()).toBe(200);
    expect((await request.fetch("/api/v1/account", { method: "PATCH", headers: { cookie } })).status()).toBe(405);
    // The framework has no word for TRACE and fails before our code; what counts is that nothing is echoed.
    const traced = await request.fetch("/api/v1/account", { method: "TRACE", headers: { cookie, "x-canary": "ocker" } });
    expect(traced.status()).toBeGreaterThanOrEqual(400);
    expect(await traced.text()).not.toContain("ocker");
  });

  test("a form that works without script is taken from our own pages alone", async ({ request }) => {
    const page = await (await request.get("/sign-in")).text();
    const hidden = [...page.matchAll(/<input type="hidden" name="(\$ACTION[^"]*)"(?: value="([^"]*)")?/g)].map(([, name = "", value = ""]): [string, string] => [name, value.replaceAll("&quot;", '"').replaceAll("&amp;", "&")]);
    expect(hidden.length).toBeGreaterThan(0);
    const form = (headers: Record<string, string>) => request.post("/sign-in", { headers, maxRedirects: 0, multipart: { ...Object.fromEntries(hidden), email: "nobody@example.test", password: "not a password of anybody", next: "" } });
    const ours = await (await form({ origin: origin() })).text();
    expect(ours).not.toContain("This must be sent from our own pages.");
    for (const headers of [{} as Record<string, string>, { origin: "https://elsewhere.example" }, { origin: origin(), "sec-fetch-site": "cross-site" }]) {
      const answer = await form(headers);
      const refused = answer.status() >= 400 || (await answer.text()).includes("This must be sent from our own pages.");
      expect(refused, JSON.stringify(headers)).toBe(true);
    }
  });
});
