import { describe, expect, it } from "vitest";
import { UploadQueue, type QueueParts } from "@/components/evidence/queue";
import type { Unsent } from "@/components/evidence/phone-store";
import type { Prepared } from "@/components/evidence/prepare";
import { PhotoFault, type SendOrder } from "@/components/evidence/send-order";
import { CallError } from "@/lib/entry/fetcher";
import type { Announced, PhotoView } from "@/lib/evidence/types";

const file = (name: string) => new File(["x"], name, { type: "image/jpeg" });

const prepared = (name: string): Prepared => ({ name, type: "image/jpeg", original: new Blob([name]), sizeBytes: name.length, sha256: `hash of ${name}`, proof: new Blob(["p"]), widthPx: 4, heightPx: 3 });

const settle = async () => {
  for (let n = 0; n < 50; n += 1) await new Promise((resolve) => setTimeout(resolve, 1));
};

/** A server that keeps what it is sent, and a line whose sends are ended by hand. */
function aLine(given: Partial<QueueParts> = {}) {
  const here = new Map<string, { proofHere: boolean; originalHere: boolean; refusedWhy: string | null }>();
  const sends: (SendOrder & { clientId: string; arrive: (reported?: boolean) => void; breakOff: (error?: Error) => void })[] = [];
  const kept = new Map<string, Unsent>();
  const parts: QueueParts = {
    prepare: async ({ name }) => prepared(name),
    announce: async ({ clientId, moveId, name }): Promise<Announced> => {
      const state = here.get(clientId) ?? { proofHere: false, originalHere: false, refusedWhy: null };
      here.set(clientId, state);
      const photo = { id: clientId, moveId, name, state: state.refusedWhy ? "refused" : state.proofHere ? "proof" : "registered", refusedWhy: state.refusedWhy } as PhotoView;
      return { ...state, photo };
    },
    sendFile: (order) =>
      new Promise((resolve, reject) => {
        const arrive = (reported = true) => {
          const state = here.get(order.photoId);
          if (state && reported) Object.assign(state, order.slot === "proof" ? { proofHere: true } : { originalHere: true });
          resolve(reported);
        };
        order.signal.addEventListener("abort", () => reject(new Error("aborted")));
        sends.push({ ...order, clientId: order.photoId, arrive, breakOff: (error = new Error("cut")) => reject(error) });
      }),
    store: {
      save: async (photo) => void kept.set(photo.clientId, structuredClone(photo)),
      list: async (userId) => [...kept.values()].filter((photo) => photo.userId === userId),
      drop: async (clientId) => void kept.delete(clientId),
    },
    now: () => Date.now(),
    alone: async (_, run) => run().then(() => true),
    ...given,
  };
  const queue = new UploadQueue(parts);
  const last = () => {
    const send = sends.at(-1);
    if (!send) throw new Error("Nothing was sent.");
    return send;
  };
  const steps = () => queue.snapshot().map(({ name, step }) => `${name} ${step}`);
  return { queue, here, sends, kept, last, steps, parts };
}

const order = (sends: { file: File; slot: string }[]) => sends.map(({ file: { name }, slot }) => `${name} ${slot}`);

describe("the order of sending", () => {
  it("every proof goes before any original", async () => {
    const { queue, sends, last, steps } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a"), file("b")]);
    await settle();
    expect(order(sends)).toEqual(["a proof"]);
    last().arrive();
    await settle();
    last().arrive();
    await settle();
    expect(order(sends)).toEqual(["a proof", "b proof", "a original"]);
    last().arrive();
    await settle();
    last().arrive();
    await settle();
    expect(steps()).toEqual(["a done", "b done"]);
  });

  it("an original in the middle makes way for a new proof, and goes on afterwards at the same address", async () => {
    const { queue, sends, last } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    last().arrive();
    await settle();
    last().onAddress({ answer: "[]", at: 5 });
    last().onPercent(42);
    expect(queue.snapshot()[0]).toMatchObject({ step: "original", percent: 42, proofSent: true });
    await queue.add("m", "f", [file("b")]);
    await settle();
    expect(order(sends)).toEqual(["a proof", "a original", "b proof"]);
    last().arrive();
    await settle();
    expect(order(sends).at(-1)).toBe("a original");
    expect(last().address).toEqual({ answer: "[]", at: 5 });
  });
});

