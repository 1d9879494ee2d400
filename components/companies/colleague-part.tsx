"use client";

import { useState, type FormEvent } from "react";
import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { TextField } from "@/components/ui/text-field";
import { colleagueAgainMutation, inviteColleagueMutation, revokeColleagueMutation } from "@/lib/companies/options";
import type { CompanyInvitation } from "@/lib/companies/types";
import { worksWords } from "@/lib/parties/words";
import { NO_WORKS, WorksFields } from "./works-fields";

const EMPTY = { email: "", name: "", ...NO_WORKS };

/** Invites a colleague, and shows the letters that are still open. */
export function ColleaguePart({ companyId, invitations }: { companyId: string; invitations: CompanyInvitation[] }) {
  const [given, setGiven] = useState(EMPTY);
  const invite = useWrite(inviteColleagueMutation(companyId));
  const submit = (event: FormEvent) => {
    event.preventDefault();
    invite.send(given, () => setGiven(EMPTY));
  };
  return (
    <Sheet title="Invite a colleague" lead="They get a letter that works once, for 14 days. Who joins by it sees all of the company’s moves.">
      <form noValidate onSubmit={submit} className="grid max-w-[520px] gap-4">
        <FormErrors errors={invite.faults.list} title="Nobody was invited." />
        {invite.done && given === EMPTY && <Notice kind="done" live="status">The letter is on its way.</Notice>}
        <TextField name="email" label="E-mail address" type="email" autoComplete="off" required value={given.email} onChange={(event) => setGiven({ ...given, email: event.target.value })} error={invite.faults.field("email")} />
        <TextField name="name" label="Name" hint="Left empty, the letter asks for it." autoComplete="off" value={given.name} onChange={(event) => setGiven({ ...given, name: event.target.value })} error={invite.faults.field("name")} />
        <WorksFields value={given} onChange={(works) => setGiven({ ...given, ...works })} idPrefix="colleague" />
        <div><Button type="submit" busy={invite.busy} busyWords="Sending…">Send the letter</Button></div>
      </form>
      {invitations.length > 0 && <Letters companyId={companyId} invitations={invitations} />}
    </Sheet>
  );
}

function Letters({ companyId, invitations }: { companyId: string; invitations: CompanyInvitation[] }) {
  const again = useWrite(colleagueAgainMutation(companyId));
  const revoke = useWrite(revokeColleagueMutation(companyId));
  return (
    <div className="mt-6">
      <Table caption="Open letters" captionShown stack>
        <thead>
          <tr><Th>To</Th><Th>Work</Th><Th>Good until</Th><Th><span className="sr-only">Changes</span></Th></tr>
        </thead>
        <tbody>
          {invitations.map((letter) => (
            <tr key={letter.invitationId}>
              <Td label="To"><b>{letter.name ?? letter.email}</b>{letter.name && <span className="block text-ink-2 [overflow-wrap:anywhere]">{letter.email}</span>}</Td>
              <Td label="Work">{worksWords(letter) || "none"}</Td>
              <Td label="Good until">{letter.expired ? <State tone="oxide">Too old</State> : <span className="figure">{letter.expiresAt.slice(0, 10)}</span>}</Td>
              <Td>
                <div className="flex flex-wrap gap-x-4">
                  <ConfirmButton opener="Send again" of={`to ${letter.email}`} title="Send the letter again?" confirm="Send again" body={{ invitationId: letter.invitationId }} write={again}>
                    <p>A new letter goes to {letter.email}. The link in the one before stops working.</p>
                  </ConfirmButton>
                  <ConfirmButton opener="Revoke" of={`the letter to ${letter.email}`} title="Revoke the letter?" confirm="Revoke" body={{ invitationId: letter.invitationId }} write={revoke}>
                    <p>The link that went to {letter.email} stops working.</p>
                  </ConfirmButton>
                </div>
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
