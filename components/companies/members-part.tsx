"use client";

import { useState, type FormEvent } from "react";
import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { CheckField } from "@/components/ui/check-field";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import { Sheet } from "@/components/ui/sheet";
import { Table, Td, Th } from "@/components/ui/table";
import { changeMemberMutation, removeMemberMutation } from "@/lib/companies/options";
import type { CompanyView, MemberView } from "@/lib/companies/types";
import { worksWords } from "@/lib/parties/words";
import { WorksFields } from "./works-fields";

/** Everybody in the company, with what they do for it. */
export function MembersPart({ company: { companyId, manages, members } }: { company: CompanyView }) {
  const remove = useWrite(removeMemberMutation(companyId));
  return (
    <Sheet title="People" lead="All of them see the company’s moves. Work counts where the company is a carrier; elsewhere everybody acts for it.">
      <Table caption="People of the company" stack>
        <thead>
          <tr><Th>Name</Th><Th>Work</Th><Th>Since</Th><Th><span className="sr-only">Changes</span></Th></tr>
        </thead>
        <tbody>
          {members.map((member) => (
            <tr key={member.userId}>
              <Td label="Name"><b>{member.name}</b>{member.self ? " (you)" : ""}{member.email && <span className="block text-ink-2 [overflow-wrap:anywhere]">{member.email}</span>}</Td>
              <Td label="Work">{[member.manager ? "manager" : "", worksWords(member)].filter(Boolean).join(", ") || "none"}</Td>
              <Td label="Since" mono>{member.joinedAt.slice(0, 10)}</Td>
              <Td>
                <div className="flex flex-wrap gap-x-4">
                  {manages && <WorkDialog companyId={companyId} member={member} />}
                  {(manages || member.self) && (
                    <ConfirmButton opener={member.self ? "Leave" : "Remove"} of={member.self ? undefined : member.name} title={member.self ? "Leave the company?" : `Remove ${member.name}?`} confirm={member.self ? "Leave" : "Remove"} body={{ userId: member.userId }} write={remove}>
                      <p>{member.self ? "You stop" : "They stop"} seeing the company’s moves at once. What was signed stays signed under that name.</p>
                    </ConfirmButton>
                  )}
                </div>
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Sheet>
  );
}

function WorkDialog({ companyId, member }: { companyId: string; member: MemberView }) {
  const [open, setOpen] = useState(false);
  const [manager, setManager] = useState(member.manager);
  const [works, setWorks] = useState({ inspects: member.inspects, bills: member.bills, dispatches: member.dispatches });
  const change = useWrite(changeMemberMutation(companyId));
  const close = () => {
    setOpen(false);
    change.forget();
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    change.send({ userId: member.userId, manager, ...works }, close);
  };
  return (
    <>
      <Button variant="plain" size="small" onClick={() => setOpen(true)}>Change work<span className="sr-only"> of {member.name}</span></Button>
      <Dialog open={open} onClose={close} title={`Work of ${member.name}`}>
        <form noValidate onSubmit={submit} className="grid gap-4">
          <FormErrors errors={change.faults.list} />
          <WorksFields value={works} onChange={setWorks} idPrefix={`work-${member.userId}`} />
          <CheckField id={`manager-${member.userId}`} name="manager" label="Manages the company: admits, changes and removes its people" checked={manager} onChange={(event) => setManager(event.target.checked)} />
          <div className="flex flex-wrap gap-2.5">
            <Button type="submit" busy={change.busy}>Save</Button>
            <Button variant="plain" onClick={close}>Not now</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
