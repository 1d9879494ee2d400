import { z } from "zod";
import { dayOrNull, enteredForOrNull, idOf, line, lineOrNull, linesOrNull } from "@/lib/access/input";
import { RESTRICTION_IDS } from "./vocabulary";

export const signAcceptanceInput = z.strictObject({
  moveId: idOf,
  legId: idOf,
  restrictions: z.array(z.enum(RESTRICTION_IDS, { error: "Choose from the list." })).max(RESTRICTION_IDS.length, "Choose from the list.").default([]).transform((ids) => [...new Set(ids)]),
  restrictionNote: linesOrNull(1000),
  number: lineOrNull(60),
  validUntil: dayOrNull,
  name: line("Type your name."),
  /** Of what the person saw; other rows are not signed. */
  rowsHash: z.string().regex(/^[0-9a-f]{64}$/, "Open the page again."),
  enteredFor: enteredForOrNull,
});
export type SignAcceptance = z.output<typeof signAcceptanceInput>;

export const withdrawAcceptanceInput = z.strictObject({ moveId: idOf, acceptanceId: idOf, why: line("Say why it is withdrawn."), enteredFor: enteredForOrNull });
export type WithdrawAcceptance = z.output<typeof withdrawAcceptanceInput>;
