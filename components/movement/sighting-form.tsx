"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { PhotoField } from "@/components/evidence/photo-field";
import { ZoneField } from "@/components/moves/zone-field";
import { Button } from "@/components/ui/button";
import { RadioGroup } from "@/components/ui/check-field";
import { TimeField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { Notice } from "@/components/ui/notice";
import { SelectField } from "@/components/ui/select-field";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { EVENT_CODES, eventCodeText } from "@/lib/movement/event-codes";
import { makeSightingMutation } from "@/lib/movement/options";
import { kindsForReceiver } from "@/lib/movement/rules";
import type { Movement, MovementLeg, SightingView } from "@/lib/movement/types";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import { focusOpened } from "./open-form";
import { useSighting } from "./use-sighting";

type Props = { moveId: string; leg: MovementLeg; destination: Movement["destination"]; corrects?: SightingView; onDone: () => void };

const isTakeOver = (kind: string) => kind === "pulled" || kind === "received";

/** Take-over asks for every condition; what is still missing comes back as a list. */
function TakeOverNotice({ kind }: { kind: string }) {
  if (!isTakeOver(kind)) return null;
  return (
    <Notice>
      {kind === "pulled"
        ? "Record this once the carrier’s engine has pulled the unit. Until it is coupled the hand brake stays applied and the wheels stay chocked. It is refused while a condition of this leg is not met."
        : "Record this once the unit has been received at the interchange. It is refused while a condition of this leg is not met."}
    </Notice>
  );
}

/** Where the unit was, when, by the clock there, and who says so; or the same anew for one that was wrong. */
export function SightingForm({ moveId, leg, destination, corrects, onDone }: Props) {
  const both = leg.may.enterFor && leg.may.asReceiver;
  const [own, setOwn] = useState(false);
  const entering = leg.may.enterFor && !own;
  const offered = entering || !both ? leg.kinds : kindsForReceiver(leg.kinds, leg, leg.seq);
  const kinds = corrects && !offered.includes(corrects.kind) ? [corrects.kind, ...offered] : offered;
  const sighting = useSighting(leg, kinds, destination, corrects ?? null);
  const { typed, set } = sighting;
  const intent = useIntent();
  const make = useMutation(makeSightingMutation(moveId));
  const faults = faultsOf(make.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { legId: leg.legId, ...typed, photoIds: sighting.photos.map((photo) => photo.id), corrects: corrects?.id ?? null, enteredFor: entering ? sighting.heard : null };
    make.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none my-3 grid grid-cols-[minmax(0,1fr)] gap-3.5 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title={corrects ? "Not corrected." : "Not recorded."} />
      {both && (
        <RadioGroup name="how" label="How do you know?" inline value={own ? "own" : "told"} onChange={(event) => setOwn(event.target.value === "own")}
          choices={[{ value: "told", label: `${leg.carrierName} told me` }, { value: "own", label: "I saw it, as the receiver" }]} />
      )}
      <SelectField
        name="kind" label="What happened" required blank="choose" value={typed.kind} error={faults.field("kind")}
        choices={kinds.map((kind) => ({ value: kind, label: [EVENT_CODES[kind].label, eventCodeText(kind)].filter(Boolean).join(", ") }))}
        onChange={(event) => {
          const kind = SIGHTING_KINDS.find((one) => one === event.target.value);
          if (kind) sighting.choose(kind);
          else set({ kind: "" });
        }}
      />
      <TakeOverNotice kind={typed.kind} />
      <div className="grid gap-3.5 sm:grid-cols-2">
        <TextField name="place" label="Where" required value={typed.place} error={faults.field("place")} autoComplete="off" onChange={(event) => sighting.setPlace(event.target.value)} />
        <ZoneField name="zone" required value={typed.zone} error={faults.field("zone")} onChange={sighting.setZone} />
      </div>
      <TimeField name="occurredAt" label="When, by the clock there" required withDate zone={sighting.zoneShort} value={typed.occurredAt} error={faults.field("occurredAt")} onChange={(event) => sighting.setTime(event.target.value)} />
      <TextField name="train" label="Train" value={typed.train} error={faults.field("train")} autoComplete="off" onChange={(event) => set({ train: event.target.value })} />
      <TextArea name="note" label="Note" hint={typed.kind === "bad-ordered" || typed.kind === "held" ? "The reason as it was given, and for how long." : undefined} rows={2} value={typed.note} error={faults.field("note")} onChange={(event) => set({ note: event.target.value })} />
      <PhotoField moveId={moveId} label="Photos" value={sighting.photos} onChange={sighting.setPhotos} error={faults.field("photoIds")} />
      {entering && <EnteredForFields value={sighting.heard} onChange={sighting.setHeard} errors={faults.field} carrierName={leg.carrierName} />}
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" size="large" busy={make.isPending}>
          {corrects ? "Record the correction" : "Record it"}
        </Button>
        <Button variant="ghost" size="large" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
