import { recordVisit } from "@/lib/inspections/commands";
import { listInspections } from "@/lib/inspections/queries";
import { anAttempt } from "../../support/factories";
import { carrierSteps, query } from "../build";
import { SEE_WORK } from "../personas";

const visit = { visitedOn: "2026-11-20", place: "Sand Hollow", zone: "America/Chicago", inspectorName: "V. Sorrel", air: "on" as const, airSource: "Shop compressor", airPsi: 90, note: null };
/** After the day of the visit, wherever the tests run. */
const LATER = new Date("2026-11-25T12:00:00Z");

export const inspectionRows = [
  query({ name: "listInspections", right: SEE_WORK, run: (viewer, { moveId }) => listInspections(viewer, moveId) }),
  ...carrierSteps({
    name: "recordVisit", own: ["inspectorA", "guest"], enter: ["owner", "contractor"], seed: async () => ({}),
    run: (viewer, { moveId, legA }, enteredFor) => recordVisit(viewer, { ...visit, moveId, legId: legA, enteredFor }, anAttempt({ at: LATER })),
  }),
];
