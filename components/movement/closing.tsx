"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextLink } from "@/components/ui/link-button";
import { TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { formatWhen } from "@/lib/moves/when";
import { closeMoveMutation } from "@/lib/movement/options";
import { closingStatement } from "@/lib/movement/rules";
import type { Movement } from "@/lib/movement/types";
import { routes } from "@/lib/routes";
import { focusOpened, type FormSwitch } from "./open-form";

function CloseForm({ moveId, unit, onDone }: { moveId: string; unit: string; onDone: () => void }) {
  const [name, setName] = useState("");
  const intent = useIntent();
  const close = useMutation(closeMoveMutation(moveId));
  const faults = faultsOf(close.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    close.mutate({ key: intent.key({ name }), body: { name } }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none grid grid-cols-[minmax(0,1fr)] max-w-[60ch] gap-3 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="The move was not closed." />
      <p className="text-15">{closingStatement(unit)}</p>
      <p className="text-14 text-ink-2">Nothing on the case changes any more afterwards. Everybody who was part of it can still read it.</p>
      <TextField name="name" label="Your name" required autoComplete="name" value={name} onChange={(event) => setName(event.target.value)} error={faults.field("name")} />
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={close.isPending} busyWords="Signing…">
          Sign and close
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Not yet
        </Button>
      </div>
    </form>
  );
}

/** What still keeps the case open, or the signature that ends it. */
export function Closing({ moveId, movement, switcher }: { moveId: string; movement: Movement; switcher: FormSwitch }) {
  const { closing, unit, destination, restore } = movement;
  if (closing.closedAt) return <p className="text-15">Closed {formatWhen(closing.closedAt, destination.zone)}. The case stays readable.</p>;
  if (closing.missing.length > 0) {
    return (
      <>
        <p className="text-14">The move is closed when these are settled:</p>
        <ul className="mt-1 list-disc pl-5 text-14">
          {closing.missing.map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
        {restore.left > 0 && movement.arrival && (
          <p className="mt-2 text-14">
            <TextLink href={routes.prep(moveId)}>Go to the restore list</TextLink>
          </p>
        )}
      </>
    );
  }
  if (!closing.may) return <p className="text-14">Everything is settled. Owner or receiver sign and close the move.</p>;
  if (switcher.open?.form === "closing") return <CloseForm moveId={moveId} unit={unit} onDone={() => switcher.show(null)} />;
  return <Button onClick={() => switcher.show({ form: "closing" })}>Close the move…</Button>;
}
