"use client";

import { useState } from "react";
import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { admitMemberMutation, removeMemberMutation } from "@/lib/companies/options";
import type { GuestView } from "@/lib/companies/types";
import { NO_WORKS, WorksFields } from "./works-fields";

/** People whom another company invited in this company's name; nothing while there are none. */
export function GuestsPart({ companyId, guests }: { companyId: string; guests: GuestView[] }) {
  if (guests.length === 0) return null;
  return (
    <Sheet title="Ask to be admitted" lead="Another company invited them to a move in your company’s name. They see that move alone. Admit whom you know; they then see all of the company’s moves.">
      <ul className="divide-y divide-rule border-y border-rule">
        {guests.map((guest) => (
          <GuestRow key={guest.userId} companyId={companyId} guest={guest} />
        ))}
      </ul>
    </Sheet>
  );
}

function GuestRow({ companyId, guest }: { companyId: string; guest: GuestView }) {
  const [works, setWorks] = useState(NO_WORKS);
  const admit = useWrite(admitMemberMutation(companyId));
  const remove = useWrite(removeMemberMutation(companyId));
  return (
    <li className="grid gap-3 py-4">
      <div>
        <p className="text-15"><b>{guest.name}</b> <State tone="brass">Guest</State></p>
        <p className="text-14 text-ink-2">{guest.email}{guest.seats.length > 0 ? `; invited as ${guest.seats.join("; ")}` : ""}</p>
      </div>
      <FormErrors errors={admit.faults.list} title="Not admitted." />
      <WorksFields value={works} onChange={setWorks} idPrefix={`guest-${guest.userId}`} legend="Work in the company" />
      <div className="flex flex-wrap gap-2.5">
        <Button size="small" busy={admit.busy} onClick={() => admit.send({ userId: guest.userId, ...works })}>Admit {guest.name}</Button>
        <ConfirmButton opener="Not one of ours" of={guest.name} title={`Take ${guest.name} off?`} confirm="Take them off" body={{ userId: guest.userId }} write={remove}>
          <p>They stop seeing the move that they were invited to, at once.</p>
        </ConfirmButton>
      </div>
    </li>
  );
}
