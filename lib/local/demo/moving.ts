import { accept, openCase, prepare, seat, signPrep, type DemoStage } from "./case";
import { chain, couplerGap, flatSpot } from "./pictures";
import { ROAD_UNIT, ROAD_UNIT_NOTES } from "./scenes";
import { answer, instruct, post, quoteAndPay, quoteOnly, release, reply, sight, visit } from "./steps";

const CENTRAL = "America/Chicago";
const MOUNTAIN = "America/Denver";

/** A six-axle unit under way with the first of two carriers, while the second one's inspector already writes up what he found. */
export async function movingCase(stage: DemoStage): Promise<void> {
  const { clock } = stage;
  const { moveId, legIds } = await openCase(stage, {
    answers: ROAD_UNIT, aliases: ["VRHL 2783"],
    origin: { name: "Sand Hollow elevator", place: "Sand Hollow", zone: CENTRAL }, destination: { name: "Vellum Ridge shops", place: "Quill Creek", zone: MOUNTAIN },
    legs: [
      { carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", toPlace: "Ardell", toZone: MOUNTAIN, miles: "174", payer: "other", payerName: "Fenn Valley Fund" },
      { carrierName: "Sable Mountain Lines", carrierMark: "ZSML", toPlace: "Quill Creek", toZone: MOUNTAIN, miles: "398", payer: "ours" },
    ],
    wantedFrom: clock.day(30), wantedTo: clock.day(-20),
  }, clock.at(61));
  const [first = "", second = ""] = legIds;
  await seat(stage, moveId, "contractor", "contractor", null, clock.at(58));
  await seat(stage, moveId, "clerk", "carrier", first, clock.at(57));
  await seat(stage, moveId, "payer", "payer", first, clock.at(56));
  await seat(stage, moveId, "receiver", "receiver", null, clock.at(55));
  await seat(stage, moveId, "nextClerk", "carrier", second, clock.at(50));
  await prepare(stage, moveId, "where-it-stands", ROAD_UNIT_NOTES, clock.at(34, 20));
  await signPrep(stage, moveId, "where-it-stands", clock.at(34, 23));

  const without = await visit(stage, { key: "inspector", moveId, legId: first, place: "Sand Hollow", zone: CENTRAL, daysAgo: 25, air: "off" }, clock.at(25, 18));
  const flat = await post(stage, { key: "inspector", moveId, inspectionId: without, componentId: "flat-spot", placeId: "wheel-R4", observed: "Two flats beside each other on the tread, measured along it.", reading: "2 5/8 in and 2 3/4 in", condition: "Wheel clean, rule along the tread", severity: "stops-move", picture: flatSpot("flat-r4.jpg", "Flat on wheel R4, rule beside it", 22) }, clock.at(25, 19));
  const knuckle = await post(stage, { key: "inspector", moveId, inspectionId: without, componentId: "knuckle", placeId: "coupler-r", observed: "Knuckle to guard arm too wide, worn pin.", reading: "5 7/16 in", condition: "Knuckle closed and locked", severity: "stops-move", picture: couplerGap("gap-found.jpg", "Knuckle to guard arm, as found", 43.5) }, clock.at(25, 19, 30));
  const piston = await post(stage, { key: "inspector", moveId, inspectionId: without, componentId: "piston-travel", placeId: "brake-rigging-r", observed: "Travel looks long on the rear truck.", severity: "answer-before-pickup", noPhotoReason: "No air on the unit, nothing to measure" }, clock.at(25, 20));
  await answer(stage, { moveId, findingId: knuckle, text: "Knuckle and pin replaced. Inside caliper at three heights, rule beside it.", reading: "5 1/8 in", picture: couplerGap("gap-after.jpg", "Knuckle to guard arm after a new knuckle", 41) }, clock.at(20, 20));
  await answer(stage, { moveId, findingId: flat, text: "Wheel turned at the elevator’s track, wheel sheet 3.", reading: "0 in" }, clock.at(20, 21));
  await answer(stage, { moveId, findingId: piston, text: "Measured with air from our compressor at 88 psi: rear truck left and right.", reading: "6 1/2 in" }, clock.at(20, 22));
  await reply(stage, "inspector", { moveId, findingId: flat, text: "A turned wheel without a picture of the tread.", wouldSatisfy: "A photo of the tread with a rule on it, and the wheel sheet." }, clock.at(17, 16));
  await answer(stage, { moveId, findingId: flat, text: "Tread after turning, rule on it. No flat left.", reading: "0 in", picture: flatSpot("tread-r4-after.jpg", "Tread of wheel R4 after turning", 0) }, clock.at(16, 18));
  const withAir = await visit(stage, { key: "inspector", moveId, legId: first, place: "Sand Hollow", zone: CENTRAL, daysAgo: 14, air: "on", airSource: "the contractor’s compressor", airPsi: 88 }, clock.at(14, 15));
  for (const findingId of [flat, knuckle, piston]) await reply(stage, "inspector", { moveId, findingId, text: "Seen on the second visit, with air." }, clock.at(14, 17));
  void withAir;
  await accept(stage, "inspector", moveId, first, { number: "QS-2291", restrictions: ["mph-45", "do-not-hump", "notify-bad-order"], restrictionNote: "Behind the road power." }, clock.at(13, 16));
  await quoteAndPay(stage, { clerk: "clerk", payer: "payer", moveId, legId: first, lines: [{ kind: "line-haul", description: "Sand Hollow to Ardell, 174 miles", amountCents: 348_500 }, { kind: "special-handling", description: "Dead in tow, handled in the head-end consist", amountCents: 70_000 }] }, { quoted: clock.at(12, 15), agreed: clock.at(11, 15), paid: clock.at(11, 16) });
  await instruct(stage, "desk", moveId, first, "QS 118-40772", clock.at(9, 14));
  await release(stage, moveId, clock.at(8, 15));
  await prepare(stage, moveId, "when-coupled", { any: { photo: chain("chain-slack.jpg", "Hand brake released, chain slack") } }, clock.at(6, 13));
  await signPrep(stage, moveId, "when-coupled", clock.at(6, 14));
  await sight(stage, "desk", { moveId, legId: first, kind: "pulled", place: "Sand Hollow", zone: CENTRAL }, clock.at(6, 15));
  await sight(stage, "desk", { moveId, legId: first, kind: "departed", place: "Sand Hollow yard", zone: CENTRAL, train: "QS14" }, clock.at(4, 11));
  await nextCarrier(stage, moveId, second);
  await sight(stage, "desk", { moveId, legId: first, kind: "arrived", place: "Corben", zone: CENTRAL, train: "QS14", note: "Set out for a crew change, goes on with the next train." }, clock.at(1, 9));
}

/** What the second carrier did meanwhile, with the first one's evidence in view. */
async function nextCarrier(stage: DemoStage, moveId: string, legId: string): Promise<void> {
  const { clock } = stage;
  const look = await visit(stage, { key: "nextInspector", moveId, legId, place: "Sand Hollow", zone: CENTRAL, daysAgo: 7, air: "off", note: "Looked at the first carrier’s findings and answers; did not measure again what is cleared there." }, clock.at(7, 18));
  const shoe = await post(stage, { key: "nextInspector", moveId, inspectionId: look, componentId: "brake-shoe", placeId: "wheel-L2", observed: "Shoe thin at the lower end.", reading: "1/2 in", condition: "Brakes released", severity: "answer-before-pickup", noPhotoReason: "Camera battery flat; measured with a shoe gauge" }, clock.at(7, 19));
  await post(stage, { key: "nextInspector", moveId, inspectionId: look, componentId: "glazing", placeId: "cab", observed: "Plywood over the rear cab window is loose at one corner.", severity: "note", noPhotoReason: "Seen from the ground, too dark for a picture" }, clock.at(7, 19, 20));
  await answer(stage, { moveId, findingId: shoe, text: "Shoe replaced before pickup; old one kept in the tool box.", reading: "1 1/2 in" }, clock.at(6, 11));
  await quoteOnly(stage, { clerk: "nextClerk", moveId, legId, lines: [{ kind: "line-haul", description: "Ardell to Quill Creek, 398 miles", amountCents: 796_000 }, { kind: "switching", description: "Placement at Vellum Ridge shops", amountCents: 45_000 }] }, clock.at(3, 15));
}
