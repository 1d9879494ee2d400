"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { PhotoField } from "@/components/evidence/photo-field";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { prepItemMutation } from "@/lib/prep/options";
import type { PrepItem } from "@/lib/prep/types";

/** Evidence for one item, and the button that says it is done; or why it does not apply. */
export function FinishForm({ moveId, item, onDone }: { moveId: string; item: PrepItem; onDone: () => void }) {
  const [skipping, setSkipping] = useState(false);
  return skipping ? <SkipForm {...{ moveId, item, onDone }} onBack={() => setSkipping(false)} /> : <DoneForm {...{ moveId, item, onDone }} onSkip={() => setSkipping(true)} />;
}

function DoneForm({ moveId, item, onDone, onSkip }: { moveId: string; item: PrepItem; onDone: () => void; onSkip: () => void }) {
  const [given, setGiven] = useState({ value: item.value ?? "", tagNumber: item.tagNumber ?? "", note: item.note ?? "" });
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  const intent = useIntent();
  const finish = useMutation(prepItemMutation(moveId));
  const faults = faultsOf(finish.error);
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { version: item.version, ...given, photoIds: photos.map((photo) => photo.id) };
    // Awaited, not given as a callback: once the list is read anew this form is gone, and callbacks of a form that is gone are not called.
    void finish.mutateAsync({ itemId: item.id, act: "done", key: intent.key(body), body }).then(() => { intent.done(); onDone(); }, () => undefined);
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-3">
      <FormErrors errors={faults.list} />
      {item.valueLabel && <TextField {...type("value")} id={`value-${item.id}`} label={`${item.valueLabel}${item.valueUnit ? `, in ${item.valueUnit}` : ""}`} required autoComplete="off" />}
      {item.needsTag && <TextField {...type("tagNumber")} id={`tagNumber-${item.id}`} label="Tag number" required mono autoComplete="off" />}
      <PhotoField moveId={moveId} label={item.needsPhoto ? "Photos, at least one" : "Photos"} value={photos} onChange={setPhotos} error={faults.field("photoIds")} />
      <TextArea {...type("note")} id={`note-${item.id}`} label="Note" rows={2} />
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={finish.isPending} size="large">Done</Button>
        <Button variant="plain" onClick={onSkip}>Does not apply to this unit</Button>
      </div>
    </form>
  );
}

function SkipForm({ moveId, item, onDone, onBack }: { moveId: string; item: PrepItem; onDone: () => void; onBack: () => void }) {
  const [why, setWhy] = useState("");
  const intent = useIntent();
  const skip = useMutation(prepItemMutation(moveId));
  const faults = faultsOf(skip.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { version: item.version, why };
    void skip.mutateAsync({ itemId: item.id, act: "skip", key: intent.key(body), body }).then(() => { intent.done(); onDone(); }, () => undefined);
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-3">
      <FormErrors errors={faults.list} />
      <TextField name="why" id={`why-${item.id}`} label="Why it does not apply" hint="For instance: none fitted." required value={why} onChange={(event) => setWhy(event.target.value)} error={faults.field("why")} />
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={skip.isPending}>It does not apply</Button>
        <Button variant="ghost" onClick={onBack}>Back</Button>
      </div>
    </form>
  );
}
