import { randomUUID } from "node:crypto";
import { and, asc, eq } from "drizzle-orm";
import sharp from "sharp";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { outbox, photos, record } from "@/db/schema";
import { announcePhoto } from "@/lib/evidence/commands";
import { unsafeStoreFile, unsafeSweepPhotos } from "@/lib/evidence/commands/arrivals";
import { unsafeCheckPhoto } from "@/lib/evidence/commands/check";
import { getPhoto, getPhotoKey } from "@/lib/evidence/queries";
import { unsafeTakeNext } from "@/lib/outbox/commands";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { openFile } from "@/lib/uploads/files";
import { expectConsoleError } from "../../support/fail-on-console-error";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { aBomb, aHeic, anHtml, anSvg, aPicture } from "../../support/pictures";
import { announce, announcement, aProof, askAddress, fileOf, openYard, photoRow, sendSlot, sendTo } from "./yard";

const yard = await openYard();
withDatabase(yard.environment);

const later = (seconds: number) => new Date(Date.now() + seconds * 1000);
const kinds = async (moveId: string) => (await db().select({ kind: record.kind }).from(record).where(eq(record.moveId, moveId)).orderBy(asc(record.seq))).map(({ kind }) => kind);
const tasks = (moveId: string) => db().select({ id: outbox.id }).from(outbox).where(and(eq(outbox.kind, "check-photo"), eq(outbox.moveId, moveId)));

const tags = { IFD0: { Make: "Ardell", Model: "Ardell P4" }, IFD2: { DateTimeOriginal: "2026:11:24 14:05:33", OffsetTimeOriginal: "-06:00" }, IFD3: { GPSLatitudeRef: "N", GPSLatitude: "41/1 30/1 0/1", GPSLongitudeRef: "W", GPSLongitude: "96/1 15/1 0/1" } };

describe("a photo from a phone", () => {
  it("is usable with its proof, and kept once the original agrees", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await aPicture({ width: 3000, height: 2000, orientation: 6, tags });
    const photoId = await announce(contractor, moveId, original);
    expect(await getPhoto(contractor, moveId, photoId)).toMatchObject({ state: "registered", pending: true, originalUrl: null });
    expect((await sendSlot(yard, contractor, photoId, "proof", await aProof())).answer).toMatchObject({ serverData: { stored: true } });
    expect(await getPhoto(contractor, moveId, photoId)).toMatchObject({ state: "proof", pending: true, originalUrl: null });
    await sendSlot(yard, contractor, photoId, "original", original);
    const taken = await unsafeTakeNext(new Date());
    expect(taken?.job).toEqual({ kind: "check-photo", payload: { photoId } });
    await unsafeCheckPhoto(photoId, new Date());
    await unsafeCheckPhoto(photoId, new Date());
    expect(await getPhoto(contractor, moveId, photoId)).toMatchObject({
      state: "kept", pending: false, widthPx: 2000, heightPx: 3000, capturedAt: "2026-11-24T20:05:33.000Z", camera: "Ardell P4", place: { latitude: 41.5, longitude: -96.25 }, takenBy: "T. Ibarra",
    });
    expect(await kinds(moveId)).toEqual(["photo.taken", "photo.kept"]);
    expect((await unsafeVerifyRecord(moveId)).brokenAt).toBeNull();
  });

  it("is read through a short-lived address: the preview without metadata, the original byte for byte and as a download", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await aPicture({ width: 2500, height: 2000, tags, seed: 3 });
    const photoId = await announce(contractor, moveId, original);
    await sendSlot(yard, contractor, photoId, "proof", await aProof());
    const { key } = await sendSlot(yard, contractor, photoId, "original", original);
    await unsafeCheckPhoto(photoId, new Date());
    const read = async (size: "preview" | "original") => {
      const sent = await openFile(await getPhotoKey(contractor, moveId, photoId, size));
      expect([sent.status, sent.headers.get("cache-control")]).toEqual([302, "private, no-store"]);
      const address = new URL(sent.headers.get("location") ?? "");
      expect(Number(address.searchParams.get("expires"))).toBeLessThanOrEqual(Date.now() + 60_000);
      return fetch(address);
    };
    const preview = Buffer.from(await (await read("preview")).arrayBuffer());
    expect(await sharp(preview).metadata()).toMatchObject({ format: "jpeg", width: 2048 });
    expect((await sharp(preview).metadata()).exif).toBeUndefined();
    const back = await read("original");
    expect(back.headers.get("content-disposition")).toMatch(/^attachment; filename\*=UTF-8''99-\w+-\w{8}\.jpg$/);
    expect(Buffer.from(await back.arrayBuffer()).equals(original)).toBe(true);
    expect((await fetch(`${yard.serviceUrl}/a/testapp/${key}`)).status).toBe(403);
  });

  it("announced twenty times at once is one photo", async () => {
    const { moveId, contractor } = await seedMove();
    const given = announcement(moveId, await aPicture({ seed: 4 }));
    const answers = await Promise.all(Array.from({ length: 20 }, () => announcePhoto(contractor, given, anAttempt())));
    expect(new Set(answers.map(({ photo }) => photo.id)).size).toBe(1);
    expect(await kinds(moveId)).toEqual(["photo.taken"]);
  });

  it("cut in the middle goes on where it stopped", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await sharp(Buffer.from(Array.from({ length: 600 * 600 * 3 }, (_, at) => (at * 7919) & 255)), { raw: { width: 600, height: 600, channels: 3 } }).jpeg({ quality: 95 }).toBuffer().then((bytes) => Buffer.from(bytes));
    const photoId = await announce(contractor, moveId, original);
    const file = fileOf(original);
    const [place] = (await (await askAddress(yard, contractor, photoId, "original", file)).json()) as [{ url: string }];
    await yard.fault({ kind: "cut-mid-file", times: 1 });
    await expect(sendTo(place.url, file)).rejects.toThrow();
    const there = Number((await fetch(place.url, { method: "HEAD" })).headers.get("x-ut-range-start"));
    expect(there).toBeGreaterThan(original.length / 3);
    expect(there).toBeLessThan(original.length);
    expect((await sendTo(place.url, file)).status).toBe(200);
    await unsafeCheckPhoto(photoId, new Date());
    expect((await photoRow(photoId)).state).toBe("kept");
  });
});

