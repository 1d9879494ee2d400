"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { PhotoField } from "@/components/evidence/photo-field";
import { Button } from "@/components/ui/button";
import { DateField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextLink } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { dayAt } from "@/lib/moves/when";
import { recordArrivalMutation } from "@/lib/movement/options";
import { arrivalStatement } from "@/lib/movement/rules";
import type { Movement } from "@/lib/movement/types";
import { routes } from "@/lib/routes";
import { focusOpened } from "./open-form";

/** The receiver's look at the unit: what it is like, what is missing, the same views as at departure, and a name under it. */
export function ArrivalForm({ moveId, movement, onDone }: { moveId: string; movement: Movement; onDone: () => void }) {
  const { destination, unit, at } = movement;
  const [given, setGiven] = useState({ arrivedOn: dayAt(at, destination.zone), condition: "", missing: "", name: "" });
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  const intent = useIntent();
  const record = useMutation(recordArrivalMutation(moveId));
  const faults = faultsOf(record.error);
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { ...given, photoIds: photos.map((photo) => photo.id) };
    record.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none grid grid-cols-[minmax(0,1fr)] max-w-[680px] gap-3.5 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="The arrival was not recorded." />
      <Notice title="Before you go near it">
        Hand brake applied and proven to hold, wheels chocked, protected from other movements as your local rules say. Air may still be stored in reservoirs and brake cylinders.
      </Notice>
      <p className="text-14">
        Compare with the{" "}
        <TextLink href={routes.prep(moveId)} target="_blank">
          photos from before departure
        </TextLink>
        , which open beside this page.
      </p>
      <DateField {...type("arrivedOn")} label="Looked over on" required />
      <TextArea {...type("condition")} label="Condition" hint="Compared with the photos from departure: wheels, couplers, hoses, cab, glass." required rows={3} />
      <TextArea {...type("missing")} label="Missing or damaged" hint="Leave empty when nothing is." rows={2} />
      <PhotoField moveId={moveId} label="Photos, at least one" hint="The same views as at departure, and each thing that is missing or damaged." value={photos} onChange={setPhotos} error={faults.field("photoIds")} />
      <p className="border-l-[5px] border-ink pl-3 text-15">{arrivalStatement(unit, destination.name)}</p>
      <TextField {...type("name")} label="Your name" required autoComplete="name" />
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" size="large" busy={record.isPending} busyWords="Signing…">
          Sign the arrival
        </Button>
        <Button variant="ghost" size="large" onClick={onDone}>
          Not now
        </Button>
      </div>
    </form>
  );
}
