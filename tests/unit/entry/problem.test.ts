import { format } from "node:util";
import { DrizzleQueryError } from "drizzle-orm/errors";
import { expect, it } from "vitest";
import { problem, type ProblemDocument } from "@/lib/entry/problem";
import { AppError, REFUSALS, type Refusal } from "@/lib/errors";
import { expectConsoleError } from "../../support/fail-on-console-error";

const read = async (error: unknown) => {
  const response = problem(error);
  return { response, document: (await response.json()) as ProblemDocument };
};

const failed = (fields: Record<string, unknown>, message = "boom") => Object.assign(new Error(message), fields);
const wrapped = (cause: Error) => new DrizzleQueryError("select secret from users where id = ?", ["usr_1"], cause);

it.each(Object.entries(REFUSALS))("the refusal %s has the status %i and a type of its own", async (code, status) => {
  const { response, document } = await read(new AppError(code as Refusal, "In words."));
  expect(response.status).toBe(status);
  expect(document).toEqual({ type: `/problems/${code.replaceAll("_", "-")}`, status, title: "In words.", instance: expect.stringMatching(/^urn:uuid:[0-9a-f-]{36}$/) });
  expect(response.headers.get("content-type")).toMatch(/^application\/problem\+json/);
  expect(response.headers.get("cache-control")).toBe("no-store");
});

it("carries fields, what is missing and how long to wait, and never the cause", async () => {
  const { response, document } = await read(new AppError("not_yet", "Not yet.", { fields: { name: ["Enter a name."] }, missing: ["An acceptance."], retryAfterSeconds: 7, cause: new Error("inner words") }));
  expect(document).toMatchObject({ fields: { name: ["Enter a name."] }, missing: ["An acceptance."] });
  expect(response.headers.get("retry-after")).toBe("7");
  expect(JSON.stringify(document)).not.toMatch(/inner|retryAfter|code/);
});

it.each([
  ["nobody listens", failed({ code: "ECONNREFUSED", syscall: "connect", errno: -111 })],
  ["no answer in time", failed({ code: "ETIMEDOUT", syscall: "connect" })],
  ["the socket is gone", failed({ code: "ENOENT", syscall: "connect" })],
  ["cut off while reading", failed({ code: "ECONNRESET", syscall: "read" })],
  ["cut off while writing", failed({ code: "EPIPE", syscall: "write" })],
  ["cut off by the server", failed({ code: "PROTOCOL_CONNECTION_LOST", fatal: true })],
  ["a connection that is already closed", failed({ fatal: true }, "Can't add new command when connection is in closed state")],
  ["too many waiting", failed({}, "Queue limit reached.")],
  ["too many connections", failed({ errno: 1040 })],
  ["shutting down", failed({ errno: 1053 })],
  ["disk full", failed({ errno: 1021 })],
  ["table full", failed({ errno: 1114 })],
  ["read-only", failed({ errno: 1290 })],
  ["a statement cut off for taking too long", failed({ errno: 1969 })],
  ["a row held too long", failed({ errno: 1205 })],
  ["two in each other's way", failed({ errno: 1213 })],
])("a database that is away or full is told as busy, to be tried again: %s", async (_, error) => {
  for (const one of [error, wrapped(error), new Error("outer", { cause: wrapped(error) })]) {
    const { response, document } = await read(one);
    expect(response.status).toBe(503);
    expect(response.headers.get("retry-after")).toBe("3");
    expect(document).toMatchObject({ type: "/problems/busy", title: expect.stringContaining("Try again in a few seconds") });
    // The answer to a commit may have been lost on the way.
    expect(document.title).not.toContain("Nothing was saved");
  }
});

it.each([
  ["a fault of ours", new TypeError("cannot read secret of undefined")],
  ["a doubled key", wrapped(failed({ errno: 1062, code: "ER_DUP_ENTRY" }, "Duplicate entry 'secret'"))],
  ["a denied table", wrapped(failed({ errno: 1142 }, "INSERT command denied to secret"))],
  ["a thrown text", "secret"],
  ["a thrown nothing", undefined],
  ["a fault behind a fault", new Error("outer", { cause: new Error("secret") })],
])("what nobody expected is told without detail, and logged under the same instance: %s", async (_, error) => {
  const logged: string[] = [];
  const before = console.error;
  console.error = (...parts: unknown[]) => { logged.push(format(...parts)); before(...parts); };
  expectConsoleError(/^unexpected urn:uuid:/);
  const { response, document } = await read(error);
  console.error = before;
  expect(response.status).toBe(500);
  expect(document).toEqual({ type: "/problems/unexpected", status: 500, title: "That did not go through. Nothing was saved.", instance: expect.stringMatching(/^urn:uuid:/) });
  expect(logged).toHaveLength(1);
  expect(logged[0]).toContain(document.instance);
});

it("a refusal is nobody's fault and is not logged", async () => {
  const { document: one } = await read(new AppError("bad_input", "Look again."));
  const { document: other } = await read(new AppError("bad_input", "Look again."));
  expect(one.instance).not.toBe(other.instance);
});
