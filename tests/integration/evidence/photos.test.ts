import { and, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { moves, photos, photoUses } from "@/db/schema";
import { announcePhoto, linkPhotos } from "@/lib/evidence/commands";
import { unsafeStoreFile } from "@/lib/evidence/commands/arrivals";
import { unsafeKeepPhoto } from "@/lib/evidence/commands/verdicts";
import { getPhoto, getPhotoKey, listPhotos, unsafePhotosOf } from "@/lib/evidence/queries";
import type { PhotoState } from "@/lib/evidence/vocabulary";
import { newId } from "@/lib/ids";
import { writeOnMove } from "@/lib/standing/commands";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove, type SeededMove } from "../../support/factories";
import { aPicture } from "../../support/pictures";
import { announce, announcement } from "./yard";

withDatabase();

let seed = 0;

/** An announced photo, put into a state as if its files had come. */
async function aPhoto(viewer: Viewer, moveId: string, state: PhotoState = "proof"): Promise<string> {
  const id = await announce(viewer, moveId, await aPicture({ seed: (seed += 1), width: 20, height: 20 }));
  await db().update(photos).set({ state, ...(state !== "registered" && { proofKey: `proof-${id}` }), ...(state === "kept" && { originalKey: `original-${id}` }) }).where(eq(photos.id, id));
  return id;
}

const looks = (viewer: Viewer, moveId: string, photoId: string): (() => Promise<unknown>)[] => [
  () => listPhotos(viewer, moveId),
  () => getPhoto(viewer, moveId, photoId),
  () => getPhotoKey(viewer, moveId, photoId, "preview"),
  () => getPhotoKey(viewer, moveId, photoId, "original"),
];

const link = (viewer: Viewer, moveId: string, ids: string[], subjectId = newId("finding")) => writeOnMove(viewer, anAttempt(), moveId, (ctx) => linkPhotos(ctx, ids, "finding", subjectId));

describe("who may take and see photos", () => {
  const may: [keyof SeededMove, boolean, boolean][] = [
    ["owner", true, true], ["contractor", true, true], ["receiver", true, true], ["inspectorA", true, true], ["deskA", true, true], ["inspectorB", true, true],
    ["clerkA", false, false], ["payer", false, false],
  ];

  it("by their part on the move", async () => {
    const seeded = await seedMove();
    const { moveId } = seeded;
    const photoId = await aPhoto(seeded.contractor, moveId, "kept");
    for (const [name, takes, sees] of may) {
      const viewer = seeded[name] as Viewer;
      const taking = announcePhoto(viewer, announcement(moveId, await aPicture({ seed: (seed += 1) })), anAttempt());
      if (takes) await expect(taking, name).resolves.toMatchObject({ proofHere: false });
      else await expect(taking, name).rejects.toMatchObject({ code: "not_your_part" });
      for (const see of looks(viewer, moveId, photoId)) {
        if (sees) await expect(see(), name).resolves.toBeTruthy();
        else await expect(see(), name).rejects.toMatchObject({ code: "not_your_part" });
      }
    }
  });

  it("outsiders and removed people learn nothing, nor does a photo's id open another move", async () => {
    const [one, two] = [await seedMove(), await seedMove()];
    const photoId = await aPhoto(one.contractor, one.moveId, "kept");
    for (const viewer of [one.outsider, one.removed, two.contractor]) {
      await expect(announcePhoto(viewer, announcement(one.moveId, await aPicture()), anAttempt())).rejects.toMatchObject({ code: "not_found" });
      for (const see of looks(viewer, one.moveId, photoId)) await expect(see()).rejects.toMatchObject({ code: "not_found" });
    }
    await expect(getPhotoKey(two.contractor, two.moveId, photoId, "original")).rejects.toMatchObject({ code: "not_found" });
  });

  it("the original's door stays shut until it was checked; the proof stands in for the preview", async () => {
    const { moveId, contractor } = await seedMove();
    const photoId = await aPhoto(contractor, moveId);
    await db().update(photos).set({ originalKey: `original-${photoId}` }).where(eq(photos.id, photoId));
    await expect(getPhotoKey(contractor, moveId, photoId, "original")).rejects.toMatchObject({ code: "not_found" });
    expect(await getPhotoKey(contractor, moveId, photoId, "preview")).toBe(`proof-${photoId}`);
    await unsafeKeepPhoto(photoId, { widthPx: 20, heightPx: 20, capturedAt: null, camera: null, latitude: null, longitude: null, previewKey: "preview-1", capturedFrom: null }, new Date());
    expect(await getPhotoKey(contractor, moveId, photoId, "preview")).toBe("preview-1");
    expect(await getPhotoKey(contractor, moveId, photoId, "original")).toBe(`original-${photoId}`);
  });

  it("somebody else's announcement is not told to the second", async () => {
    const { moveId, contractor, owner } = await seedMove();
    const given = announcement(moveId, await aPicture());
    await announcePhoto(contractor, given, anAttempt());
    await expect(announcePhoto(owner, given, anAttempt())).rejects.toMatchObject({ code: "bad_input" });
    await expect(announcePhoto(contractor, { ...given, sha256: "0".repeat(64) }, anAttempt())).rejects.toMatchObject({ code: "bad_input" });
  });

  it("on a closed move none is announced any more, but what was announced before still arrives", async () => {
    const { moveId, contractor } = await seedMove();
    const given = announcement(moveId, await aPicture({ seed: (seed += 1) }));
    const { photo } = await announcePhoto(contractor, given, anAttempt());
    await db().update(moves).set({ state: "closed" }).where(eq(moves.id, moveId));
    await expect(announcePhoto(contractor, announcement(moveId, await aPicture()), anAttempt())).rejects.toMatchObject({ code: "not_yet" });
    expect(await unsafeStoreFile(photo.id, "original", { key: "late" }, new Date())).toEqual({ stored: true });
    await unsafeKeepPhoto(photo.id, { widthPx: 1, heightPx: 1, capturedAt: null, camera: null, latitude: null, longitude: null, previewKey: "p", capturedFrom: null }, new Date());
    expect((await getPhoto(contractor, moveId, photo.id)).state).toBe("kept");
  });

  it("a move holds no more photos than it may", async () => {
    const { moveId, contractor } = await seedMove();
    const companyId = contractor.memberships[0]?.companyId ?? "";
    const rows = Array.from({ length: 499 }, () => ({ ...announcement(moveId, Buffer.from("x")), id: newId("photo"), takenBy: contractor.userId, companyId, createdAt: new Date() }));
    await db().insert(photos).values(rows);
    const tries = await Promise.allSettled([1, 2, 3].map(async (n) => announce(contractor, moveId, await aPicture({ seed: n, width: 33 }))));
    expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  });
});

