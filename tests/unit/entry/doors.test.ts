import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { listDoors, methodsOf } from "@/lib/doors";

/** The doors as the files have them. */
function doorsOfFiles(): [path: string, methods: string][] {
  const files = readdirSync("app/api", { recursive: true, withFileTypes: true }).filter(({ name }) => name === "route.ts");
  return files.map(({ parentPath, name }) => {
    const methods = [...readFileSync(join(parentPath, name), "utf8").matchAll(/^export (?:const|async function|function) ([A-Z]+)\b/gm)].map(([, method]) => method);
    return [`/${parentPath.replace(/^app\//, "").replaceAll(/\[[^\]]+\]/g, "*")}`, methods.join(" ")];
  });
}

describe("the list of doors", () => {
  test("names every door with its methods, and none that there is not", () => {
    expect(Object.fromEntries(listDoors())).toEqual(Object.fromEntries(doorsOfFiles()));
  });

  test.each([
    ["/api/v1/moves", ["GET", "POST"]],
    ["/api/v1/moves/mov_1", ["GET", "PUT"]],
    ["/api/v1/moves/mov_1/prep/sign", ["POST"]],
    ["/api/v1/moves/mov_1/nothing", null],
    ["/api/v1/moves/", null],
    ["/api", null],
  ])("%s answers to %j", (path, methods) => {
    expect(methodsOf(path)).toEqual(methods);
  });
});
