import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { moveSeats, record } from "@/db/schema";
import { recordVisit } from "@/lib/inspections/commands";
import { recordVisitInput } from "@/lib/inspections/input";
import { listInspections } from "@/lib/inspections/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { aVisit, HEARD } from "../../support/inspecting";

withDatabase();

const unseat = (moveId: string, legId: string) => db().update(moveSeats).set({ removedAt: new Date() }).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.legId, legId), eq(moveSeats.part, "carrier")));

it("a visit is on record with its air, numbered on its leg, and seen by the next carrier", async () => {
  const { moveId, legIds, inspectorA, inspectorB } = await seedMove();
  await recordVisit(inspectorA, aVisit(moveId, legIds[0]), anAttempt());
  await recordVisit(inspectorA, aVisit(moveId, legIds[0], { air: "off", airSource: "", airPsi: "" }), anAttempt());
  const seen = await listInspections(inspectorB, moveId);
  expect(seen.legs[0]?.visits.map(({ number, air, airPsi, inspectorName }) => [number, air, airPsi, inspectorName])).toEqual([[1, "on", 90, "V. Sorrel"], [2, "off", null, "V. Sorrel"]]);
  expect(seen.legs.map(({ mayVisit }) => mayVisit)).toEqual([null, "self"]);
  const entries = await db().select({ kind: record.kind, detail: record.detail, part: record.byPart }).from(record).where(eq(record.moveId, moveId));
  expect(entries[0]).toMatchObject({ kind: "inspection.visited", part: "inspector", detail: { number: 1, carrierName: "Quillan & Sandbar", air: "on" } });
});

it("a day that has not come yet at the place is refused with its field", async () => {
  const { moveId, legIds, inspectorA } = await seedMove();
  const tomorrow = new Date(Date.now() + 48 * 3600_000).toISOString().slice(0, 10);
  await expect(recordVisit(inspectorA, { ...aVisit(moveId, legIds[0]), visitedOn: tomorrow, airSource: null }, anAttempt())).rejects.toMatchObject({ code: "bad_input", fields: { visitedOn: [expect.any(String)], airSource: [expect.any(String)] } });
  expect(recordVisitInput.safeParse({ ...aVisit(moveId, legIds[0]), airPsi: "a lot" }).error?.issues[0]?.path).toEqual(["airPsi"]);
});

it("is refused on another carrier's leg, to other parts, and to outsiders as if there were no move", async () => {
  const { moveId, legIds, inspectorB, clerkA, contractor, payer, outsider } = await seedMove();
  for (const viewer of [inspectorB, clerkA, contractor]) await expect(recordVisit(viewer, aVisit(moveId, legIds[0]), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await expect(recordVisit(outsider, aVisit(moveId, legIds[0]), anAttempt())).rejects.toMatchObject({ code: "not_found" });
  for (const viewer of [payer, clerkA]) await expect(listInspections(viewer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
  await expect(listInspections(outsider, moveId)).rejects.toMatchObject({ code: "not_found" });
});

it("is entered for a carrier only while nobody of it is seated, and says whom it came from", async () => {
  const { moveId, legIds, owner, contractor, receiver } = await seedMove();
  const entered = aVisit(moveId, legIds[0], { enteredFor: HEARD });
  await expect(recordVisit(contractor, entered, anAttempt())).rejects.toMatchObject({ code: "not_your_part", message: expect.stringContaining("on board") });
  await unseat(moveId, legIds[0]);
  for (const viewer of [contractor, owner]) await recordVisit(viewer, entered, anAttempt());
  await expect(recordVisit(receiver, entered, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  const [leg] = (await listInspections(owner, moveId)).legs;
  expect(leg).toMatchObject({ onBoard: false, mayVisit: "enter" });
  expect(leg?.visits[0]).toMatchObject({ enteredBy: "T. Ibarra", enteredFor: { ...HEARD, carrierName: "Quillan & Sandbar" } });
});
