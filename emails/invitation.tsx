import type { Invitation } from "@/lib/outbox/types";
import { Action, Letter, Para } from "./layout";

export const invitationSubject = ({ inviterCompany, unit }: Invitation) => (unit ? `${inviterCompany} asks you to join the move of ${unit}` : `${inviterCompany} asks you to join them on Towfolio`);

/** Who asks whom to do what; the button leads to a page of ours that asks once more. */
export function InvitationEmail({ inviterName, inviterCompany, companyName, part, unit, from, to, url, goodUntil }: Invitation) {
  return (
    <Letter preview={`${inviterName} of ${inviterCompany} invites you`} title={unit ? `Join the move of ${unit}` : `Join ${companyName}`}>
      <Para>{inviterName} of {inviterCompany} asks you to take part for {companyName}: {part}.</Para>
      {unit ? <Para>The unit {unit} is to go from {from} to {to}, dead in tow. Its checklist, photos, findings and timeline are kept in one case file, and you see the part that concerns you.</Para> : null}
      <Action url={url} label="Open the invitation" />
      <Para>It is good until {goodUntil} and works once. No password is needed. If you did not expect it, do nothing.</Para>
    </Letter>
  );
}