describe("reports of the file service", () => {
  it("twice change nothing the second time", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await aPicture({ seed: 5 });
    const photoId = await announce(contractor, moveId, original);
    await yard.fault({ kind: "callback-twice", times: 1 });
    await sendSlot(yard, contractor, photoId, "proof", await aProof());
    await yard.fault({ kind: "callback-twice", times: 1 });
    await sendSlot(yard, contractor, photoId, "original", original);
    expect(await tasks(moveId)).toHaveLength(1);
    const before = await photoRow(photoId);
    await unsafeCheckPhoto(photoId, new Date());
    expect(await unsafeStoreFile(photoId, "original", { key: before.originalKey ?? "" }, new Date())).toEqual({ stored: true });
    expect(await photoRow(photoId)).toMatchObject({ state: "kept", originalKey: before.originalKey, proofKey: before.proofKey });
    expect(await kinds(moveId)).toEqual(["photo.taken", "photo.kept"]);
  });

  it("that never came are made up for by the worker's round", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await aPicture({ seed: 6 });
    const photoId = await announce(contractor, moveId, original);
    await yard.fault({ kind: "callback-never", times: 2 });
    expect((await sendSlot(yard, contractor, photoId, "proof", await aProof())).answer).toMatchObject({ serverData: null });
    await sendSlot(yard, contractor, photoId, "original", original);
    await unsafeSweepPhotos(later(30));
    expect((await photoRow(photoId)).state).toBe("registered");
    await unsafeSweepPhotos(later(61));
    expect(await photoRow(photoId)).toMatchObject({ state: "proof", originalKey: expect.any(String) });
    expect(await tasks(moveId)).toHaveLength(1);
  });

  it("that never came are made up for at once when the phone asks again", async () => {
    const { moveId, contractor } = await seedMove();
    const given = announcement(moveId, await aPicture({ seed: 7 }));
    const { photo, proofHere } = await announcePhoto(contractor, given, anAttempt());
    expect(proofHere).toBe(false);
    await yard.fault({ kind: "callback-never", times: 1 });
    await sendSlot(yard, contractor, photo.id, "proof", await aProof());
    expect(await announcePhoto(contractor, given, anAttempt())).toMatchObject({ proofHere: true, originalHere: false, photo: { state: "proof" } });
  });

  it("of a second file for the same place delete that file", async () => {
    const { moveId, contractor } = await seedMove();
    const original = await aPicture({ seed: 8 });
    const [one, two] = [await announce(contractor, moveId, original), await announce(contractor, moveId, await aPicture({ seed: 18 }))];
    const first = await sendSlot(yard, contractor, one, "proof", await aProof());
    const second = await sendSlot(yard, contractor, two, "proof", await aProof());
    expect(await unsafeStoreFile(one, "proof", { key: second.key }, new Date())).toEqual({ stored: false });
    expect((await photoRow(one)).proofKey).toBe(first.key);
    expect((await fetch(`${yard.serviceUrl}/f/${second.key}`)).status).toBe(404);
  });

  it("under another's signature are not believed", async () => {
    const { moveId, contractor } = await seedMove();
    const photoId = await announce(contractor, moveId, await aPicture({ seed: 10 }));
    const body = JSON.stringify({ status: "uploaded", origin: yard.serviceUrl, metadata: { photoId }, file: { key: "k", name: "x.jpg", size: 1, type: "image/jpeg", customId: null, url: "u", appUrl: "u", ufsUrl: "u", fileHash: "h" } });
    const answer = await fetch(`${yard.url}?slug=proof`, { method: "POST", headers: { "content-type": "application/json", "uploadthing-hook": "callback", "x-uploadthing-signature": `hmac-sha256=${"0".repeat(64)}` }, body });
    expect(answer.status).toBe(400);
    expect((await photoRow(photoId)).proofKey).toBeNull();
  });

  it("that the server could not note are printed, and made up for later", async () => {
    const { moveId, contractor } = await seedMove();
    const photoId = await announce(contractor, moveId, await aPicture({ seed: 11 }));
    yard.failNextReport();
    expectConsoleError(/upload not noted/);
    expect((await sendSlot(yard, contractor, photoId, "proof", await aProof())).answer).toMatchObject({ error: expect.any(String) });
    expect((await photoRow(photoId)).state).toBe("registered");
    await unsafeSweepPhotos(later(61));
    expect((await photoRow(photoId)).state).toBe("proof");
  });
});

