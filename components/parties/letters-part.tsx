"use client";

import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import type { Tone } from "@/components/ui/tone";
import { revokeMutation, sendAgainMutation } from "@/lib/parties/options";
import type { InvitationView, PartyLeg } from "@/lib/parties/types";
import type { InvitationState } from "@/lib/parties/vocabulary";
import { partWords } from "@/lib/parties/words";

const STATES: Record<InvitationState, { tone: Tone; words: string }> = {
  open: { tone: "brass", words: "Not opened yet" },
  used: { tone: "verdigris", words: "Joined" },
  expired: { tone: "oxide", words: "Too old" },
  revoked: { tone: "neutral", words: "Revoked" },
};

type LettersPartProps = { moveId: string; invitations: InvitationView[]; legs: PartyLeg[]; edits: boolean };

/** Letters of invitation that were sent, newest first. */
export function LettersPart({ moveId, invitations, legs, edits }: LettersPartProps) {
  const again = useWrite(sendAgainMutation(moveId));
  const revoke = useWrite(revokeMutation(moveId));
  if (invitations.length === 0) return null;
  return (
    <Sheet bare level={3} title="Letters of invitation" lead="Each works once, for 14 days." className="mt-8">
      <Table caption="Letters of invitation" stack>
        <thead>
          <tr><Th>To</Th><Th>As</Th><Th>Sent</Th><Th>State</Th>{edits && <Th><span className="sr-only">Changes</span></Th>}</tr>
        </thead>
        <tbody>
          {invitations.map((letter) => {
            const { tone, words } = STATES[letter.state];
            return (
              <tr key={letter.invitationId}>
                <Td label="To"><b>{letter.name ?? letter.email}</b>{letter.name && <span className="block text-ink-2 [overflow-wrap:anywhere]">{letter.email}</span>}</Td>
                <Td label="As">{letter.companyName}<span className="block text-ink-2">{partWords(letter.part, legs.find((leg) => leg.legId === letter.legId) ?? null, letter)}</span></Td>
                <Td label="Sent"><span className="figure">{letter.createdAt.slice(0, 10)}</span><span className="block text-ink-2">by {letter.invitedBy}</span></Td>
                <Td label="State"><State tone={tone}>{words}</State>{letter.state === "open" && <span className="block text-ink-2">until {letter.expiresAt.slice(0, 10)}</span>}</Td>
                {edits && (
                  <Td>
                    {(letter.state === "open" || letter.state === "expired") && (
                      <div className="flex flex-wrap gap-x-4">
                        <ConfirmButton opener="Send again" of={`to ${letter.email}`} title="Send the letter again?" confirm="Send again" body={{ invitationId: letter.invitationId }} write={again}>
                          <p>A new letter goes to {letter.email}. The link in the one before stops working.</p>
                        </ConfirmButton>
                        <ConfirmButton opener="Revoke" of={`the letter to ${letter.email}`} title="Revoke the letter?" confirm="Revoke" body={{ invitationId: letter.invitationId }} write={revoke}>
                          <p>The link that went to {letter.email} stops working. The company keeps its part; take it off above if it shall not have it.</p>
                        </ConfirmButton>
                      </div>
                    )}
                  </Td>
                )}
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Sheet>
  );
}
