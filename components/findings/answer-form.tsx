"use client";

import { useMutation } from "@tanstack/react-query";
import { type FormEvent } from "react";
import { useDraft } from "@/components/access/drafts";
import { PhotoField } from "@/components/evidence/photo-field";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { findingActMutation } from "@/lib/findings/options";
import type { FindingDetail } from "@/lib/findings/types";

export type AnswerFormProps = { finding: FindingDetail; userId: string; onDone: () => void };

const EMPTY: { text: string; reading: string; photos: PhotoView[] } = { text: "", reading: "", photos: [] };

/** The contractor's answer. What is typed here survives a reload until it is sent. */
export function AnswerForm({ finding, userId, onDone }: AnswerFormProps) {
  const { value, change, forget, restored } = useDraft(`answer:${userId}:${finding.id}`, EMPTY);
  const intent = useIntent();
  const answer = useMutation(findingActMutation(finding.moveId, finding.id, "answer"));
  const faults = faultsOf(answer.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { version: finding.version, text: value.text, reading: value.reading, photoIds: value.photos.map(({ id }) => id) };
    answer.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); forget(); onDone(); } });
  };
  return (
    <form noValidate onSubmit={submit} aria-label="Answer" className="grid gap-4">
      <FormErrors errors={faults.list} title="Not sent." />
      {restored && <p role="status" className="text-14 text-ink-2">What you had typed before is still here.</p>}
      <TextArea name="text" label="What was done, or found when looking" required rows={4} value={value.text} onChange={(event) => change({ ...value, text: event.target.value })} error={faults.field("text")} />
      <TextField name="reading" label="Reading now, with its unit" hint="If it was measured again, for instance 5 1/8 in." mono autoComplete="off" value={value.reading} onChange={(event) => change({ ...value, reading: event.target.value })} error={faults.field("reading")} />
      <PhotoField moveId={finding.moveId} label="Photos" value={value.photos} onChange={(photos) => change({ ...value, photos })} error={faults.field("photoIds")} />
      <ActionBar>
        <Button variant="ghost" onClick={onDone}>Not now</Button>
        <Button type="submit" busy={answer.isPending} busyWords="Sending…">Send the answer</Button>
      </ActionBar>
    </form>
  );
}
