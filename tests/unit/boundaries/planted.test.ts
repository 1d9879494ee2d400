import { describe, expect, it } from "vitest";
import { cycleProblems } from "./cycles";
import { problems } from "./problems";
import { readSource } from "./read";

const SERVER = 'import "server-only";\n';
const asked = "export async function listFindings(viewer: Viewer) {}\n";

describe("imports", () => {
  it.each([
    ["a page reaching for the database", "app/(desk)/moves/page.tsx", 'import { db } from "@/db/client";'],
    ["a page reaching for drizzle", "app/(desk)/moves/page.tsx", 'import { eq } from "drizzle-orm";'],
    ["a page reaching for a stand-in", "app/(desk)/moves/page.tsx", 'import { sink } from "@/lib/local/mail/sink";'],
    ["a page using the image optimizer", "app/(desk)/moves/page.tsx", 'import Image from "next/image";'],
    ["a computation reaching for the database", "lib/fees/split.ts", 'import { db } from "@/db/client";'],
    ["a computation reaching for a package", "lib/fees/split.ts", 'import { z } from "zod";'],
    ["a computation reaching for a node module", "lib/fees/split.ts", 'import { createHash } from "node:crypto";'],
    ["a computation in a folder of its room", "lib/prep/template/body.ts", 'import { z } from "zod";'],
    ["a computation calling a service", "lib/fees/split.ts", 'import { pay } from "@/lib/payments/checkout";'],
    ["a computation reading the environment", "lib/fees/split.ts", 'import { env } from "@/lib/env";'],
    ["a computation loading an input", "lib/fees/split.ts", 'import { quoteInput } from "./input";'],
    ["a lazy import", "lib/fees/split.ts", 'const db = await import("@/db/client");'],
    ["an import worked out at run time", "lib/fees/split.ts", "const db = await import(where);"],
    ["a require", "lib/fees/split.ts", 'const db = require("@/db/client");'],
    ["a type fetched inline", "lib/fees/split.ts", 'type Db = import("@/db/client").Db;'],
    ["a re-export", "lib/fees/split.ts", 'export { db } from "@/db/client";'],
    ["a way round by a relative path", "lib/fees/split.ts", 'import { db } from "../../db/client";'],
    ["a query in a computation's clothes", "lib/fees/split.ts", 'import { listFees } from "./queries/list";'],
    ["trade arithmetic reaching for a room", "lib/trade/limits.ts", 'import { FINDING_STATES } from "@/lib/findings/vocabulary";'],
    ["trade arithmetic reaching for our errors", "lib/trade/limits.ts", 'import { AppError } from "@/lib/errors";'],
    ["a table reaching for a rule", "db/schema/fees.ts", 'import { deny } from "@/lib/fees/rules";'],
    ["a table loading types at run time", "db/schema/fees.ts", 'import { type Fee } from "@/lib/fees/types";'],
    ["a component reaching for a query", "components/findings/list.tsx", 'import { listFindings } from "@/lib/findings/queries";'],
    ["a component reaching for a type of a query", "components/findings/list.tsx", 'import type { Row } from "@/lib/findings/queries";'],
    ["a component loading zod with an input", "components/findings/form.tsx", 'import { postFindingInput } from "@/lib/findings/input";'],
    ["a component loading zod by an inline type", "components/findings/form.tsx", 'import { type PostFinding } from "@/lib/findings/input";'],
    ["a component reading the environment", "components/fees/pay.tsx", 'import { env } from "@/lib/env";'],
    ["a component reaching into app", "components/fees/pay.tsx", 'import { x } from "@/app/fonts";'],
    ["a primitive that knows the domain", "components/ui/badge.tsx", 'import type { Finding } from "@/lib/findings/types";'],
    ["options that load zod", "lib/findings/options.ts", 'import { postFindingInput } from "./input";'],
    ["options that reach for a query", "lib/findings/options.ts", 'import { listFindings } from "./queries";'],
    ["an e-mail reaching for a query", "emails/finding-posted.tsx", 'import { listFindings } from "@/lib/findings/queries";'],
    ["a service reaching for the database", "lib/payments/checkout.ts", 'import { db } from "@/db/client";'],
    ["a service calling a room", "lib/payments/checkout.ts", 'import { notePaid } from "@/lib/fees/commands";'],
    ["a room reaching up", "lib/findings/queries.ts", `${SERVER}import { listFees } from "@/lib/fees/queries";\n${asked}`],
    ["a room reaching up for a type", "lib/findings/types.ts", 'import type { Fee } from "@/lib/fees/types";'],
    ["the ground reaching up", "lib/viewer/queries.ts", `${SERVER}import { seenBy } from "@/lib/access/scope";\n${asked}`],
    ["the proxy reaching for the database", "proxy.ts", 'import { db } from "@/db/client";'],
    ["product code reaching for a test", "lib/fees/split.ts", 'import { aMove } from "@/tests/support/factories";'],
    ["a file outside every kind", "scripts/odd.ts", ""],
    ["a room's file with an odd folder", "lib/odd.ts", 'import { z } from "zod";'],
  ])("catches %s", (_, path, text) => {
    expect(problems(path, text)).toHaveLength(1);
  });

  it.each([
    ["a computation using dates", "lib/fees/split.ts", 'import { addDays } from "date-fns";\nimport { TZDate } from "@date-fns/tz";'],
    ["a computation of a later room using an earlier one", "lib/fees/split.ts", 'import { standingOf } from "@/lib/standing/rules";'],
    ["a computation using the trade's arithmetic", "lib/findings/judge.ts", 'import { judge } from "@/lib/trade/limits";'],
    ["a computation knowing the shape of an input", "lib/fees/split.ts", 'import type { Quote } from "./input";'],
    ["a component knowing the shape of an input", "components/findings/form.tsx", 'import type { PostFinding } from "@/lib/findings/input";'],
    ["a component with options", "components/findings/form.tsx", 'import { findingsOptions } from "@/lib/findings/options";\nimport { CallError } from "@/lib/entry/fetcher";'],
    ["a page loading a query", "app/(desk)/moves/[moveId]/page.tsx", 'import { load } from "@/lib/entry/load";\nimport { getMove } from "@/lib/moves/queries";'],
    ["a command using a service", "lib/fees/commands.ts", `${SERVER}import { z } from "zod";\nimport { checkout } from "@/lib/payments/checkout";\nexport async function payFee(viewer: Viewer) {}`],
    ["a table with a vocabulary", "db/schema/fees.ts", 'import { FEE_STATES } from "@/lib/fees/vocabulary";\nimport type { Fee } from "@/lib/fees/types";'],
    ["plumbing", "lib/local/demo/load.ts", 'import { db } from "@/db/client";\nimport { postFinding } from "@/lib/findings/commands";\nimport { spawn } from "node:child_process";'],
    ["a worker", "lib/worker/send.ts", 'import Mail from "@/emails/receipt";\nimport { unsafeTakeNext } from "@/lib/outbox/commands";'],
  ])("lets pass %s", (_, path, text) => {
    expect(problems(path, text)).toEqual([]);
  });
});

