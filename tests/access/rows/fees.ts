import { payQuote } from "@/lib/fees/commands/pay";
import { agreeQuote, clearBilling, giveQuote, voidQuote } from "@/lib/fees/commands/quotes";
import { findPaid, getFees } from "@/lib/fees/queries";
import { anAttempt } from "../../support/factories";
import { carrierSteps, query, step } from "../build";
import { seatedBut, type Persona } from "../personas";
import { quoted } from "../steps";

/** Everybody seated who sees neither carrier A's money nor any other: to them a quote does not exist. */
const NOT_MONEY_A: readonly Persona[] = seatedBut("owner", "payer", "clerkA");
const lines = [{ kind: "line-haul" as const, description: "Sand Hollow to Ardell", amountCents: 418_500 }];

export const feeRows = [
  query({ name: "getFees", right: ["owner", "payer", "clerkA", "clerkB"], hidden: seatedBut("owner", "payer", "clerkA", "clerkB"), run: (viewer, { moveId }) => getFees(viewer, moveId) }),
  query({ name: "findPaid", right: ["owner", "payer", "clerkA"], empty: NOT_MONEY_A, run: (viewer, { moveId, paymentSession }) => findPaid(viewer, moveId, paymentSession) }),
  ...carrierSteps({
    name: "giveQuote", own: ["clerkA"], enter: ["owner"], seed: async () => ({}),
    run: (viewer, { moveId, legA }, enteredFor) => giveQuote(viewer, { moveId, legId: legA, reference: null, goodUntil: null, note: null, lines, enteredFor }, anAttempt()),
  }),
  step({ name: "agreeQuote", right: ["owner", "payer"], hidden: NOT_MONEY_A, seed: async (of) => ({ quoteId: await quoted(of, of.legA) }), run: (viewer, { moveId, quoteId }) => agreeQuote(viewer, { moveId, quoteId }, anAttempt()) }),
  ...carrierSteps({
    name: "voidQuote", own: ["clerkA"], enter: ["owner"], hidden: NOT_MONEY_A, seed: async (of) => ({ quoteId: await quoted(of, of.legA) }),
    run: (viewer, { moveId, quoteId }, enteredFor) => voidQuote(viewer, { moveId, quoteId, why: "Wrong route", enteredFor }, anAttempt()),
  }),
  step({ name: "payQuote", right: ["owner", "payer"], hidden: NOT_MONEY_A, seed: async (of) => ({ quoteId: await quoted(of, of.legA, { state: "agreed" }) }), run: (viewer, { moveId, quoteId }) => payQuote(viewer, { moveId, quoteId }, anAttempt()) }),
  ...carrierSteps({
    name: "clearBilling", own: ["clerkA"], enter: ["owner"], seed: async () => ({}),
    run: (viewer, { moveId, legA }, enteredFor) => clearBilling(viewer, { moveId, legId: legA, note: "Credit account", enteredFor }, anAttempt()),
  }),
];
