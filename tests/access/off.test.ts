import { execFile } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { TABLE } from "./table";

type Report = { testResults: { assertionResults: { ancestorTitles: string[]; title: string; status: "passed" | "failed" | "skipped" | "pending" }[] }[] };
type Judged = Report["testResults"][number]["assertionResults"][number];

/** Titles of the tests in which somebody is kept out. */
const KEEPS_OUT = "tells|refuses|gives nothing";

/** Runs the access tests in a process of their own, with the guard switched off, and gives what became of each. */
async function runWithoutGuard(): Promise<Judged[]> {
  const folder = mkdtempSync(join(tmpdir(), "towfolio-access-off-"));
  const report = join(folder, "report.json");
  const args = ["node_modules/vitest/vitest.mjs", "run", "--config", "tests/support/access-off/vitest.config.ts", "-t", KEEPS_OUT, "--reporter=json", `--outputFile.json=${report}`];
  // It is meant to end with failures, so its code says nothing.
  await new Promise<void>((resolve) => execFile(process.execPath, args, { maxBuffer: 64 * 1024 * 1024 }, () => resolve()));
  const { testResults } = JSON.parse(readFileSync(report, "utf8")) as Report;
  rmSync(folder, { recursive: true });
  return testResults.flatMap((file) => file.assertionResults);
}

/** Rooms in which policy or scope has a say. */
const guarded = Object.entries(TABLE).filter(([, rows]) => rows.some((row) => !row.own)).map(([room]) => room);

describe("with the guard switched off", () => {
  let judged: Judged[] = [];
  const failed = (room: string) => judged.filter((one) => one.ancestorTitles.includes(room) && one.status === "failed");

  beforeAll(async () => {
    judged = await runWithoutGuard();
  }, 15 * 60_000);

  it("the same tests run", () => {
    expect(judged.filter((one) => one.status === "passed" || one.status === "failed").length).toBeGreaterThan(100);
  });

  it.each(guarded)("the tests of %s fail", (room) => {
    expect(failed(room).length).toBeGreaterThan(0);
  });

  it("every row that asks the guard fails", () => {
    const silent = Object.entries(TABLE).flatMap(([room, rows]) => rows
      .filter((row) => !row.own)
      .map(({ name, as }) => [name, as].filter(Boolean).join(", "))
      .filter((title) => !failed(room).some((one) => one.ancestorTitles.includes(title)))
      .map((title) => `${room}: ${title}`));
    expect(silent).toEqual([]);
  });
});
