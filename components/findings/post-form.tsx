"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR, type EnteredForValue } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { PlaceField } from "@/components/drawing/place-field";
import { PhotoField } from "@/components/evidence/photo-field";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { RadioGroup } from "@/components/ui/check-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { SelectField } from "@/components/ui/select-field";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { COMPONENT_GROUPS, COMPONENTS, findComponent } from "@/lib/findings/components";
import { postFindingMutation } from "@/lib/findings/options";
import { usualPlaces } from "@/lib/findings/places";
import type { FoundUnit } from "@/lib/findings/types";
import { SEVERITIES, SEVERITY_LABELS, type Severity } from "@/lib/findings/vocabulary";
import { airCaution } from "@/lib/inspections/rules";
import type { InspectedLeg, VisitView } from "@/lib/inspections/types";
import { formatDay } from "@/lib/moves/when";
import { routes } from "@/lib/routes";

const COMPONENT_CHOICES = COMPONENT_GROUPS.map(({ id, label }) => ({ group: label, choices: COMPONENTS.filter((one) => one.group === id).map((one) => ({ value: one.id, label: one.label })) }));

const SEVERITY_HINTS: Record<Severity, string> = {
  "stops-move": "The unit is not accepted while this is open. An acceptance that stands is withdrawn.",
  "answer-before-pickup": "The unit can be accepted, but not pulled before this has an answer.",
  note: "For everybody to know. It can be answered and need not be.",
};
const SEVERITY_CHOICES = SEVERITIES.map((value) => ({ value, label: SEVERITY_LABELS[value], hint: SEVERITY_HINTS[value] }));

/** At most this many usual places are named in the hint; a longer list says nothing. */
const HINTED_PLACES = 4;

export type PostFormProps = { moveId: string; leg: InspectedLeg; visitId: string; unit: FoundUnit; entering: boolean };

/** Posts a finding: what, where on the unit, what was seen or measured, with its photos and what it means for the move. */
export function PostForm({ moveId, leg, visitId, unit, entering }: PostFormProps) {
  const router = useRouter();
  const [given, setGiven] = useState({ inspectionId: visitId, componentId: "", placeId: "", placeNote: "", observed: "", reading: "", condition: "", severity: "", noPhotoReason: "" });
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  // Findings mostly come in with the news of the visit itself.
  const [enteredFor, setEnteredFor] = useState<EnteredForValue>(() => heardLike(leg.visits.find((one) => one.id === visitId)));
  const intent = useIntent();
  const post = useMutation(postFindingMutation(moveId));
  const faults = faultsOf(post.error);
  const set = (change: Partial<typeof given>) => setGiven({ ...given, ...change });
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => set({ [name]: event.target.value }) });
  const visit = leg.visits.find((one) => one.id === given.inspectionId);
  const component = findComponent(given.componentId);
  const caution = visit ? airCaution(visit.air, component?.group === "brakes") : null;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { ...given, photoIds: photos.map(({ id }) => id), enteredFor: entering ? enteredFor : null };
    post.mutate({ key: intent.key(body), body }, { onSuccess: ({ findingId }) => { intent.done(); router.push(routes.finding(moveId, findingId)); } });
  };
  return (
    <form noValidate onSubmit={submit} className="grid max-w-[640px] gap-5">
      <FormErrors errors={faults.list} title="Not posted." />
      {entering && <EnteredForFields value={enteredFor} onChange={setEnteredFor} errors={faults.field} carrierName={leg.carrierName} />}
      {leg.visits.length > 1 && <SelectField {...type("inspectionId")} label="Seen on the visit" required choices={leg.visits.map((one) => ({ value: one.id, label: visitLabel(one) }))} />}
      <SelectField {...type("componentId")} label="What it is about" required blank="Choose a part" choices={COMPONENT_CHOICES} />
      {caution && <Notice title="Brakes without air">{caution}</Notice>}
      <WherePart unit={unit} componentId={given.componentId} value={given.placeId} onChange={(placeId) => set({ placeId })} error={faults.field("placeId")} />
      <TextField {...type("placeNote")} label={unit.form ? "More exactly" : "Where on the unit"} hint="For instance: inner spring, second from the outside." autoComplete="off" />
      <TextArea {...type("observed")} label="What was seen or measured" required rows={3} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField {...type("reading")} label="Reading with its unit" hint="As read, for instance 5 7/16 in." mono autoComplete="off" />
        <TextField {...type("condition")} label="Under which condition" hint="For instance: brakes applied." autoComplete="off" />
      </div>
      <PhotoField moveId={moveId} label="Photos" hint="A photo that shows the part and the gauge saves a second visit." value={photos} onChange={setPhotos} error={faults.field("photoIds")} />
      {photos.length === 0 && <TextField {...type("noPhotoReason")} label="Or why there is no photo" autoComplete="off" />}
      <RadioGroup name="severity" label="What it means for the move" required choices={SEVERITY_CHOICES} value={given.severity} error={faults.field("severity")} onChange={(event) => set({ severity: event.target.value })} />
      <ActionBar>
        <LinkButton href={routes.findings(moveId)} variant="ghost">Back</LinkButton>
        <Button type="submit" busy={post.isPending} busyWords="Posting…">Post the finding</Button>
      </ActionBar>
    </form>
  );
}

const heardLike = (visit: VisitView | undefined): EnteredForValue =>
  visit?.enteredFor ? { source: visit.enteredFor.source, heardOn: visit.enteredFor.heardOn, saidBy: visit.enteredFor.saidBy, reference: visit.enteredFor.reference ?? "" } : EMPTY_ENTERED_FOR;

const visitLabel = ({ number, visitedOn, inspectorName }: VisitView) => `Visit ${number}, ${formatDay(visitedOn)}, ${inspectorName}`;

type WherePartProps = { unit: FoundUnit; componentId: string; value: string; onChange: (placeId: string) => void; error: string | null };

function WherePart({ unit, componentId, value, onChange, error }: WherePartProps) {
  const component = findComponent(componentId);
  if (component && component.places.length === 0) return <p className="text-14 text-ink-2">This concerns the whole unit; it needs no place.</p>;
  if (!unit.form) return null;
  const usual = component ? usualPlaces(unit.form.axles, component.places) : [];
  const hint = usual.length > 0 && usual.length <= HINTED_PLACES ? `Usually: ${usual.map(({ name }) => name).join("; ")}.` : "Wheels are numbered from the end marked F.";
  return <PlaceField form={unit.form} name="placeId" label="Where on the unit" hint={hint} value={value} onChange={onChange} error={error} />;
}
