import { expect, test, type APIResponse, type Page } from "@playwright/test";
import { connect } from "node:net";
import { DEMO_PASSWORD } from "@/lib/local/demo-people";
import { routes } from "@/lib/routes";
import { demoCase, emailOf, pageAs } from "./support/demo";

const EVERYWHERE = {
  "x-content-type-options": "nosniff", "x-frame-options": "DENY", "cross-origin-opener-policy": "same-origin", "cross-origin-resource-policy": "same-origin", "referrer-policy": "same-origin",
};

/** What no answer may lack or tell. */
function expectGuarded(answer: APIResponse): void {
  const headers = answer.headers();
  expect(headers).toMatchObject(EVERYWHERE);
  expect(headers["permissions-policy"]).toContain("geolocation=()");
  expect(headers["content-security-policy"]).toContain("frame-ancestors 'none'");
  expect(headers["cache-control"]).toContain("no-store");
  expect(headers["x-powered-by"]).toBeUndefined();
  expect(headers["server"]).toBeUndefined();
}

const nonceOf = (answer: APIResponse) => /'nonce-([^']+)'/.exec(answer.headers()["content-security-policy"] ?? "")?.[1] ?? "";

test.describe("What comes with every answer", () => {
  for (const path of ["/", "/sign-in", "/nowhere", "/moves", "/api/v1/moves", "/api/v1/nowhere", "/api/uploadthing"]) {
    test(`guards stand on ${path}`, async ({ request }) => {
      expectGuarded(await request.get(path, { maxRedirects: 0 }));
    });
  }

  test("script may run only with the nonce of its own request, and nothing may frame, plug in or send elsewhere", async ({ request }) => {
    const [one, two] = [await request.get("/"), await request.get("/")];
    expect(nonceOf(one)).toMatch(/^[A-Za-z0-9+/]{22}==$/);
    expect(nonceOf(one)).not.toBe(nonceOf(two));
    const policy = one.headers()["content-security-policy"] ?? "";
    expect(policy).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic'(;|$)/);
    for (const part of ["default-src 'self'", "object-src 'none'", "base-uri 'none'", "form-action 'self'", "frame-src 'none'"]) expect(policy).toContain(part);
    const tags = [...(await one.text()).matchAll(/<script\b[^>]*>/g)].map(([tag]) => tag);
    expect(tags.length).toBeGreaterThan(3);
    expect(tags.filter((tag) => !tag.includes(`nonce="${nonceOf(one)}"`))).toEqual([]);
  });

  test("a page that is not there has a script of its own request too", async ({ request }) => {
    const answer = await request.get("/nowhere");
    expect(answer.status()).toBe(404);
    expect(await answer.text()).toContain(`nonce="${nonceOf(answer)}"`);
  });

  test("an answer of the API is nothing to run or show", async ({ request }) => {
    const answer = await request.get("/api/v1/moves");
    expect(answer.status()).toBe(401);
    expect(answer.headers()["content-security-policy"]).toBe("default-src 'none'; frame-ancestors 'none'; sandbox");
    expect(answer.headers()["content-type"]).toContain("application/problem+json");
  });

  test("the path of a private link goes to nobody", async ({ request }) => {
    for (const path of [routes.join("a-token-of-nobody-at-all"), routes.verifyAddress("a-token"), routes.resetPassword("a-token"), routes.enter("a-token")]) {
      expect((await request.get(path)).headers()["referrer-policy"]).toBe("strict-origin");
    }
    expect((await (await request.get(routes.follow("a-token"))).text())).toContain('name="robots" content="noindex');
  });
});

/** Sends a request as it stands and reads the answer's first line; ordinary clients refuse to send some of these. */
function rawStatus(head: string): Promise<number> {
  const { hostname, port } = new URL(process.env.APP_URL ?? "http://localhost:4000");
  return new Promise((resolve, reject) => {
    const socket = connect(Number(port), hostname, () => socket.write(`${head}\r\nHost: ${hostname}:${port}\r\nConnection: close\r\n\r\n`));
    let heard = "";
    socket.on("data", (chunk: Buffer) => (heard += chunk.toString("latin1")));
    socket.on("end", () => resolve(Number(/^HTTP\/1\.1 (\d{3})/.exec(heard)?.[1])));
    socket.on("error", reject);
  });
}

