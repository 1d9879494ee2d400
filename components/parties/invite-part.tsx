"use client";

import { useState, type FormEvent } from "react";
import { useWrite } from "@/components/account/use-write";
import { NO_WORKS, WorksFields } from "@/components/companies/works-fields";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { SelectField } from "@/components/ui/select-field";
import { Sheet } from "@/components/ui/sheet";
import { TextField } from "@/components/ui/text-field";
import { slotsOf, type SlotChoice } from "@/lib/parties/choices";
import { invitePartyMutation } from "@/lib/parties/options";
import type { PeopleView } from "@/lib/parties/types";

const NEW = "new";
const EMPTY = { slot: "", company: "", companyName: "", email: "", name: "", ...NO_WORKS };

type InvitePartProps = { moveId: string; people: PeopleView; start: string };

/** The form filled for a part: its company is the one that holds it, or is named for it. */
const filledFor = (slots: SlotChoice[], value: string, typed = EMPTY) => {
  const slot = slots.find((one) => one.value === value);
  return { ...typed, slot: value, company: slot?.companyId || NEW, companyName: slot?.companyName ?? "" };
};

/** Invites a company, by one of its people, into a part of the move; `start` is the part that was asked for in the table. */
export function InvitePart({ moveId, people, start }: InvitePartProps) {
  const slots = slotsOf(people);
  const [given, setGiven] = useState(() => (start ? filledFor(slots, start) : EMPTY));
  const invite = useWrite(invitePartyMutation(moveId));
  const slot = slots.find((one) => one.value === given.slot);
  const holder = slot ? people.parties.find((one) => one.part === slot.part && one.legId === (slot.legId || null)) : undefined;
  const own = people.known.some((one) => one.own && one.companyId === given.company);
  const { field } = invite.faults;
  const type = (name: "companyName" | "email" | "name") => ({ name, value: given[name], error: field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const { slot: _slot, company, companyName, ...rest } = given;
    const isNew = company === NEW || company === "";
    const works = slot?.part === "carrier" ? {} : NO_WORKS;
    invite.send({ ...rest, ...works, part: slot?.part ?? ("" as "carrier"), legId: slot?.legId ?? "", companyId: isNew ? "" : company, companyName: isNew ? companyName : "" }, () => setGiven(EMPTY));
  };
  return (
    <Sheet bare level={3} title="Invite" lead="Name the company and one of its people. They get a letter whose link shows what they are invited to; one button, and they are in. They need no account and no password." className="mt-8">
      <form noValidate onSubmit={submit} className="grid max-w-[560px] gap-4">
        <FormErrors errors={invite.faults.list.map((fault) => (fault.name === "part" ? { ...fault, name: "slot" } : fault))} title="Nobody was invited." />
        {invite.done && given === EMPTY && <Notice kind="done" live="status">Done. The list above shows it.</Notice>}
        <SelectField name="slot" label="Part" required blank="choose" choices={slots} value={given.slot} onChange={(event) => setGiven(filledFor(slots, event.target.value, given))} error={field("part") ?? field("legId")} />
        {holder ? (
          <p className="text-14 text-ink-2">{holder.companyName} has this part; you invite one more of its people. For another company, take this one off first{holder.part === "payer" ? ", or choose it below" : ""}.</p>
        ) : null}
        {(!holder || holder.part === "payer") && slot && (
          <>
            <SelectField name="companyId" label="Company" choices={[...people.known.map((one) => ({ value: one.companyId, label: one.own ? `${one.name} (yours)` : one.name })), { value: NEW, label: "Another company, by name" }]} value={given.company || NEW} onChange={(event) => setGiven({ ...given, company: event.target.value })} error={field("companyId")} />
            {given.company === NEW && <TextField {...type("companyName")} label="Name of the company" autoComplete="off" required />}
          </>
        )}
        <TextField {...type("email")} label="E-mail address" type="email" autoComplete="off" required={!own} hint={own ? "May stay empty: your own company takes the part without a letter." : undefined} />
        <TextField {...type("name")} label="Name of the person" autoComplete="off" hint="Left empty, the letter asks for it." />
        {slot?.part === "carrier" && <WorksFields value={given} onChange={(works) => setGiven({ ...given, ...works })} legend="What this person does for the carrier, required" error={field("works")} />}
        <div><Button type="submit" busy={invite.busy} busyWords="Sending…">{own && !given.email ? "Give it the part" : "Send the letter"}</Button></div>
      </form>
      <Notice kind="info" title="A carrier that will not come on board" className="mt-5 max-w-[66ch]">
        <p>It needs no invitation. Its name stands on its leg, and owner or contractor enter what it says on paper, by e-mail or by phone: inspections, findings, acceptance, charges, instruction. Each such entry names its source and is never shown as the carrier’s signature. The whole move can be run so.</p>
      </Notice>
    </Sheet>
  );
}
