import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { hashSources, isStale } from "@/lib/local/build";

let root: string;

function write(path: string, content: string): void {
  mkdirSync(dirname(join(root, path)), { recursive: true });
  writeFileSync(join(root, path), content);
}

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), "towfolio-build-"));
  write("app/page.tsx", "one");
  write("lib/moves/rules.ts", "two");
  write("next.config.ts", "three");
});

afterEach(() => rmSync(root, { recursive: true }));

describe("a build", () => {
  it("is stale until it was finished from these sources", () => {
    expect(isStale(root, ".next")).toBe(true);
    write(".next/source-hash", hashSources(root));
    expect(isStale(root, ".next")).toBe(true);
    write(".next/BUILD_ID", "id");
    expect(isStale(root, ".next")).toBe(false);
  });

  it.each([
    ["a page changes", () => write("app/page.tsx", "changed")],
    ["a file is added", () => write("components/ui/button.tsx", "new")],
    ["a file goes", () => rmSync(join(root, "lib/moves/rules.ts"))],
    ["a settings file changes", () => write("next.config.ts", "changed")],
    ["the packages change", () => write("package-lock.json", "changed")],
    ["content moves from one file to the next", () => write("app/page.tsx", "onelib")],
  ])("is stale after %s", (_, change) => {
    const before = hashSources(root);
    change();
    expect(hashSources(root)).not.toBe(before);
  });

  it.each([
    ["a test", "tests/unit/x.test.ts"],
    ["the launcher", "lib/local/start.ts"],
    ["a migration", "db/migrations/0001.sql"],
    ["a paper for readers", "README.md"],
    ["kept data", ".data/keys.json"],
  ])("stays good when only %s changes", (_, path) => {
    const before = hashSources(root);
    write(path, "new");
    expect(hashSources(root)).toBe(before);
  });
});
