import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { DraftSaver, type SaverCalls } from "@/components/moves/draft-saver";
import { CallError } from "@/lib/entry/fetcher";
import { emptyDraft, type DraftForm } from "@/lib/moves/draft";

const form = (note: string): DraftForm => ({ ...emptyDraft("com_1"), note });
const AT = "2026-11-24T14:02:00.000Z";

function aSaver(kept: { version: number } | null = null) {
  const calls = {
    begin: vi.fn<SaverCalls["begin"]>(async () => ({ draftId: "drf_1", version: 1, updatedAt: AT })),
    save: vi.fn<SaverCalls["save"]>(async (_id, _company, _form, version) => ({ draftId: "drf_1", version: version + 1, updatedAt: AT })),
    read: vi.fn<SaverCalls["read"]>(async () => ({ draftId: "drf_1", companyId: "com_1", version: 9, updatedAt: AT, body: { ...form("theirs") } })),
    began: vi.fn<SaverCalls["began"]>(),
  };
  return { calls, saver: new DraftSaver(form(""), kept && { draftId: "drf_1", updatedAt: AT, ...kept }, calls) };
}

describe("keeping a draft", () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it("waits for a pause in typing, then begins once and saves on from there", async () => {
    const { calls, saver } = aSaver();
    saver.change(form("a"));
    saver.change(form("ab"));
    expect(saver.getStatus().kind).toBe("unsent");
    await vi.advanceTimersByTimeAsync(800);
    expect(calls.begin).toHaveBeenCalledTimes(1);
    expect(calls.began).toHaveBeenCalledWith("drf_1");
    expect(saver.getStatus()).toEqual({ kind: "saved", at: AT });
    saver.change(form("abc"));
    await vi.advanceTimersByTimeAsync(800);
    expect(calls.save).toHaveBeenLastCalledWith("drf_1", "com_1", form("abc"), 1);
    saver.change(form("abcd"));
    await saver.flush();
    expect(calls.save).toHaveBeenLastCalledWith("drf_1", "com_1", form("abcd"), 2);
  });

  it("keeps what was typed while a call was under way", async () => {
    const { calls, saver } = aSaver({ version: 3 });
    let done: (saved: { draftId: string; version: number; updatedAt: string }) => void = () => undefined;
    calls.save.mockImplementationOnce(() => new Promise((resolve) => (done = resolve)));
    saver.change(form("a"));
    await vi.advanceTimersByTimeAsync(800);
    saver.change(form("ab"));
    done({ draftId: "drf_1", version: 4, updatedAt: AT });
    await vi.advanceTimersByTimeAsync(801);
    expect(calls.save).toHaveBeenLastCalledWith("drf_1", "com_1", form("ab"), 4);
  });

  it("tries again by itself when the connection was lost, with the same key", async () => {
    const { calls, saver } = aSaver();
    calls.begin.mockRejectedValueOnce(new CallError({ title: "No connection." }, 0));
    saver.change(form("a"));
    await vi.advanceTimersByTimeAsync(800);
    expect(saver.getStatus()).toEqual({ kind: "failed", message: "No connection.", again: true });
    await vi.advanceTimersByTimeAsync(5_000);
    expect(saver.getStatus().kind).toBe("saved");
    const keys = calls.begin.mock.calls.map(([, , key]) => key);
    expect([keys.length, new Set(keys).size]).toEqual([2, 1]);
    expect(calls.began).toHaveBeenCalledTimes(1);
  });

  it("shows both versions when somebody else saved, and overwrites only when told to", async () => {
    const { calls, saver } = aSaver({ version: 1 });
    calls.save.mockRejectedValueOnce(new CallError({ title: "stale" }, 409));
    saver.change(form("mine"));
    await vi.advanceTimersByTimeAsync(800);
    expect(saver.getStatus()).toMatchObject({ kind: "conflict", theirs: { note: "theirs" } });
    saver.change(form("mine still"));
    await vi.advanceTimersByTimeAsync(10_000);
    expect(calls.save).toHaveBeenCalledTimes(1);
    saver.settle(form("mine still"));
    await vi.advanceTimersByTimeAsync(1);
    expect(calls.save).toHaveBeenLastCalledWith("drf_1", "com_1", form("mine still"), 9);
    expect(saver.getStatus().kind).toBe("saved");
  });

  it("keeps everything on the page when the draft is gone, and begins another when told to", async () => {
    const { calls, saver } = aSaver({ version: 1 });
    calls.save.mockRejectedValueOnce(new CallError({ title: "No such draft." }, 404));
    saver.change(form("mine"));
    await vi.advanceTimersByTimeAsync(800);
    expect(saver.getStatus().kind).toBe("gone");
    saver.keepAnew();
    await vi.advanceTimersByTimeAsync(1);
    expect(calls.begin).toHaveBeenCalledTimes(1);
    expect(saver.getStatus().kind).toBe("saved");
  });

  it("keeps nothing any more once the move is opened", async () => {
    const { calls, saver } = aSaver({ version: 1 });
    saver.stop();
    saver.change(form("late"));
    await vi.advanceTimersByTimeAsync(10_000);
    expect(calls.save).not.toHaveBeenCalled();
  });
});
