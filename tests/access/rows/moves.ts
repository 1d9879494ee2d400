import { beginDraft, cancelMove, discardDraft, editEquipment, editLeg, editMove, openMove, saveDraft } from "@/lib/moves/commands";
import { editEquipmentInput, editLegInput, editMoveInput, openMoveInput } from "@/lib/moves/input";
import { DEFAULT_FILTER } from "@/lib/moves/list-filter";
import { getCaseFile, getDraft, getEquipment, listCarrierNames, listDrafts, listMoves } from "@/lib/moves/queries";
import { fillPrep } from "@/lib/prep/commands";
import { anAttempt } from "../../support/factories";
import { query, step } from "../build";
import { SEATED, seatedBut } from "../personas";
import { drafted } from "../steps";

const answers = { mark: "ZVRX", number: "2784", "f-end": "short-hood", shape: "hood", axles: "6" };
const origin = { name: "Sand Hollow elevator", place: "Sand Hollow", zone: "America/Chicago" };
const destination = { name: "Vellum Ridge shops", place: "Quill Creek", zone: "America/Denver" };
const carrier = { carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", miles: 120, payer: "other", payerName: "Fenn Valley Fund" };
const leg = { ...carrier, toPlace: "Ardell", toZone: "America/Denver" };

/** Of the owner's company alone: to everybody else there is no such thing, seated or not. */
const ownCompany = { right: ["owner"], hidden: seatedBut("owner") } as const;

export const moveRows = [
  query({ name: "listMoves", right: SEATED, open: true, needle: ({ moveId }) => moveId, run: (viewer) => listMoves(viewer, { ...DEFAULT_FILTER, stage: "all" }) }),
  query({ name: "listMoves", as: "what waits on the viewer’s company", right: ["contractor"], open: true, needle: ({ moveId }) => moveId, run: (viewer) => listMoves(viewer, { ...DEFAULT_FILTER, waiting: "company" }) }),
  query({ name: "listCarrierNames", right: SEATED, open: true, needle: () => "Sable Mountain Lines", run: (viewer) => listCarrierNames(viewer) }),
  query({ name: "listDrafts", right: ["owner"], open: true, own: true, needle: ({ draftId }) => draftId, run: (viewer) => listDrafts(viewer) }),
  query({ name: "getDraft", ...ownCompany, own: true, run: (viewer, { draftId }) => getDraft(viewer, draftId) }),
  query({ name: "getEquipment", right: seatedBut("payer"), run: (viewer, { moveId }) => getEquipment(viewer, moveId) }),
  query({ name: "getCaseFile", right: SEATED, run: (viewer, { moveId }) => getCaseFile(viewer, moveId) }),
  step({ name: "beginDraft", ...ownCompany, seed: async () => ({}), run: (viewer, { companyId }) => beginDraft(viewer, { companyId, body: {} }, anAttempt()) }),
  step({ name: "saveDraft", ...ownCompany, own: true, seed: async (of) => ({ draftId: await drafted(of) }), run: (viewer, { draftId, companyId }) => saveDraft(viewer, { draftId, companyId, body: { words: "x" }, version: 1 }, anAttempt()) }),
  step({
    name: "saveDraft", as: "of others into one’s own company", ...ownCompany, own: true, seed: async (of) => ({ draftId: await drafted(of) }),
    run: (viewer, { draftId, companyId }) => saveDraft(viewer, { draftId, companyId: viewer.memberships[0]?.companyId ?? companyId, body: {}, version: 1 }, anAttempt()),
  }),
  step({ name: "discardDraft", ...ownCompany, own: true, seed: async (of) => ({ draftId: await drafted(of) }), run: (viewer, { draftId }) => discardDraft(viewer, { draftId }, anAttempt()) }),
  step({
    name: "openMove", ...ownCompany, own: true, hiddenCode: "bad_input", seed: async () => ({}),
    run: (viewer, { companyId }) => openMove(viewer, openMoveInput.parse({ companyId, answers, aliases: [], origin, destination, legs: [carrier], note: "" }), anAttempt(), fillPrep),
  }),
  step({
    name: "openMove", as: "from a draft of others", ...ownCompany, own: true, told: { removed: "bad_input", siteAdmin: "bad_input", guest: "bad_input" }, seed: async (of) => ({ draftId: await drafted(of) }),
    run: (viewer, { draftId, companyId }) => openMove(viewer, openMoveInput.parse({ draftId, companyId: viewer.memberships[0]?.companyId ?? companyId, answers, aliases: [], origin, destination, legs: [carrier], note: "" }), anAttempt(), fillPrep),
  }),
  step({ name: "editEquipment", right: ["owner", "contractor"], seed: async () => ({}), run: (viewer, { moveId }) => editEquipment(viewer, editEquipmentInput.parse({ moveId, version: 1, answers, aliases: [] }), anAttempt()) }),
  step({ name: "editLeg", right: ["owner"], seed: async () => ({}), run: (viewer, { moveId, legA }) => editLeg(viewer, editLegInput.parse({ moveId, legId: legA, version: 1, ...leg }), anAttempt()) }),
  step({ name: "editMove", right: ["owner"], seed: async () => ({}), run: (viewer, { moveId }) => editMove(viewer, editMoveInput.parse({ moveId, version: 1, origin, destination, note: "Before the snow" }), anAttempt()) }),
  step({ name: "cancelMove", right: ["owner"], seed: async () => ({}), run: (viewer, { moveId }) => cancelMove(viewer, { moveId, reason: "Sold" }, anAttempt()) }),
];
