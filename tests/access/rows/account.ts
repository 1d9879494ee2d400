import { changePassword, endOtherSessions, endSession, renameMyself } from "@/lib/account/commands/own";
import { getAccount } from "@/lib/account/queries";
import { anAttempt } from "../../support/factories";
import { EVERYBODY, query, step } from "../build";
import { seatedBut } from "../personas";
import { sessionOf } from "../steps";

const wrongPassword = { currentPassword: "not the one that stands", newPassword: "quarry lantern seven ferns", endOthers: true };

export const accountRows = [
  query({ name: "getAccount", right: EVERYBODY, open: true, own: true, run: (viewer) => getAccount(viewer) }),
  query({ name: "getAccount", as: "with the owner’s session in it", right: ["owner"], open: true, own: true, needle: ({ sessionId }) => sessionId, run: (viewer) => getAccount(viewer) }),
  step({ name: "renameMyself", right: EVERYBODY, own: true, named: false, seed: async () => ({}), run: (viewer) => renameMyself(viewer, { name: "N. New" }, anAttempt()) }),
  step({ name: "endSession", right: ["owner"], hidden: seatedBut("owner"), own: true, seed: async (of) => ({ sessionId: await sessionOf(of.people.owner) }), run: (viewer, { sessionId }) => endSession(viewer, { sessionId }, anAttempt()) }),
  step({ name: "endOtherSessions", right: EVERYBODY, own: true, named: false, seed: async () => ({}), run: (viewer) => endOtherSessions(viewer, {}, anAttempt()) }),
  // Nobody gets past without the password that stands; that it then works is told in the account's own tests.
  step({ name: "changePassword", as: "without the one that stands", right: [], named: false, wrongCode: "bad_input", hiddenCode: "bad_input", own: true, seed: async () => ({}), run: (viewer) => changePassword(viewer, wrongPassword, anAttempt(), new Headers()) }),
];
