"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { DateField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { LinkButton } from "@/components/ui/link-button";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { giveQuoteMutation } from "@/lib/fees/options";
import type { FeeLeg } from "@/lib/fees/types";
import { routes } from "@/lib/routes";
import { FeeLines, type TypedLine } from "./fee-lines";

const blankLine = (row: number): TypedLine => ({ row, kind: row === 0 ? "line-haul" : "", description: "", amount: "" });

/** Writes a quote for one leg. What was typed stays when the server refuses it. */
export function QuoteForm({ moveId, leg }: { moveId: string; leg: FeeLeg }) {
  const router = useRouter();
  const intent = useIntent();
  const give = useMutation(giveQuoteMutation(moveId));
  const faults = faultsOf(give.error);
  const [lines, setLines] = useState([blankLine(0)]);
  const [given, setGiven] = useState({ reference: "", goodUntil: "", note: "" });
  const [entry, setEntry] = useState(EMPTY_ENTERED_FOR);
  const entered = leg.may.quote === "entered";
  const field = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { legId: leg.legId, lines: lines.map(({ kind, description, amount }) => ({ kind, description, amount })), ...given, enteredFor: entered ? entry : null };
    give.mutate({ body, key: intent.key(body) }, {
      onSuccess: () => {
        intent.done();
        router.push(routes.fees(moveId));
      },
    });
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-5">
      <FormErrors errors={faults.list} title="The quote was not given." />
      <FeeLines lines={lines} onChange={setLines} onAdd={() => setLines([...lines, blankLine(Math.max(...lines.map((line) => line.row)) + 1)])} errorOf={faults.field} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField {...field("reference")} label="Your reference" hint="Quote or price authority number, where there is one." autoComplete="off" />
        <DateField {...field("goodUntil")} label="Good until" hint="The last day to agree, where the leg begins." />
      </div>
      <TextArea {...field("note")} label="Note to the payer" hint="What the price rests on and what it leaves out." rows={3} />
      {entered && <EnteredForFields value={entry} onChange={setEntry} errors={faults.field} carrierName={leg.carrierName} />}
      <ActionBar>
        <Button type="submit" size="large" busy={give.isPending} busyWords="Sending…">{entered ? "Enter the quote" : "Give the quote"}</Button>
        <LinkButton href={routes.fees(moveId)} variant="ghost" size="large">Back to fees</LinkButton>
      </ActionBar>
    </form>
  );
}