describe("what goes wrong", () => {
  it("a line that breaks is tried again by itself, and a person need not wait", async () => {
    const { queue, sends, last } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    last().breakOff();
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ step: "waiting", fault: "The connection broke off." });
    queue.retry();
    await settle();
    expect(sends).toHaveLength(2);
    last().arrive();
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ step: "original", fault: null });
  });

  it("a report that never came: the server is asked, and the file is not sent twice when it is there", async () => {
    const { queue, here, sends, last } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    const state = here.get(last().clientId);
    if (state) state.proofHere = true;
    last().arrive(false);
    await settle();
    expect(order(sends)).toEqual(["a proof", "a original"]);
    expect(queue.snapshot()[0]).toMatchObject({ proofSent: true, photo: { state: "proof" } });
  });

  it("a refusal by the server is final and says why", async () => {
    const { queue, last, steps, kept } = aLine({ announce: async () => Promise.reject(new CallError({ title: "The move is closed; nothing on it changes any more." }, 409)) });
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    expect(steps()).toEqual(["a refused"]);
    expect(queue.snapshot()[0]?.fault).toMatch(/closed/);
    expect(kept.size).toBe(1);
    expect(last).toThrow();
  });

  it("signed out: it stops, keeps the photo, and goes on after signing in", async () => {
    let signedIn = false;
    const line = aLine();
    const { queue, kept, steps } = aLine({ announce: (given) => (signedIn ? line.parts.announce(given) : Promise.reject(new CallError({ title: "Sign in to continue." }, 401))) });
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    expect(steps()).toEqual(["a stopped"]);
    expect(kept.size).toBe(1);
    signedIn = true;
    queue.retry(queue.snapshot()[0]?.clientId);
    await settle();
    expect(steps()).toEqual(["a proof"]);
  });

  it("a picture that can't be taken says so and is not sent", async () => {
    const { queue, sends } = aLine({ prepare: async () => Promise.reject(new PhotoFault("The file is empty.")) });
    await queue.add("m", "f", [file("a")]);
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ step: "refused", fault: "The file is empty." });
    expect(sends).toEqual([]);
  });

  it("the same picture twice in one field is taken once, also when the field has it already", async () => {
    const { queue, steps } = aLine();
    await queue.add("m", "f", [file("a"), file("a"), file("b")], ["hash of b"]);
    await queue.add("m", "g", [file("a")]);
    expect(steps()).toEqual(["a proof", "a refused", "b refused", "a waiting"]);
    expect(queue.snapshot()[1]?.fault).toBe("This picture is here already.");
  });

  it("an original that the check refused is told in its words", async () => {
    const { queue, here, last } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    const state = here.get(last().clientId);
    if (state) state.refusedWhy = "The small picture is no JPEG.";
    last().arrive(false);
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ fault: "The small picture is no JPEG." });
  });
});

describe("what the phone keeps", () => {
  it("is taken up by the same person on the next page, by nobody else, and dropped once the server has it", async () => {
    const first = aLine();
    await first.queue.openFor("u");
    await first.queue.add("m", "f", [file("a"), file("b")]);
    await settle();
    expect(first.kept.size).toBe(2);
    const stranger = aLine({ store: first.parts.store });
    await stranger.queue.openFor("other");
    expect(stranger.queue.snapshot()).toEqual([]);
    const second = aLine({ store: first.parts.store });
    await second.queue.openFor("u");
    await settle();
    expect(second.steps()).toEqual(["a proof", "b waiting"]);
    for (let n = 0; n < 4; n += 1) {
      second.last().arrive();
      await settle();
    }
    expect(second.steps()).toEqual(["a done", "b done"]);
    expect(first.kept.size).toBe(0);
  });

  it("nothing when it is full: the photo is sent all the same, and the page says to stay open", async () => {
    const line = aLine();
    const { queue, sends } = aLine({ store: { ...line.parts.store, save: () => Promise.reject(new Error("full")), list: () => Promise.reject(new Error("private window")) } });
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    expect(queue.snapshot()[0]).toMatchObject({ onlyHere: true, step: "proof" });
    expect(sends).toHaveLength(1);
  });

  it("nothing of a photo that was cancelled; what is under way is cut off", async () => {
    const { queue, kept, last, sends } = aLine();
    await queue.openFor("u");
    await queue.add("m", "f", [file("a")]);
    await settle();
    queue.cancel(last().clientId);
    await settle();
    expect(last().signal.aborted).toBe(true);
    expect([queue.snapshot().length, kept.size, sends.length]).toEqual([0, 0, 1]);
  });
});

it("a form gets a photo once", async () => {
  const { queue, last } = aLine();
  await queue.add("m", "f", [file("a")]);
  await settle();
  last().arrive();
  await settle();
  const clientId = queue.snapshot()[0]?.clientId ?? "";
  expect([queue.handOver(clientId), queue.handOver(clientId)]).toEqual([true, false]);
});

it("another tab at the same photo is left alone", async () => {
  const { queue, sends } = aLine({ alone: async () => false });
  await queue.add("m", "f", [file("a")]);
  await settle();
  expect(queue.snapshot()[0]?.step).toBe("waiting");
  expect(sends).toEqual([]);
});
