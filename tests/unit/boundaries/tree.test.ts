import { existsSync, readdirSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { cycleProblems } from "./cycles";
import { problemsOf } from "./problems";
import { readSource } from "./read";

const FOLDERS = ["app", "components", "db", "emails", "lib", "tests"];

const sources = [
  ...readdirSync(".").filter((name) => name !== "next-env.d.ts"),
  ...FOLDERS.filter((folder) => existsSync(folder)).flatMap((folder) => readdirSync(folder, { recursive: true, encoding: "utf8" }).map((name) => `${folder}/${name}`)),
]
  .filter((path) => /\.tsx?$/.test(path))
  .map((path) => readSource(path, readFileSync(path, "utf8")));

it("reads the whole tree", () => {
  for (const folder of ["components/ui/", "db/schema/", "lib/moves/", "tests/unit/"]) expect(sources.some(({ path }) => path.startsWith(folder))).toBe(true);
});

it("every file imports and does only what its kind may", () => {
  expect(sources.flatMap(problemsOf)).toEqual([]);
});

it("no files load each other in a circle", () => {
  expect(cycleProblems(sources)).toEqual([]);
});