describe("what is refused", () => {
  it.each([
    ["other bytes than announced", async () => [await aPicture({ seed: 12 }), "0".repeat(64)] as const, /SHA-256 differs/],
    ["a picture of 256 megapixels", async () => [aBomb(16_000, 16_000), null] as const, /60 megapixels/],
    ["an SVG named .jpg", async () => [anSvg(), null] as const, /not a JPEG/],
    ["HTML named .jpg", async () => [anHtml(), null] as const, /not a JPEG/],
    ["HEIC named .jpg", async () => [aHeic(), null] as const, /Most compatible/],
    ["half a picture", async () => [(await aPicture({ width: 2000, height: 1500 })).subarray(0, 9000), null] as const, /can’t be opened/],
  ])("%s: the file goes, the hash and the words stay", async (_, make, words) => {
    const { moveId, contractor } = await seedMove();
    const [bytes, sha256] = await make();
    const type = bytes[0] === 0x89 ? "image/png" : "image/jpeg";
    const given = { ...announcement(moveId, bytes, { type, ...(sha256 && { sha256 }) }), widthPx: 600, heightPx: 400 };
    const { photo } = await announcePhoto(contractor, given, anAttempt());
    await sendSlot(yard, contractor, photo.id, "proof", await aProof());
    const { key } = await sendSlot(yard, contractor, photo.id, "original", bytes, type);
    await unsafeCheckPhoto(photo.id, new Date());
    const row = await photoRow(photo.id);
    expect(row).toMatchObject({ state: "refused", originalKey: null, sha256: given.sha256 });
    expect(row.refusedWhy).toMatch(words);
    expect((await fetch(`${yard.serviceUrl}/f/${key}`)).status).toBe(404);
    expect(await kinds(moveId)).toEqual(["photo.taken", "photo.refused"]);
  });

  it("its file goes on the next try when the file service was away", async () => {
    const { moveId, contractor } = await seedMove();
    const bytes = await aPicture({ seed: 15 });
    const photoId = await announce(contractor, moveId, bytes, { sha256: "1".repeat(64) });
    const { key } = await sendSlot(yard, contractor, photoId, "original", bytes);
    await db().update(photos).set({ state: "refused", refusedWhy: "Its SHA-256 differs.", originalKey: null }).where(eq(photos.id, photoId));
    await unsafeCheckPhoto(photoId, new Date());
    expect((await fetch(`${yard.serviceUrl}/f/${key}`)).status).toBe(404);
  });

  it("a proof that is none", async () => {
    const { moveId, contractor } = await seedMove();
    const photoId = await announce(contractor, moveId, await aPicture({ seed: 13 }));
    expect((await sendSlot(yard, contractor, photoId, "proof", anHtml())).answer).toMatchObject({ serverData: { stored: false } });
    expect(await photoRow(photoId)).toMatchObject({ state: "refused", proofKey: null });
  });

  it("an address for somebody else's photo, for another file, or for a photo that nobody announced", async () => {
    const { moveId, contractor, owner } = await seedMove();
    const original = await aPicture({ seed: 14 });
    const photoId = await announce(contractor, moveId, original);
    const status = async (...given: Parameters<typeof askAddress> extends [unknown, ...infer R] ? R : never) => (await askAddress(yard, ...given)).status;
    expect(await status(owner, photoId, "original", fileOf(original))).toBe(404);
    expect(await status(contractor, photoId, "original", fileOf(original.subarray(1)))).toBe(400);
    expect(await status(contractor, photoId, "original", fileOf(original, "image/png"))).toBe(400);
    expect(await status(contractor, `pho_${"0".repeat(28)}`, "proof", fileOf(await aProof()))).toBe(404);
    expect(await status(contractor, randomUUID(), "proof", fileOf(await aProof()))).toBe(400);
    expect(await status(contractor, photoId, "original", fileOf(original))).toBe(200);
  });
});