describe("exports of queries and commands", () => {
  it.each([
    ["a query nobody asked for", "lib/findings/queries.ts", `${SERVER}export async function listAll(moveId: string) {}`],
    ["a query without parameters", "lib/findings/queries.ts", `${SERVER}export async function listAll() {}`],
    ["a viewer taken apart", "lib/findings/queries.ts", `${SERVER}export async function listAll({ userId }: Viewer) {}`],
    ["a viewer that comes second", "lib/findings/queries.ts", `${SERVER}export async function listAll(moveId: string, viewer: Viewer) {}`],
    ["a query hidden in a constant", "lib/findings/queries.ts", `${SERVER}export const listAll = async () => [];`],
    ["a query hidden behind a call", "lib/findings/queries.ts", `${SERVER}export const listAll = cache(async () => []);`],
    ["a query handed on", "lib/findings/queries.ts", `${SERVER}async function listAll() {}\nexport { listAll };`],
    ["a query in a folder", "lib/findings/queries/board.ts", `${SERVER}export async function listAll() {}`],
    ["an unsafe query that does not say why", "lib/findings/queries.ts", `${SERVER}export async function unsafeListAll() {}`],
    ["a query that may reach the browser", "lib/findings/queries.ts", asked],
    ["a scope that may reach the browser", "lib/access/scope.ts", "export const seenBy = 1;"],
    ["a door that may reach the browser", "lib/entry/route.ts", "export const route = 1;"],
  ])("catches %s", (_, path, text) => {
    expect(problems(path, text)).toHaveLength(1);
  });

  it.each([
    ["the viewer first", asked],
    ["a transaction first", "export async function appendRecord(tx: Tx) {}"],
    ["a context first", "export async function linkPhotos(ctx: MoveWrite) {}"],
    ["unsafe, with its reason", "/** The webhook has no viewer. */\nexport async function unsafeNotePaid(id: string) {}"],
    ["a type", "export type Row = { id: string };"],
    ["a helper that stays inside", "async function rowsOf(moveId: string) {}"],
    ["a figure", "export const PAGE_SIZE = 50;"],
  ])("lets pass %s", (_, text) => {
    expect(problems("lib/record/commands.ts", SERVER + text)).toEqual([]);
  });
});

