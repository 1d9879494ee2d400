import { answerFinding, clearFinding, notClearFinding, postFinding, withdrawFinding } from "@/lib/findings/commands";
import { getFinding, listFindings } from "@/lib/findings/queries";
import { anAttempt } from "../../support/factories";
import { carrierSteps, query, step } from "../build";
import { SEE_WORK } from "../personas";
import { found, visited } from "../steps";

const inspecting = { own: ["inspectorA", "guest"], enter: ["owner", "contractor"] } as const;
const observed = { componentId: "flat-spot", placeId: null, placeNote: "Third wheel", observed: "Flat along the tread.", reading: "2 5/8 in", condition: null, severity: "stops-move" as const, photoIds: [], noPhotoReason: "The light was gone." };

export const findingRows = [
  query({ name: "listFindings", right: SEE_WORK, run: (viewer, { moveId }) => listFindings(viewer, moveId) }),
  query({ name: "getFinding", right: SEE_WORK, run: (viewer, { moveId, findingId }) => getFinding(viewer, moveId, findingId) }),
  ...carrierSteps({
    name: "postFinding", ...inspecting, seed: async (of) => ({ inspectionId: await visited(of, of.legA) }),
    run: (viewer, { moveId, inspectionId }, enteredFor) => postFinding(viewer, { ...observed, moveId, inspectionId, enteredFor }, anAttempt()),
  }),
  step({
    name: "answerFinding", right: ["contractor"], seed: (of) => found(of, of.legA),
    run: (viewer, { moveId, findingId, version }) => answerFinding(viewer, { moveId, findingId, version, text: "Turned.", reading: null, photoIds: [] }, anAttempt()),
  }),
  ...carrierSteps({
    name: "notClearFinding", ...inspecting, seed: (of) => found(of, of.legA, "answered"),
    run: (viewer, { moveId, findingId, version }, enteredFor) => notClearFinding(viewer, { moveId, findingId, version, text: "Still flat.", wouldSatisfy: "Turn it again.", photoIds: [], enteredFor }, anAttempt()),
  }),
  ...carrierSteps({
    name: "clearFinding", ...inspecting, seed: (of) => found(of, of.legA, "answered"),
    run: (viewer, { moveId, findingId, version }, enteredFor) => clearFinding(viewer, { moveId, findingId, version, text: null, enteredFor }, anAttempt()),
  }),
  ...carrierSteps({
    name: "withdrawFinding", ...inspecting, seed: (of) => found(of, of.legA),
    run: (viewer, { moveId, findingId, version }, enteredFor) => withdrawFinding(viewer, { moveId, findingId, version, text: "It was another unit.", enteredFor }, anAttempt()),
  }),
];
