import { finishItem, keepItem, reopenItem, reopenRestore, restoreItem, signPhase, skipItem } from "@/lib/prep/commands";
import { getPrep } from "@/lib/prep/queries";
import { anAttempt } from "../../support/factories";
import { query, step } from "../build";
import { SEE_WORK } from "../personas";
import type { Case } from "../scenario";
import { arrived, itemDone, itemOf } from "../steps";

const done = async (of: Case) => {
  await itemDone(of);
  return itemOf(of);
};

const shownHash = async (of: Case) => {
  await itemDone(of);
  const { phases } = await getPrep(of.people.contractor, of.moveId);
  return { rowsHash: phases.find(({ phase }) => phase === "where-it-stands")?.rowsHash ?? "" };
};

const back = (state: "to-restore" | "restored") => async (of: Case) => {
  await arrived(of, state);
  return itemOf(of);
};

export const prepRows = [
  query({ name: "getPrep", right: SEE_WORK, run: (viewer, { moveId }) => getPrep(viewer, moveId) }),
  step({ name: "finishItem", right: ["contractor"], seed: (of) => itemOf(of), run: (viewer, { moveId, itemId, version }) => finishItem(viewer, { moveId, itemId, version, value: null, tagNumber: null, note: null, photoIds: [] }, anAttempt()) }),
  step({ name: "skipItem", right: ["contractor"], seed: (of) => itemOf(of), run: (viewer, { moveId, itemId, version }) => skipItem(viewer, { moveId, itemId, version, why: "None is fitted" }, anAttempt()) }),
  step({ name: "reopenItem", right: ["contractor"], seed: done, run: (viewer, { moveId, itemId, version }) => reopenItem(viewer, { moveId, itemId, version, why: "The cap blew off" }, anAttempt()) }),
  step({ name: "signPhase", right: ["contractor"], seed: shownHash, run: (viewer, { moveId, rowsHash }) => signPhase(viewer, { moveId, rowsHash, phase: "where-it-stands", name: viewer.name }, anAttempt()) }),
  step({ name: "restoreItem", right: ["contractor", "receiver"], seed: back("to-restore"), run: (viewer, { moveId, itemId, version }) => restoreItem(viewer, { moveId, itemId, version, note: null, photoIds: [] }, anAttempt()) }),
  step({ name: "keepItem", right: ["receiver"], seed: back("to-restore"), run: (viewer, { moveId, itemId, version }) => keepItem(viewer, { moveId, itemId, version, why: "It goes on display" }, anAttempt()) }),
  step({ name: "reopenRestore", right: ["contractor", "receiver"], seed: back("restored"), run: (viewer, { moveId, itemId, version }) => reopenRestore(viewer, { moveId, itemId, version, why: "Wrong item" }, anAttempt()) }),
];
