import { z } from "zod";
import { dayOrNull, enteredForOrNull, idOf, line, lineOrNull, linesOrNull } from "@/lib/access/input";
import { readMoney } from "./money";
import { FEE_KINDS } from "./vocabulary";

/** An amount as typed; becomes exact cents. */
const moneyOf = z.string({ error: "Enter an amount." }).transform((typed, ctx) => {
  const { cents, fault } = readMoney(typed);
  if (cents !== null) return cents;
  ctx.addIssue({ code: "custom", message: fault });
  return z.NEVER;
});

const feeLine = z
  .strictObject({ kind: z.enum(FEE_KINDS, { error: "Choose what the line is for." }), description: line("Say what the line is for."), amount: moneyOf })
  .transform(({ kind, description, amount }) => ({ kind, description, amountCents: amount }));

const MOST_LINES = 20;

export const giveQuoteInput = z.strictObject({
  moveId: idOf,
  legId: idOf,
  lines: z.array(feeLine, { error: "Add at least one line." }).min(1, "Add at least one line.").max(MOST_LINES, `At most ${MOST_LINES} lines.`),
  reference: lineOrNull(),
  goodUntil: dayOrNull,
  note: linesOrNull(2000),
  enteredFor: enteredForOrNull,
});
export type GiveQuote = z.output<typeof giveQuoteInput>;
/** The form as typed. */
export type QuoteForm = z.input<typeof giveQuoteInput>;

export const quoteInput = z.strictObject({ moveId: idOf, quoteId: idOf });
export type QuoteStep = z.output<typeof quoteInput>;

export const voidQuoteInput = z.strictObject({ moveId: idOf, quoteId: idOf, why: line("Say why the quote is voided."), enteredFor: enteredForOrNull });
export type VoidQuote = z.output<typeof voidQuoteInput>;
export type VoidForm = z.input<typeof voidQuoteInput>;

export const clearBillingInput = z.strictObject({ moveId: idOf, legId: idOf, note: line("Say what was agreed, such as the credit account or the letter."), enteredFor: enteredForOrNull });
export type ClearBilling = z.output<typeof clearBillingInput>;
export type ClearForm = z.input<typeof clearBillingInput>;
