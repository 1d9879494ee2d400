import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { LIMITS } from "@/lib/viewer/limits";

const text = readFileSync("DEVELOPERS.md", "utf8");
const { dependencies, devDependencies } = JSON.parse(readFileSync("package.json", "utf8")) as Record<"dependencies" | "devDependencies", Record<string, string>>;

it("the written limits are those that run", () => {
  const written = Object.fromEntries([...text.matchAll(/^\| ([a-z-]+) \| (\d+) \| (\d+) \|$/gm)].map(([, name, max, windowSeconds]) => [name, { max: Number(max), windowSeconds: Number(windowSeconds) }]));
  expect(written).toEqual(LIMITS);
});

it("every dependency has a line saying what it is for", () => {
  const section = text.slice(text.indexOf("## Dependencies"));
  const named = [...section.matchAll(/^\| ([^|]+) \|/gm)].flatMap(([, names = ""]) => names.split(",").map((name) => name.trim()));
  const covered = (name: string) => named.some((one) => (one.endsWith("/*") ? name.startsWith(one.slice(0, -1)) : one === name));
  expect(Object.keys({ ...dependencies, ...devDependencies }).filter((name) => !covered(name))).toEqual([]);
});
