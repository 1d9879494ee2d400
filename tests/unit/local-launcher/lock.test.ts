import { spawn } from "node:child_process";
import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { takeLock } from "@/lib/local/lock";
import { beganAt, isAlive } from "@/lib/local/processes";

let folder: string;
const mark = () => join(folder, "running.json");

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "towfolio-lock-"));
});

afterEach(() => rmSync(folder, { recursive: true }));

describe("the mark of a running copy", () => {
  it("keeps a second start out, and is gone afterwards", async () => {
    const lock = await takeLock(folder);
    expect(lock.clearedUp).toBeNull();
    await expect(takeLock(folder)).rejects.toThrow(`already running (process ${process.pid})`);
    lock.release();
    expect(existsSync(mark())).toBe(false);
  });

  it("of a process that is gone, or whose number was given to another, is cleared up", async () => {
    writeFileSync(mark(), JSON.stringify({ launcher: { pid: process.pid, began: 1 }, programs: [] }));
    const lock = await takeLock(folder);
    expect(lock.clearedUp).toContain("was killed before it could stop in order");
    lock.release();
  });

  it("that is half written is cleared up", async () => {
    writeFileSync(mark(), "{");
    expect((await takeLock(folder)).clearedUp).toContain("half written");
  });

  it("stops what a killed copy left running, and no stranger with the same number", async () => {
    const left = spawn("sleep", ["60"], { detached: true });
    const stranger = spawn("sleep", ["60"], { detached: true });
    const [pid = 0, other = 0] = [left.pid, stranger.pid];
    const programs = [{ pid, began: beganAt(pid) }, { pid: other, began: 1 }];
    writeFileSync(mark(), JSON.stringify({ launcher: { pid: 999_999_999, began: 1 }, programs }));
    expect((await takeLock(folder)).clearedUp).toContain("(1 program)");
    expect(isAlive(other)).toBe(true);
    stranger.kill();
  });
});
