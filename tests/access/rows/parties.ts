import { inviteColleague, revokeColleagueLetter, sendColleagueLetterAgain } from "@/lib/parties/commands/colleague";
import { endFollowLink, makeFollowLink } from "@/lib/parties/commands/follow";
import { inviteParty, revokeLetter, sendLetterAgain } from "@/lib/parties/commands/invite";
import { removeParty } from "@/lib/parties/commands/remove";
import { getPeople, listKnownCompanies } from "@/lib/parties/queries";
import { anAttempt } from "../../support/factories";
import { query, step } from "../build";
import { SEATED, seatedBut } from "../personas";
import type { Case } from "../scenario";
import { followed, invited, seatOf } from "../steps";

const MEMBERS = ["inspectorA", "clerkA", "deskA"] as const;
/** Letters into carrier A's company, which its desk manages. */
const managed = { right: ["deskA"], hidden: seatedBut(...MEMBERS) } as const;
const works = { inspects: true, bills: false, dispatches: false };
const toReceiver = async (of: Case) => ({ invitationId: await invited(of, of.companies.receiver, "receiver") });
const toColleague = async (of: Case) => ({ invitationId: await invited(of, of.companies.carrierA, null) });

export const partyRows = [
  query({ name: "getPeople", right: SEATED, run: (viewer, { moveId }) => getPeople(viewer, moveId) }),
  query({ name: "listKnownCompanies", right: seatedBut("guest"), open: true, own: true, needle: () => "Alder Gap Museum", run: (viewer) => listKnownCompanies(viewer) }),
  step({
    name: "inviteParty", right: ["owner"], seed: async () => ({}),
    run: (viewer, { moveId, legA }) => inviteParty(viewer, { moveId, part: "payer", legId: legA, companyId: null, companyName: "Tallow Fund", email: "fund@example.test", name: null, inspects: false, bills: false, dispatches: false }, anAttempt()),
  }),
  step({ name: "sendLetterAgain", right: ["owner"], seed: toReceiver, run: (viewer, { moveId, invitationId }) => sendLetterAgain(viewer, { moveId, invitationId }, anAttempt()) }),
  step({ name: "revokeLetter", right: ["owner"], seed: toReceiver, run: (viewer, { moveId, invitationId }) => revokeLetter(viewer, { moveId, invitationId }, anAttempt()) }),
  step({ name: "removeParty", right: ["owner"], seed: async (of) => ({ seatId: await seatOf(of, "contractor") }), run: (viewer, { moveId, seatId }) => removeParty(viewer, { moveId, seatId }, anAttempt()) }),
  step({ name: "makeFollowLink", right: ["owner"], seed: async () => ({}), run: (viewer, { moveId }) => makeFollowLink(viewer, { moveId, label: "Friends of the museum", email: null }, anAttempt()) }),
  step({ name: "endFollowLink", right: ["owner"], seed: async (of) => ({ followId: await followed(of) }), run: (viewer, { moveId, followId }) => endFollowLink(viewer, { moveId, followId }, anAttempt()) }),
  step({ name: "inviteColleague", ...managed, seed: async () => ({}), run: (viewer, { carrierId }) => inviteColleague(viewer, { companyId: carrierId, email: `${crypto.randomUUID()}@example.test`, name: null, ...works }, anAttempt()) }),
  step({ name: "sendColleagueLetterAgain", ...managed, seed: toColleague, run: (viewer, { carrierId, invitationId }) => sendColleagueLetterAgain(viewer, { companyId: carrierId, invitationId }, anAttempt()) }),
  step({ name: "revokeColleagueLetter", ...managed, seed: toColleague, run: (viewer, { carrierId, invitationId }) => revokeColleagueLetter(viewer, { companyId: carrierId, invitationId }, anAttempt()) }),
];
