import { asc, eq } from "drizzle-orm";
import { prepItems } from "@/db/schema";
import { clearBilling } from "@/lib/fees/commands/quotes";
import { closeMove, recordArrival } from "@/lib/movement/commands";
import { keepItem, restoreItem } from "@/lib/prep/commands";
import { recordVisit } from "@/lib/inspections/commands";
import { postFinding } from "@/lib/findings/commands";
import { accept, openCase, prepare, seat, signPrep, who, type DemoStage } from "./case";
import { takePhoto } from "./photos";
import { batterySwitch, chain, couplerGap, overview, stackCap } from "./pictures";
import { CAB_UNIT, PLANT_UNIT, SWITCHER } from "./scenes";
import { answer, instruct, release, sight, visit } from "./steps";

const CENTRAL = "America/Chicago";
const NOTES = { any: { photo: overview("unit-side.jpg", "The unit from the left") }, P1: { photo: stackCap("stack.jpg", "Stack capped") }, E1: { tag: "0301", photo: batterySwitch("switch.jpg", "Battery switch open, tag 0301", "0301") } };

/** A case that is over: one carrier, credit agreed, placed, put back, closed. */
export async function closedCase(stage: DemoStage): Promise<void> {
  const { clock } = stage;
  const { moveId, legIds } = await openCase(stage, {
    answers: CAB_UNIT, origin: { name: "Marrow Pit engine house", place: "Marrow Pit", zone: CENTRAL }, destination: { name: "Tolland Short Line shop", place: "Tolland", zone: CENTRAL },
    legs: [{ carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", toPlace: "Tolland", toZone: CENTRAL, miles: "96", payer: "ours" }],
  }, clock.at(140));
  const [leg = ""] = legIds;
  await seat(stage, moveId, "contractor", "contractor", null, clock.at(138));
  await seat(stage, moveId, "clerk", "carrier", leg, clock.at(137));
  await seat(stage, moveId, "receiver", "receiver", null, clock.at(136));
  await prepare(stage, moveId, "where-it-stands", NOTES, clock.at(125));
  await signPrep(stage, moveId, "where-it-stands", clock.at(125, 20));
  await visit(stage, { key: "inspector", moveId, legId: leg, place: "Marrow Pit", zone: CENTRAL, daysAgo: 118, air: "on", airSource: "the yard plant", airPsi: 90 }, clock.at(118));
  await accept(stage, "inspector", moveId, leg, { number: "QS-2105", restrictions: ["mph-25", "rear"] }, clock.at(118, 18));
  await clearBilling(who(stage, "clerk"), { moveId, legId: leg, note: "Credit account 20417", enteredFor: null }, clock.attempt(clock.at(112)));
  await instruct(stage, "desk", moveId, leg, "QS 118-39002", clock.at(110));
  await release(stage, moveId, clock.at(109));
  await prepare(stage, moveId, "when-coupled", { any: { photo: chain("slack.jpg", "Chain slack") } }, clock.at(106, 13));
  await signPrep(stage, moveId, "when-coupled", clock.at(106, 14));
  for (const [kind, daysAgo, place] of [["pulled", 106, "Marrow Pit"], ["departed", 105, "Marrow Pit yard"], ["at-destination", 103, "Tolland yard"], ["placed", 101, "Tolland"]] as const) {
    await sight(stage, "desk", { moveId, legId: leg, kind, place, zone: CENTRAL }, clock.at(daysAgo, 16));
  }
  await arriveAndClose(stage, moveId);
}

async function arriveAndClose(stage: DemoStage, moveId: string): Promise<void> {
  const { clock, db } = stage;
  const receiver = who(stage, "receiver");
  const photo = await takePhoto(clock, receiver, moveId, overview("arrival-left.jpg", "On arrival, from the left"), clock.at(99));
  await recordArrival(receiver, { moveId, arrivedOn: clock.day(99), condition: "As on the departure photos; caps and plywood in place.", missing: null, name: receiver.name, photoIds: [photo] }, clock.attempt(clock.at(99)));
  const twins = await db.select().from(prepItems).where(eq(prepItems.moveId, moveId)).orderBy(asc(prepItems.restoreOrder));
  for (const item of twins.filter((row) => row.restoreState === "to-restore")) {
    if (item.templateId === "E9") await keepItem(receiver, { moveId, itemId: item.id, version: item.version, why: "Radios stay out; the unit goes on display." }, clock.attempt(clock.at(90)));
    else await restoreItem(who(stage, "contractor"), { moveId, itemId: item.id, version: item.version, note: null, photoIds: [] }, clock.attempt(clock.at(90)));
  }
  await closeMove(receiver, { moveId, name: receiver.name }, clock.attempt(clock.at(88)));
}

/** A switcher whose carrier is not on board: its steps are entered for it from paper and phone. */
export async function absentCarrierCase(stage: DemoStage): Promise<void> {
  const { clock } = stage;
  const { moveId, legIds } = await openCase(stage, {
    answers: SWITCHER, origin: { name: "Perrin Dock", place: "Perrin", zone: CENTRAL }, destination: { name: "Alder Gap museum siding", place: "Alder Gap", zone: CENTRAL },
    legs: [{ carrierName: "Perrin Dock Terminal", carrierMark: "ZPDT", toPlace: "Alder Gap", toZone: CENTRAL, miles: "41", payer: "ours" }],
  }, clock.at(34));
  const [leg = ""] = legIds;
  await seat(stage, moveId, "contractor", "contractor", null, clock.at(33));
  await seat(stage, moveId, "receiver", "receiver", null, clock.at(33));
  await prepare(stage, moveId, "where-it-stands", NOTES, clock.at(20));
  await signPrep(stage, moveId, "where-it-stands", clock.at(20, 20));
  const owner = who(stage, "owner");
  const heard = { source: "e-mail", heardOn: clock.day(9), saidBy: "L. Perrin, mechanical", reference: null } as const;
  const { inspectionId } = await recordVisit(owner, { moveId, legId: leg, visitedOn: clock.day(10), place: "Perrin", zone: CENTRAL, inspectorName: "L. Perrin", air: "off", airSource: null, airPsi: null, note: null, enteredFor: heard }, clock.attempt(clock.at(9)));
  const { findingId } = await postFinding(owner, { moveId, inspectionId, componentId: "knuckle", placeId: "coupler-f", placeNote: null, observed: "“Front knuckle looks worn.” Nothing measured.", reading: null, condition: null, severity: "stops-move", noPhotoReason: "Taken from an e-mail without a picture", photoIds: [], enteredFor: heard }, clock.attempt(clock.at(9, 16)));
  await answer(stage, { moveId, findingId, text: "Measured with an inside caliper at three heights, knuckle closed and locked, rule beside it.", reading: "5 1/8 in", picture: couplerGap("front-gap.jpg", "Front knuckle to guard arm", 41) }, clock.at(4, 19));
}

/** A case that was just opened: no contractor yet, the payer not named. */
export async function openedCase(stage: DemoStage): Promise<void> {
  const { clock } = stage;
  await openCase(stage, {
    answers: PLANT_UNIT, origin: { name: "Coldwater plant", place: "Coldwater", zone: CENTRAL }, destination: { name: "Fenn Valley yard", place: "Fenn Valley", zone: CENTRAL },
    legs: [{ carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", toPlace: "Fenn Valley", toZone: CENTRAL, payer: "unnamed" }],
  }, clock.at(3));
}
