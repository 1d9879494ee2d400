"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { DateField } from "@/components/ui/date-field";
import { TextArea } from "@/components/ui/text-field";
import { CallError } from "@/lib/entry/fetcher";
import type { PlaceForm } from "@/lib/moves/draft";
import { caseOptions, editMoveMutation, moveKeys } from "@/lib/moves/options";
import type { CaseFile } from "@/lib/moves/types";
import { PlaceFields } from "../new/ends-section";
import { useAttemptKey } from "../use-attempt-key";
import { fieldErrorOf, SaveState } from "./save-state";

type Ends = { origin: PlaceForm; destination: PlaceForm; wantedFrom: string; wantedTo: string; note: string };

const EXAMPLES = { name: "Shop, yard, siding or customer track.", place: "As a railroad timetable names it." };

/** What the owner changes of the ends of the move. */
export function EndsForm({ file: current, onDone }: { file: CaseFile; onDone: () => void }) {
  const client = useQueryClient();
  // As it was when the form was opened; the case goes on being read behind it, and a change there must not pass for seen.
  const [file, setFile] = useState(current);
  const [touched, setTouched] = useState<Partial<Ends>>({});
  const [key, renewKey] = useAttemptKey();
  const save = useMutation({
    ...editMoveMutation(file.moveId),
    onSuccess: async () => {
      renewKey();
      await client.invalidateQueries({ queryKey: moveKeys.case(file.moveId) });
      onDone();
    },
    onError: async (error) => {
      renewKey();
      if (error instanceof CallError && error.status === 409) setFile(await client.fetchQuery({ ...caseOptions(file.moveId), staleTime: 0 }));
    },
  });
  const values: Ends = { origin: file.origin, destination: file.destination, wantedFrom: file.wantedFrom ?? "", wantedTo: file.wantedTo ?? "", note: file.note ?? "", ...touched };
  const set = (patch: Partial<Ends>) => setTouched({ ...touched, ...patch });
  const errorOf = fieldErrorOf(save.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (!save.isPending) save.mutate({ input: { ...values, version: file.version }, key });
  };
  const [first, last] = [file.legs[0], file.legs.at(-1)];
  return (
    <form noValidate onSubmit={submit} className="mt-5 grid gap-5">
      <SaveState error={save.error} saved={false} />
      <div className="grid gap-8 sm:grid-cols-2">
        <PlaceFields path="origin" title="Where it stands" place={values.origin} onChange={(origin) => set({ origin })} errorOf={errorOf} examples={{ ...EXAMPLES, name: first?.fixedBecause ?? EXAMPLES.name }} disabled={Boolean(first?.fixedBecause)} />
        <PlaceFields path="destination" title="Where it goes" place={values.destination} onChange={(destination) => set({ destination })} errorOf={errorOf} examples={{ ...EXAMPLES, name: last?.fixedBecause ?? EXAMPLES.name }} disabled={Boolean(last?.fixedBecause)} />
        <DateField name="wantedFrom" label="Not before" value={values.wantedFrom} onChange={(event) => set({ wantedFrom: event.target.value })} error={errorOf("wantedFrom")} />
        <DateField name="wantedTo" label="Wanted by" value={values.wantedTo} onChange={(event) => set({ wantedTo: event.target.value })} error={errorOf("wantedTo")} />
      </div>
      <TextArea name="note" label="What everybody on the case should know" maxLength={2000} value={values.note} onChange={(event) => set({ note: event.target.value })} error={errorOf("note")} />
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" busy={save.isPending}>
          Save
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Leave it as it is
        </Button>
      </div>
    </form>
  );
}