describe("habits", () => {
  it.each([
    ["a client page", "app/moves/page.tsx", '"use client";'],
    ["a client layout under a comment", "app/moves/layout.tsx", '// why\n"use client";'],
    ["a barrel", "lib/findings/index.ts", 'export * from "./types";'],
    ["a long file", "lib/fees/split.ts", "\n".repeat(301)],
    ["a path in an attribute", "components/findings/link.tsx", 'const a = <a href="/moves/1">x</a>;'],
    ["a path in an attribute's template", "components/findings/link.tsx", "const a = <a href={`/moves/${id}`}>x</a>;"],
    ["a path in a form", "components/findings/link.tsx", 'const a = <form action="/sign-out" />;'],
    ["a path pushed", "components/findings/link.tsx", "router.push(`/moves/${id}`);"],
    ["a path redirected to", "app/moves/page.tsx", 'redirect("/moves");'],
    ["a path fetched", "components/findings/link.tsx", 'await fetch("/api/v1/moves");'],
    ["a path in a list of links", "components/findings/link.tsx", 'const tabs = [{ href: "/moves", label: "Moves" }];'],
    ["the environment in a page", "app/moves/page.tsx", "const a = process.env.APP_URL;"],
    ["the environment by another spelling", "lib/fees/commands.ts", `${SERVER}const a = process["env"].APP_URL;`],
    ["the environment by import", "app/moves/page.tsx", 'import { env } from "node:process";'],
    ["raw SQL", "lib/fees/queries.ts", `${SERVER}const a = sql.raw(text);`],
    ["markup from text", "components/fees/pay.tsx", "const a = <p dangerouslySetInnerHTML={{ __html: text }} />;"],
    ["markup from text, spread in", "components/fees/pay.tsx", 'const a = { "dangerouslySetInnerHTML": { __html: text } };'],
    ["chance in lib", "lib/fees/split.ts", "const a = Math.random();"],
    ["chance in a page", "app/moves/page.tsx", "const a = Math.random();"],
    ["a computation with a clock", "lib/fees/split.ts", "const a = new Date();"],
    ["arithmetic with a clock", "lib/trade/dates.ts", "const a = Date.now();"],
  ])("catches %s", (_, path, text) => {
    expect(problems(path, text)).toHaveLength(1);
  });

  it.each([
    ["a client component", "components/fees/pay.tsx", '"use client";'],
    ["a path built by lib/routes", "components/fees/pay.tsx", 'import { routes } from "@/lib/routes";\nconst a = <a href={routes.moves()}>x</a>;'],
    ["a slash replaced in a text", "components/fees/pay.tsx", 'const a = text.replace("/", "-");'],
    ["a picture", "components/fees/pay.tsx", 'const a = <img src="/mark.svg" alt="" />;'],
    ["a place on the same page", "components/fees/pay.tsx", 'const a = <a href="#main">x</a>;'],
    ["the environment in its one place", "lib/env.ts", "const a = process.env;"],
    ["the environment in plumbing", "lib/local/start.ts", "const a = process.env.HOME;"],
    ["a date from a text", "lib/fees/split.ts", "const a = new Date(text);"],
    ["300 lines", "lib/fees/split.ts", "\n".repeat(300)],
    ["a word in a text", "lib/fees/split.ts", 'const a = "process.env and Math.random()";'],
  ])("lets pass %s", (_, path, text) => {
    expect(problems(path, text)).toEqual([]);
  });
});

describe("circles", () => {
  const circle = (...files: [string, string][]) => cycleProblems(files.map(([path, text]) => readSource(path, text)));

  it("finds files that load each other", () => {
    expect(circle(["lib/a/one.ts", 'import { two } from "./two";'], ["lib/a/two.ts", 'import { three } from "@/lib/b/three";'], ["lib/b/three.ts", 'export { one } from "@/lib/a/one";'])).toEqual([
      "circle: lib/a/one.ts -> lib/a/two.ts -> lib/b/three.ts -> lib/a/one.ts",
    ]);
  });

  it("counts an inline type, which still loads the file", () => {
    expect(circle(["lib/a/one.ts", 'import { type Two } from "./two";'], ["lib/a/two.ts", 'import { one } from "./one";'])).not.toEqual([]);
  });

  it("lets types point back", () => {
    expect(circle(["lib/a/one.ts", 'import type { Two } from "./two";'], ["lib/a/two.ts", 'import { one } from "./one";'])).toEqual([]);
  });
});
