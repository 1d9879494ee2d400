import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { keepKeys } from "@/lib/local/keys";

let folder: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "towfolio-keys-"));
});

afterEach(() => rmSync(folder, { recursive: true }));

describe("the secrets of a local copy", () => {
  it("are made once, each another, and readable by this user alone", () => {
    const keys = keepKeys(folder);
    expect(new Set(Object.values(keys)).size).toBe(Object.keys(keys).length);
    expect(keepKeys(folder)).toEqual(keys);
    expect(statSync(join(folder, "keys.json")).mode & 0o777).toBe(0o600);
  });

  it("gain one that a newer release needs without changing the others", () => {
    const { authSecret, ...others } = keepKeys(folder);
    writeFileSync(join(folder, "keys.json"), JSON.stringify(others));
    const keys = keepKeys(folder);
    expect(keys).toMatchObject(others);
    expect(keys.authSecret).not.toBe(authSecret);
  });

  it("are never replaced when they cannot be read", () => {
    writeFileSync(join(folder, "keys.json"), "{ half");
    expect(() => keepKeys(folder)).toThrow("cannot be read");
    expect(readFileSync(join(folder, "keys.json"), "utf8")).toBe("{ half");
  });
});