test.describe("What is not served", () => {
  const HIDDEN = ["/.env", "/.env.local", "/.git/HEAD", "/.git/config", "/package.json", "/package-lock.json", "/.next/BUILD_ID", "/next.config.ts", "/.data/keys.json", "/db/schema/index.ts", "/_next/../package.json", "/%2e%2e/package.json", "/_next/static/../../package.json", "/_next/server/app/page.js"];
  for (const path of HIDDEN) {
    test(`not ${path}`, async () => {
      expect([400, 404]).toContain(await rawStatus(`GET ${path} HTTP/1.1`));
    });
  }

  test("no source maps", async ({ page, request }) => {
    const html = await (await request.get("/")).text();
    const scripts = [...html.matchAll(/<script\b[^>]*\bsrc="([^"]+)"/g)].flatMap(([, src]) => src ?? []);
    expect(scripts.length).toBeGreaterThan(3);
    for (const script of scripts) {
      expect((await request.get(`${script}.map`)).status(), script).toBe(404);
      expect(await (await request.get(script)).text(), script).not.toContain("sourceMappingURL");
    }
    await page.close();
  });

  test("methods that nothing here needs are refused", async () => {
    for (const method of ["TRACE", "CONNECT", "PATCH", "PROPFIND", "BREW"]) {
      const status = await rawStatus(`${method} / HTTP/1.1`);
      expect(Number.isNaN(status) || status >= 400, `${method} answered ${status}`).toBe(true);
    }
  });
});

/** A write as one of our own pages would send it. */
const ours = (page: Page) => ({ origin: new URL(page.url()).origin, "sec-fetch-site": "same-origin", "content-type": "application/json", "idempotency-key": crypto.randomUUID() });

test.describe("The API's problem documents", () => {
  test("an address without a door, a method that a door does not take, and a case that is not one's own", async ({ browser }) => {
    const page = await pageAs(browser, "receiver");
    await page.goto(routes.moves());
    const { moveId } = await demoCase("4401");
    const asked = [
      { answer: await page.request.get("/api/v1/nowhere"), status: 404 },
      { answer: await page.request.delete("/api/v1/moves", { headers: ours(page) }), status: 405 },
      { answer: await page.request.fetch("/api/v1/moves", { method: "PATCH", headers: ours(page) }), status: 405 },
      { answer: await page.request.get(routes.api.move(moveId)), status: 404 },
      { answer: await page.request.post(routes.api.closeMove(moveId), { headers: ours(page), data: { name: "A" } }), status: 404 },
      { answer: await page.request.post(routes.api.closeMove(moveId), { headers: { ...ours(page), origin: "https://elsewhere.example" }, data: { name: "A" } }), status: 403 },
    ];
    for (const { answer, status } of asked) {
      expect(answer.status(), answer.url()).toBe(status);
      expect(answer.headers()["content-type"]).toContain("application/problem+json");
      const { type, title, instance, ...rest } = (await answer.json()) as Record<string, unknown>;
      expect(rest).toEqual({ status });
      expect([type, title, instance].join(" ")).toMatch(/^\/problems\/[a-z-]+ .+ urn:uuid:[0-9a-f-]{36}$/);
      if (status === 405) expect(answer.headers()["allow"]).toBe("OPTIONS, HEAD, GET, POST");
    }
    await page.context().close();
  });
});

test.describe("The session", () => {
  test("its cookie can't be read by script, sent from elsewhere, or planted by a neighbour, and ends with signing out", async ({ browser }) => {
    const page = await pageAs(browser, null);
    await page.goto(routes.signIn());
    await page.getByLabel("E-mail address").fill(emailOf("receiver"));
    await page.getByRole("textbox", { name: "Password" }).fill(DEMO_PASSWORD);
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByRole("heading", { level: 1, name: "Moves" })).toBeVisible();
    const cookies = await page.context().cookies();
    expect(cookies.map(({ name }) => name)).toEqual(["__Host-sid"]);
    expect(cookies[0]).toMatchObject({ secure: true, httpOnly: true, sameSite: "Lax", path: "/" });
    expect(await page.evaluate(() => document.cookie)).toBe("");
    expect((await page.request.get(routes.api.moves())).status()).toBe(200);
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page.getByRole("heading", { name: "Sign in" })).toBeVisible();
    expect(await page.context().cookies()).toEqual([]);
    // Whoever kept the old value has nothing in hand.
    await page.context().addCookies(cookies.map(({ name, value }) => ({ name, value, url: `https://${new URL(page.url()).hostname}`, secure: true, httpOnly: true, sameSite: "Lax" as const })));
    expect((await page.request.get(routes.api.moves())).status()).toBe(401);
    await page.goto(routes.moves());
    await expect(page).toHaveURL(routes.signIn(routes.moves()));
    await page.context().close();
  });

  test("what was read is not left behind for the next person at the same browser", async ({ browser }) => {
    const page = await pageAs(browser, "receiver");
    await page.goto(routes.moves());
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page.getByRole("heading", { name: "Sign in" })).toBeVisible();
    await page.goBack();
    await expect(page.getByRole("heading", { level: 1, name: "Moves" })).toHaveCount(0);
    await page.context().close();
  });
});
