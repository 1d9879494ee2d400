import { readdirSync } from "node:fs";
import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { users } from "@/db/schema";
import { ask } from "../support/asking";
import { withDatabase } from "../support/database";
import { TEST_ENVIRONMENT } from "../support/environment";
import { seedUser } from "../support/factories";
import { signedIn } from "../support/session";
import { CHECKS } from "./doors/checks";
import { isWrite, readOf, writeOf, type Send } from "./doors/knock";
import { openWorld, type World } from "./doors/world";
import { fingerprint } from "./fingerprint";
import { DOORS, type Door } from "./rows/doors";

withDatabase();

const origin = TEST_ENVIRONMENT.APP_URL ?? "";
const files = readdirSync("app/api", { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith("/route.ts")).map((name) => `app/api/${name}`);

type Code = Record<string, (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>>;

/** Straight to the code of one door, with what the web server would have read from the path. */
const sendTo = ({ door }: Door): Send => async ({ method, path, headers, body }) => {
  const pattern = door.replace(/^[A-Z]+ /, "");
  const file = files.find((one) => `/${one.replace(/^app\//, "").replace(/\/route\.ts$/, "")}` === pattern);
  if (!file) throw new Error(`There is no file for ${door}.`);
  const code = (await import(/* @vite-ignore */ `${process.cwd()}/${file}`)) as Code;
  const run = code[method];
  if (!run) throw new Error(`${file} has no ${method}.`);
  const values = path.split("/");
  const params = Object.fromEntries(pattern.split("/").flatMap((part, index) => (part.startsWith("[") ? [[part.slice(1, -1), decodeURIComponent(values[index] ?? "")]] : [])));
  const response = await ask(run, new Request(`${origin}${path}`, { method, headers, ...(body !== undefined && { body }) }), params);
  return { status: response.status, type: response.headers.get("content-type") ?? "", text: await response.text(), location: response.headers.get("location") };
};

/** People who come, and their sessions, are made for the tests themselves. */
const CALLERS = ["users", "sessions"];

let known: Promise<World> | undefined;
const theWorld = () => (known ??= openWorld());

/** A read of something that the owner has, and that needs no file service. */
const ownerReads = (door: Door) => !isWrite(door) && ["case", "draft", "company"].includes(door.of) && !door.door.includes("photos/[photoId]/");

for (const door of DOORS) {
  describe(door.door, () => {
    const send = sendTo(door);

    for (const check of CHECKS) {
      if (check.applies(door)) it(check.title, async () => {
        const world = await theWorld();
        const before = await fingerprint(CALLERS);
        expect(await check.run({ door, send, world, origin })).toEqual([]);
        expect(await fingerprint(CALLERS)).toBe(before);
      });
    }

    if (ownerReads(door)) it("is read by the owner, and changes nothing by that", async () => {
      const { ids, cookieOf } = await theWorld();
      const before = await fingerprint(CALLERS);
      expect((await send(readOf(door.door, ids, await cookieOf("owner")))).status).toBe(200);
      expect(await fingerprint(CALLERS)).toBe(before);
    });
  });
}

describe("a session", () => {
  const account = DOORS.find(({ door }) => door === "GET /api/v1/account");
  const seen = async (cookie: string) => (account ? (await sendTo(account)(readOf(account.door, (await theWorld()).ids, cookie))).status : 0);

  it("opens the person's own account", async () => {
    expect(await seen(await (await theWorld()).cookieOf("owner"))).toBe(200);
  });

  it("opens nothing for somebody whose address has not been checked", async () => {
    expect(await seen(await signedIn(await seedUser("U. Unproven", { emailVerified: false })))).toBe(403);
  });

  it("opens nothing for somebody who was disabled", async () => {
    const userId = await seedUser("D. Disabled");
    const cookie = await signedIn(userId);
    await db().update(users).set({ disabledAt: new Date() }).where(eq(users.id, userId));
    expect(await seen(cookie)).toBe(401);
  });

  it("opens nothing under a signature of another key", async () => {
    const cookie = await (await theWorld()).cookieOf("owner");
    expect(await seen(cookie.replace(/.{8}$/, "AAAAAA%3D"))).toBe(401);
  });
});

it("a path's id wins over one in the body", async () => {
  const [first, second] = [await openWorld(), await openWorld()];
  const door = DOORS.find(({ door: name }) => name === "POST /api/v1/moves/[moveId]/cancel");
  if (!door) throw new Error("There is no such door.");
  const body = JSON.stringify({ moveId: first.ids.moveId, reason: "Sold" });
  const answer = await sendTo(door)(writeOf(door, second.ids, origin, await first.cookieOf("owner"), { body }));
  expect(answer.status).toBe(404);
});