describe("photos as evidence", () => {
  it("belong to what the command wrote, once, and are found again there", async () => {
    const { moveId, contractor } = await seedMove();
    const [one, two] = [await aPhoto(contractor, moveId), await aPhoto(contractor, moveId, "kept")];
    const [subjectId, other] = [newId("finding"), newId("finding")];
    await link(contractor, moveId, [one, two, one], subjectId);
    await link(contractor, moveId, [two], subjectId);
    const found = await unsafePhotosOf(db(), "finding", [subjectId, other]);
    expect(found.get(subjectId)?.map(({ id, pending, state }) => [id, pending, state])).toEqual([[one, true, "proof"], [two, false, "kept"]]);
    expect(found.get(other)).toEqual([]);
    expect((await unsafePhotosOf(db(), "prep", [subjectId])).get(subjectId)).toEqual([]);
    expect((await listPhotos(contractor, moveId)).map(({ used, mine }) => [used, mine])).toEqual([[true, true], [true, true]]);
  });

  it.each([
    ["one that has not arrived", async ({ contractor, moveId }: SeededMove) => aPhoto(contractor, moveId, "registered")],
    ["one that was refused", async ({ contractor, moveId }: SeededMove) => aPhoto(contractor, moveId, "refused")],
    ["another company's", async ({ owner, moveId }: SeededMove) => aPhoto(owner, moveId)],
    ["one of another move", async () => aPhoto((await other()).contractor, (await other()).moveId)],
    ["one that does not exist", async () => newId("photo")],
  ])("%s is refused, and nothing is written", async (_, make) => {
    const seeded = await seedMove();
    const good = await aPhoto(seeded.contractor, seeded.moveId);
    await expect(link(seeded.contractor, seeded.moveId, [good, await make(seeded)])).rejects.toMatchObject({ code: "bad_input", fields: { photoIds: [expect.any(String)] } });
    expect(await db().select().from(photoUses).where(and(eq(photoUses.moveId, seeded.moveId)))).toEqual([]);
  });

  it("no more than twenty of one thing, also one by one", async () => {
    const { moveId, contractor } = await seedMove();
    const ids: string[] = [];
    for (let n = 0; n < 21; n += 1) ids.push(await aPhoto(contractor, moveId));
    const subjectId = newId("finding");
    await link(contractor, moveId, ids.slice(0, 20), subjectId);
    await expect(link(contractor, moveId, ids.slice(20), subjectId)).rejects.toMatchObject({ fields: { photoIds: [expect.stringMatching(/At most 20/)] } });
  });
});

let known: SeededMove | undefined;
const other = async () => (known ??= await seedMove());
