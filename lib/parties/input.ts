import { z } from "zod";
import { emailOf, idOf, line, lineOrNull } from "@/lib/access/input";
import { ADDRESS_WANTED, INVITED_PARTS, WORK_WANTED } from "./vocabulary";

const emptyToNull = <T extends z.ZodType>(kind: T) => z.union([z.null(), z.literal("").transform(() => null), kind]).optional().transform((given) => given ?? null);
const works = { inspects: z.boolean().default(false), bills: z.boolean().default(false), dispatches: z.boolean().default(false) };

/** A company is chosen among the known ones, or named anew. Without an e-mail address only a company of the inviter's own can be seated. */
export const invitePartyInput = z
  .strictObject({
    moveId: idOf,
    part: z.enum(INVITED_PARTS, { error: "Choose the part." }),
    legId: emptyToNull(idOf),
    companyId: emptyToNull(idOf),
    companyName: lineOrNull(),
    email: emptyToNull(emailOf),
    name: lineOrNull(120),
    ...works,
  })
  .superRefine((given, ctx) => {
    const fault = (path: string, message: string) => ctx.addIssue({ code: "custom", path: [path], message });
    const onLeg = given.part === "carrier" || given.part === "payer";
    if (onLeg && !given.legId) fault("legId", "Choose the leg.");
    if (!onLeg && given.legId) fault("legId", "This part is not tied to a leg.");
    if (!given.companyId && !given.companyName) fault("companyName", "Name the company.");
    if (given.companyId && given.companyName) fault("companyName", "Either a company of the list or a new name, not both.");
    if (!given.companyId && !given.email) fault("email", ADDRESS_WANTED);
    if (given.part === "carrier" && (given.email || !given.companyId) && !given.inspects && !given.bills && !given.dispatches) fault("works", WORK_WANTED);
  });
export type InviteParty = z.output<typeof invitePartyInput>;

export const invitationInput = z.strictObject({ moveId: idOf, invitationId: idOf });
export type OneInvitation = z.output<typeof invitationInput>;

export const removePartyInput = z.strictObject({ moveId: idOf, seatId: idOf });
export type RemoveParty = z.output<typeof removePartyInput>;

export const makeFollowLinkInput = z.strictObject({ moveId: idOf, label: line("Say who follows by this link."), email: emptyToNull(emailOf) });
export type MakeFollowLink = z.output<typeof makeFollowLinkInput>;

export const endFollowLinkInput = z.strictObject({ moveId: idOf, followId: idOf });
export type EndFollowLink = z.output<typeof endFollowLinkInput>;

/** The button of a letter. `once` was made with the page, so that a second press of the same page joins once. */
export const joinInput = z.strictObject({
  token: z.string({ error: "The link is not whole." }).min(20, "The link is not whole.").max(200, "The link is not whole."),
  once: z.uuid({ error: "Open the link again." }),
  name: lineOrNull(120),
});
export type Join = z.output<typeof joinInput>;
