import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { prepItems, signatures } from "@/db/schema";
import { finishItem, fillPrep, reopenItem, signPhase, skipItem } from "@/lib/prep/commands";
import { getPrep } from "@/lib/prep/queries";
import { getFacts } from "@/lib/standing/queries";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";

withDatabase();

const itemOf = async (moveId: string, templateId: string) => {
  const [item] = await db().select().from(prepItems).where(and(eq(prepItems.moveId, moveId), eq(prepItems.templateId, templateId)));
  if (!item) throw new Error(`no item ${templateId}`);
  return item;
};
const done = async (contractor: Viewer, moveId: string, templateId: string) => {
  const item = await itemOf(moveId, templateId);
  return finishItem(contractor, { moveId, itemId: item.id, version: item.version, value: null, tagNumber: null, note: null, photoIds: [] }, anAttempt());
};
const sign = async (contractor: Viewer, moveId: string) => {
  const { phases } = await getPrep(contractor, moveId);
  const phase = phases.find((one) => one.phase === "where-it-stands");
  return signPhase(contractor, { moveId, phase: "where-it-stands", name: "T. Ibarra", rowsHash: phase?.rowsHash ?? "" }, anAttempt());
};

it("an item is done, the phase signed, and an item opened again lifts the signature and says why", async () => {
  const { moveId, contractor } = await seedMove();
  await expect(sign(contractor, moveId)).rejects.toMatchObject({ code: "not_yet" });
  await done(contractor, moveId, "P1");
  await sign(contractor, moveId);
  expect((await getFacts(contractor, moveId)).standing).toEqual({ total: 1, left: 0, signed: true });
  const item = await itemOf(moveId, "P1");
  await reopenItem(contractor, { moveId, itemId: item.id, version: item.version, why: "Cap blew off" }, anAttempt());
  expect((await getFacts(contractor, moveId)).standing).toEqual({ total: 1, left: 1, signed: false });
  const phase = (await getPrep(contractor, moveId)).phases[0];
  expect(phase?.signature).toBeNull();
  expect(phase?.lifted?.why).toContain("Cap blew off");
});

it("the signature's hash is of exactly the rows that were shown; other rows are not signed", async () => {
  const { moveId, contractor } = await seedMove();
  const before = (await getPrep(contractor, moveId)).phases[0]?.rowsHash ?? "";
  await done(contractor, moveId, "P1");
  await expect(signPhase(contractor, { moveId, phase: "where-it-stands", name: "T. Ibarra", rowsHash: before }, anAttempt())).rejects.toMatchObject({ code: "stale" });
  const shown = (await getPrep(contractor, moveId)).phases[0]?.rowsHash;
  await sign(contractor, moveId);
  const [signature] = await db().select({ rowsHash: signatures.rowsHash }).from(signatures).where(eq(signatures.moveId, moveId));
  expect(signature?.rowsHash).toBe(shown);
});

it("two people finishing one item: the second is told, nothing is lost", async () => {
  const { moveId, contractor } = await seedMove();
  const item = await itemOf(moveId, "P1");
  const finish = (note: string) => finishItem(contractor, { moveId, itemId: item.id, version: item.version, value: null, tagNumber: null, note, photoIds: [] }, anAttempt());
  const outcomes = await Promise.allSettled([finish("first"), finish("second")]);
  expect(outcomes.filter((one) => one.status === "fulfilled")).toHaveLength(1);
  expect(outcomes.find((one) => one.status === "rejected")).toMatchObject({ reason: { code: "stale" } });
});

it("the second phase waits for the instruction and the release", async () => {
  const { moveId, contractor } = await seedMove();
  await expect(done(contractor, moveId, "A9")).rejects.toMatchObject({ code: "not_yet" });
});

it("what an item asks for as proof is asked for field by field", async () => {
  const { moveId, contractor } = await seedMove();
  const item = await itemOf(moveId, "P1");
  await db().update(prepItems).set({ needsPhoto: true, needsTag: true, valueLabel: "Gallons" }).where(eq(prepItems.id, item.id));
  await expect(done(contractor, moveId, "P1")).rejects.toMatchObject({ code: "bad_input", fields: { photoIds: [expect.any(String)], value: [expect.any(String)], tagNumber: [expect.any(String)] } });
});

it.each(["owner", "inspectorA", "deskA", "receiver", "payer"] as const)("%s can't work the list", async (part) => {
  const seeded = await seedMove();
  const item = await itemOf(seeded.moveId, "P1");
  await expect(skipItem(seeded[part], { moveId: seeded.moveId, itemId: item.id, version: item.version, why: "none fitted" }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
});

it("a payer and a billing clerk don't see it", async () => {
  const { moveId, payer, clerkA } = await seedMove();
  for (const viewer of [payer, clerkA]) await expect(getPrep(viewer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
});

it("a new move gets the whole checklist of its brake schedule", async () => {
  const { moveId } = await seedMove();
  await db().update(prepItems).set({ templateId: "X1" }).where(and(eq(prepItems.moveId, moveId), eq(prepItems.templateId, "P1")));
  await db().update(prepItems).set({ templateId: "X9" }).where(and(eq(prepItems.moveId, moveId), eq(prepItems.templateId, "A9")));
  await db().transaction((tx) => fillPrep(tx, moveId, { brakeSchedule: "26-L", bearings: "roller-rotating-cap", facts: {} }));
  const rows = await db().select({ id: prepItems.templateId }).from(prepItems).where(eq(prepItems.moveId, moveId));
  for (const id of ["S1", "P1", "E1", "A9", "A14", "R7a", "B8", "T5", "C1"]) expect(rows.map((row) => row.id)).toContain(id);
});
