import { closeMove, giveInstruction, makeSighting, recordArrival, releaseUnit, retractSighting, withdrawInstruction } from "@/lib/movement/commands";
import { getMovement } from "@/lib/movement/queries";
import { anAttempt } from "../../support/factories";
import { carrierSteps, query, step } from "../build";
import { SEE_WORK } from "../personas";
import type { Case } from "../scenario";
import { arrived, atDestination, fit, instructed, photographed, placed, readyToGo, sighted } from "../steps";

const desk = { own: ["deskA"], enter: ["owner", "contractor"] } as const;
const said = { place: "Ardell", zone: "America/Denver", occurredAt: "2026-01-05T08:30", train: null, note: null, photoIds: [], corrects: null };

const bothPictured = async (of: Case) => {
  await placed(of);
  const { receiver, contractor } = of.people;
  return { receiverId: receiver.userId, ofReceiver: await photographed(of, receiver), ofContractor: await photographed(of, contractor) };
};

export const movementRows = [
  query({ name: "getMovement", right: SEE_WORK, run: (viewer, { moveId }) => getMovement(viewer, moveId) }),
  ...carrierSteps({
    name: "giveInstruction", ...desk, seed: async (of) => { await fit(of, of.legA); return {}; },
    run: (viewer, { moveId, legA }, enteredFor) => giveInstruction(viewer, { moveId, legId: legA, billNumber: "B-4410", clearanceNumber: null, train: null, pickupFrom: null, text: null, enteredFor }, anAttempt()),
  }),
  ...carrierSteps({
    name: "withdrawInstruction", ...desk, seed: async (of) => ({ instructionId: await instructed(of, of.legA) }),
    run: (viewer, { moveId, instructionId }, enteredFor) => withdrawInstruction(viewer, { moveId, instructionId, why: "The train was annulled", enteredFor }, anAttempt()),
  }),
  step({ name: "releaseUnit", right: ["owner"], seed: async (of) => { await readyToGo(of, "release"); return {}; }, run: (viewer, { moveId }) => releaseUnit(viewer, { moveId, name: viewer.name, note: null }, anAttempt()) }),
  ...carrierSteps({
    name: "makeSighting", ...desk, seed: async (of) => { await readyToGo(of); return {}; },
    run: (viewer, { moveId, legA }, enteredFor) => makeSighting(viewer, { ...said, moveId, legId: legA, kind: "pulled", enteredFor }, anAttempt()),
  }),
  step({
    name: "makeSighting", as: "placed at the end of the route", right: ["deskB", "receiver"], seed: async (of) => { await atDestination(of); return {}; },
    run: (viewer, { moveId, legB }) => makeSighting(viewer, { ...said, moveId, legId: legB, kind: "placed", enteredFor: null }, anAttempt()),
  }),
  ...carrierSteps({
    name: "retractSighting", ...desk, seed: async (of) => ({ sightingId: await sighted(of, of.legA, "pulled") }),
    run: (viewer, { moveId, sightingId }, enteredFor) => retractSighting(viewer, { moveId, sightingId, why: "Another unit", enteredFor }, anAttempt()),
  }),
  step({
    name: "retractSighting", as: "of the receiver’s own at the end of the route", right: ["deskB", "receiver"],
    seed: async (of) => { await atDestination(of); return { sightingId: await sighted(of, of.legB, "placed", of.people.receiver) }; },
    run: (viewer, { moveId, sightingId }) => retractSighting(viewer, { moveId, sightingId, why: "Another track", enteredFor: null }, anAttempt()),
  }),
  step({
    name: "retractSighting", as: "of the carrier’s own at the end of the route", right: ["deskB"],
    seed: async (of) => { await atDestination(of); return { sightingId: await sighted(of, of.legB, "placed") }; },
    run: (viewer, { moveId, sightingId }) => retractSighting(viewer, { moveId, sightingId, why: "Another track", enteredFor: null }, anAttempt()),
  }),
  step({
    name: "recordArrival", right: ["receiver", "contractor"], seed: bothPictured,
    run: (viewer, { moveId, receiverId, ofReceiver, ofContractor }) =>
      recordArrival(viewer, { moveId, arrivedOn: "2026-11-28", condition: "As it left.", missing: null, name: viewer.name, photoIds: [viewer.userId === receiverId ? ofReceiver : ofContractor] }, anAttempt()),
  }),
  step({ name: "closeMove", right: ["owner", "receiver"], seed: async (of) => { await arrived(of, "restored"); return {}; }, run: (viewer, { moveId }) => closeMove(viewer, { moveId, name: viewer.name }, anAttempt()) }),
];
