import { signAcceptance, withdrawAcceptance } from "@/lib/acceptance/commands";
import { listAcceptances } from "@/lib/acceptance/queries";
import { anAttempt } from "../../support/factories";
import { carrierSteps, query } from "../build";
import { SEE_WORK } from "../personas";
import type { Case } from "../scenario";
import { accepted, prepSigned } from "../steps";

const inspecting = { own: ["inspectorA", "guest"], enter: ["owner", "contractor"] } as const;

const shownHash = async (of: Case) => {
  await prepSigned(of);
  const { legs } = await listAcceptances(of.people.inspectorA, of.moveId);
  return { rowsHash: legs.find(({ legId }) => legId === of.legA)?.rowsHash ?? "" };
};

export const acceptanceRows = [
  query({ name: "listAcceptances", right: SEE_WORK, run: (viewer, { moveId }) => listAcceptances(viewer, moveId) }),
  ...carrierSteps({
    name: "signAcceptance", ...inspecting, seed: shownHash,
    run: (viewer, { moveId, legA, rowsHash }, enteredFor) => signAcceptance(viewer, { moveId, legId: legA, restrictions: ["mph-25"], restrictionNote: null, number: "QS-118", validUntil: null, name: viewer.name, rowsHash, enteredFor }, anAttempt()),
  }),
  ...carrierSteps({
    name: "withdrawAcceptance", ...inspecting, seed: async (of) => ({ acceptanceId: await accepted(of, of.legA) }),
    run: (viewer, { moveId, acceptanceId }, enteredFor) => withdrawAcceptance(viewer, { moveId, acceptanceId, why: "Signed for another unit", enteredFor }, anAttempt()),
  }),
];
