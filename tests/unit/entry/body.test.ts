import { describe, expect, it } from "vitest";
import { readBytes, readJson } from "@/lib/entry/body";

const KB = 1024;
const JSON_TYPE = { "content-type": "application/json" };

const sent = (body: BodyInit | null, headers: Record<string, string> = JSON_TYPE) => new Request("http://localhost:4999/api/v1/test", { method: "POST", headers, body });

/** A body that arrives in pieces without saying how long it will be; tells how much of it was asked for. */
function inPieces(total: number, piece = 4 * KB) {
  const seen = { bytes: 0, cancelled: false };
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (seen.bytes >= total) return controller.close();
      seen.bytes += piece;
      controller.enqueue(new Uint8Array(piece).fill(0x20));
    },
    cancel() { seen.cancelled = true; },
  });
  return { seen, request: new Request("http://localhost:4999/", { method: "POST", headers: JSON_TYPE, body, duplex: "half" } as RequestInit) };
}

const codeOf = (work: Promise<unknown>) => work.then(() => "read", (error: { code?: string }) => error.code ?? String(error));

describe("size", () => {
  it("takes 64 KB and no byte more", async () => {
    const padded = (bytes: number) => sent(`{}${" ".repeat(bytes - 2)}`);
    expect(await codeOf(readJson(padded(64 * KB)))).toBe("read");
    expect(await codeOf(readJson(padded(64 * KB + 1)))).toBe("too_large");
  });

  it("counts bytes, not characters", async () => {
    expect(await codeOf(readJson(sent(JSON.stringify({ a: "🚂".repeat(17 * KB) }))))).toBe("too_large");
  });

  it("stops reading a body that does not say its length, and one that lies about it", async () => {
    const { seen, request } = inPieces(100 * KB * KB);
    expect(await codeOf(readJson(request))).toBe("too_large");
    expect(seen.bytes).toBeLessThan(128 * KB);
    expect(seen.cancelled).toBe(true);
    const lying = new Request("http://localhost:4999/", { method: "POST", headers: { ...JSON_TYPE, "content-length": "2" }, body: " ".repeat(65 * KB) });
    expect(await codeOf(readJson(lying))).toBe("too_large");
  });

  it("refuses by the length alone, before reading", async () => {
    const { seen, request } = inPieces(0);
    const announced = new Request(request, { headers: { ...JSON_TYPE, "content-length": String(120 * KB * KB) } });
    expect(await codeOf(readJson(announced))).toBe("too_large");
    expect(seen.bytes).toBe(0);
  });

  it("has a limit of the caller's own where it is given", async () => {
    expect((await readBytes(sent("x".repeat(200 * KB)), 256 * KB)).byteLength).toBe(200 * KB);
    await expect(readBytes(sent("x".repeat(257 * KB)), 256 * KB)).rejects.toMatchObject({ code: "too_large", message: expect.stringContaining("256 KB") });
  });
});

describe("depth", () => {
  const nested = (depth: number, open: string, close: string) => `${open.repeat(depth)}1${close.repeat(depth)}`;

  it.each([["5 million lists", 5_000_000, "["], ["30,000 lists", 30_000, "["], ["12,000 objects", 12_000, '{"a":']])("%s are refused in less than a tenth of a second", async (_, depth, open) => {
    const request = sent(open.repeat(depth));
    const began = performance.now();
    expect(["too_large", "bad_input"]).toContain(await codeOf(readJson(request)));
    expect(performance.now() - began).toBeLessThan(100);
  });

  it("takes twenty levels and no more, and does not count brackets inside texts", async () => {
    expect(await codeOf(readJson(sent(nested(20, '{"a":', "}"))))).toBe("read");
    expect(await codeOf(readJson(sent(nested(21, '{"a":', "}"))))).toBe("bad_input");
    expect(await codeOf(readJson(sent(JSON.stringify({ a: `\\"${"[{".repeat(500)}` }))))).toBe("read");
    expect(await codeOf(readJson(sent(JSON.stringify({ a: Array.from({ length: 500 }, () => ({})) }))))).toBe("read");
  });
});

it.each([
  ["an empty body is an empty form", "", {}],
  ["words and numbers", '{"a":"ä 🚂","b":1}', { a: "ä 🚂", b: 1 }],
  ["the last of a doubled key", '{"a":1,"a":2}', { a: 2 }],
  ["space around it", ' \n{"a":1}\t ', { a: 1 }],
])("reads %s", async (_, text, value) => {
  expect((await readJson(sent(text))).value).toEqual(value);
  expect((await readJson(sent(text))).text).toBe(text);
});

it.each([
  ["a list", "[]"], ["a list of objects", '[{"a":1}]'], ["a text", '"a"'], ["a number", "1"], ["true", "true"], ["null", "null"],
  ["half an object", '{"a":'], ["two objects", "{}{}"], ["a single quote", "{'a':1}"], ["NaN", '{"a":NaN}'], ["a trailing comma", '{"a":1,}'], ["a comment", "{}//"],
  ["a raw line break in a text", '{"a":"\n"}'], ["a control character in a text", '{"a":"\u0000"}'], ["markup", "<a/>"], ["form fields", "a=1&b=2"],
])("%s is refused as bad input, not broken on", async (_, text) => {
  await expect(readJson(sent(text))).rejects.toMatchObject({ code: "bad_input" });
});

it.each([
  ["a lone byte", [0xff]], ["an overlong slash", [0xc0, 0xaf]], ["a half character", [0xe2, 0x82]], ["a surrogate written as bytes", [0xed, 0xa0, 0x80]], ["beyond the last character", [0xf4, 0x90, 0x80, 0x80]],
])("bytes that are no UTF-8 are refused: %s", async (_, bytes) => {
  const body = Buffer.concat([Buffer.from('{"a":"'), Buffer.from(bytes), Buffer.from('"}')]);
  await expect(readJson(sent(body))).rejects.toMatchObject({ code: "bad_input" });
});

it("packed bytes are not unpacked", async () => {
  const { gzipSync } = await import("node:zlib");
  await expect(readJson(sent(new Uint8Array(gzipSync("{}".padEnd(1_000_000))), { ...JSON_TYPE, "content-encoding": "gzip" }))).rejects.toMatchObject({ code: "bad_input" });
});

it.each(["text/plain", "text/plain;charset=UTF-8", "application/x-www-form-urlencoded", "multipart/form-data; boundary=x", "application/jsonp", "application/json-patch+json", "text/json", "x application/json", ""])("the type %j is refused", async (type) => {
  await expect(readJson(sent("{}", { "content-type": type }))).rejects.toMatchObject({ code: "not_json" });
});

it.each(["application/json", "application/json; charset=utf-8", "Application/JSON;charset=UTF-8", "application/json ; x=y"])("the type %j is taken", async (type) => {
  expect(await codeOf(readJson(sent("{}", { "content-type": type })))).toBe("read");
});

it.each(["__proto__", "constructor", "prototype", "toString"])("a key named %s is a key and no more", async (name) => {
  const { value } = await readJson(sent(`{"${name}":{"admin":true},"${name}":{"admin":true}}`));
  expect(Object.keys(value)).toEqual([name]);
  expect(({} as Record<string, unknown>).admin).toBeUndefined();
  expect(Object.getPrototypeOf(value)).toBe(Object.prototype);
});
