import { describe, expect, it } from "vitest";
import { denyLink, denySending, faultOfArrival, faultOfFile, faultOfProof, type AwaitedPhoto } from "@/lib/evidence/rules";
import { retrySeconds, wordsOfPhoto, wordsOfQueue, wordsOfSending, type Sending } from "@/lib/evidence/words";
import { aPicture } from "../../support/pictures";

describe("a chosen file", () => {
  it.each([
    ["good", { sniffed: "image/jpeg", sizeBytes: 26_214_400, pixels: 60_000_000 }, null],
    ["a byte too long", { sniffed: "image/jpeg", sizeBytes: 26_214_401, pixels: 1 }, /25 MB/],
    ["too many pixels", { sniffed: "image/png", sizeBytes: 1000, pixels: 60_000_001 }, /60 megapixels/],
    ["empty", { sniffed: null, sizeBytes: 0, pixels: null }, /empty/],
    ["of another type", { sniffed: null, sizeBytes: 10, pixels: null }, /not a JPEG, PNG or WebP/],
    ["HEIC", { sniffed: "image/heic", sizeBytes: 10, pixels: null }, /Most compatible/],
  ] as const)("%s", (_, file, words) => {
    const fault = faultOfFile(file);
    if (words === null) expect(fault).toBeNull();
    else expect(fault).toMatch(words);
  });
});

describe("a proof", () => {
  it("is a small JPEG that tells nothing", async () => {
    expect(faultOfProof(await aPicture({ width: 1600, height: 1200 }))).toBeNull();
    expect(faultOfProof(await aPicture({ width: 1601, height: 20 }))).toMatch(/larger/);
    expect(faultOfProof(await aPicture({ type: "png" }))).toMatch(/not a JPEG/);
    expect(faultOfProof(await aPicture({ tags: { IFD0: { Make: "Ardell" } } }))).toMatch(/place or camera/);
    expect(faultOfProof(Buffer.from("<!doctype html>"))).toMatch(/not a JPEG/);
  });
});

describe("photos as evidence", () => {
  const photo = { moveId: "m", companyId: "c", state: "proof", name: "a.jpg" } as const;
  const place = { moveId: "m", companyIds: ["c"], already: 0 };
  it.each([
    ["one whose proof is here", [photo], 1, place, null],
    ["one that is kept", [{ ...photo, state: "kept" }], 1, place, null],
    ["one that has not arrived", [{ ...photo, state: "registered" }], 1, place, /has not arrived/],
    ["one that was refused", [{ ...photo, state: "refused" }], 1, place, /was refused/],
    ["one of another move", [{ ...photo, moveId: "other" }], 1, place, /not one of your company’s/],
    ["one of another company", [{ ...photo, companyId: "other" }], 1, place, /not one of your company’s/],
    ["one that does not exist", [], 1, place, /not one of your company’s/],
    ["one more than fit", [photo], 1, { ...place, already: 20 }, /At most 20/],
  ] as const)("%s", (_, photos, wanted, given, words) => {
    const denial = denyLink(photos, wanted, given);
    if (words === null) expect(denial).toBeNull();
    else expect(denial?.fields?.photoIds?.join()).toMatch(words);
  });
});

describe("sending a file", () => {
  const photo: AwaitedPhoto = { takenBy: "u", state: "registered", type: "image/png", sizeBytes: 5000, proofKey: null, originalKey: null };
  const png = { type: "image/png", size: 5000 };
  const proof = { type: "image/jpeg", size: 900 };
  it.each([
    ["its proof", photo, "proof", "u", proof, null],
    ["its original", photo, "original", "u", png, null],
    ["the original before the proof", { ...photo, state: "registered" }, "original", "u", png, null],
    ["somebody else's", photo, "proof", "other", proof, "not_found"],
    ["a proof too large", photo, "proof", "u", { ...proof, size: 1_048_577 }, "bad_input"],
    ["a proof of another type", photo, "proof", "u", png, "bad_input"],
    ["an original of another size", photo, "original", "u", { ...png, size: 4999 }, "bad_input"],
    ["an original of another type", photo, "original", "u", { ...png, type: "image/jpeg" }, "bad_input"],
    ["a second proof", { ...photo, state: "proof", proofKey: "k" }, "proof", "u", proof, "not_yet"],
    ["a second original", { ...photo, state: "proof", originalKey: "k" }, "original", "u", png, "not_yet"],
    ["anything after it was kept", { ...photo, state: "kept" }, "proof", "u", proof, "not_yet"],
    ["anything after it was refused", { ...photo, state: "refused" }, "original", "u", png, "not_yet"],
  ] as const)("%s", (_, given, slot, userId, file, code) => {
    expect(denySending(given, slot, userId, file)?.code ?? null).toBe(code);
  });
});

it("an arrival is held against what was announced", async () => {
  const head = await aPicture();
  const announced = { sha256: "a", sizeBytes: head.length, type: "image/jpeg" } as const;
  expect(faultOfArrival(announced, { sha256: "a", sizeBytes: head.length, head })).toBeNull();
  expect(faultOfArrival(announced, { sha256: "b", sizeBytes: head.length, head })).toMatch(/SHA-256 differs/);
  expect(faultOfArrival(announced, { sha256: "a", sizeBytes: head.length + 1, head })).toMatch(/bytes/);
  expect(faultOfArrival({ ...announced, type: "image/png" }, { sha256: "a", sizeBytes: head.length, head })).toMatch(/another type/);
});

describe("words", () => {
  const sending: Sending = { step: "waiting", percent: 42, proofSent: false, fault: null };
  it.each([
    [{ ...sending, step: "preparing" }, "Getting ready"],
    [sending, "Waiting to be sent"],
    [{ ...sending, step: "proof" }, "Sending the proof, 42 %"],
    [{ ...sending, step: "original", proofSent: true }, "Proof sent, original 42 %"],
    [{ ...sending, proofSent: true }, "Proof sent, original waiting"],
    [{ ...sending, fault: "The connection broke off." }, "Waiting to be sent. The connection broke off. It is tried again by itself."],
    [{ ...sending, step: "stopped", proofSent: true, fault: "You are signed out." }, "Proof sent, original waiting. You are signed out."],
    [{ ...sending, step: "refused", fault: "The file is empty." }, "The file is empty."],
    [{ ...sending, step: "done", proofSent: true }, "Sent, proof and original"],
  ] as const)("%o", (given, words) => {
    expect(wordsOfSending(given)).toBe(words);
  });

  it("one line on all of them", () => {
    expect(wordsOfQueue([])).toBeNull();
    expect(wordsOfQueue([{ ...sending, step: "done" }])).toBeNull();
    expect(wordsOfQueue([sending, { ...sending, proofSent: true }, { ...sending, proofSent: true }])).toBe("1 photo is being sent; 2 originals are still to come. Leave this page open until it is done.");
  });

  it("where a photo stands", () => {
    expect(wordsOfPhoto({ state: "proof", refusedWhy: null })).toBe("Original pending");
    expect(wordsOfPhoto({ state: "refused", refusedWhy: "Its hash differs." })).toBe("Original refused. Its hash differs.");
    expect(wordsOfPhoto({ state: "kept", refusedWhy: null })).toBeNull();
  });

  it("tries less and less often, then leaves it to the person", () => {
    expect([1, 2, 3, 8, 9].map(retrySeconds)).toEqual([1, 2, 5, 60, null]);
  });
});
