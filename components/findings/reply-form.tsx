"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { PhotoField } from "@/components/evidence/photo-field";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextArea } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { findingActMutation } from "@/lib/findings/options";
import type { FindingAct } from "@/lib/findings/rules";
import type { FindingDetail } from "@/lib/findings/types";

export type ReplyAct = Exclude<FindingAct, "answer">;

const WORDS: Record<ReplyAct, { title: string; text: string; required: boolean; send: string; refused: string }> = {
  "not-cleared": { title: "Not cleared", text: "Why the answer does not clear it", required: true, send: "Not cleared", refused: "Not sent." },
  clear: { title: "Clear the finding", text: "Note", required: false, send: "Clear finding", refused: "Not cleared." },
  withdraw: { title: "Withdraw the finding", text: "Why it is withdrawn", required: true, send: "Withdraw it", refused: "Not withdrawn." },
};

/** What the inspector says to an answer, or what is entered for one who is not on board. */
export function ReplyForm({ finding, act, onDone }: { finding: FindingDetail; act: ReplyAct; onDone: () => void }) {
  const [text, setText] = useState("");
  const [wouldSatisfy, setWouldSatisfy] = useState("");
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  const [enteredFor, setEnteredFor] = useState(EMPTY_ENTERED_FOR);
  // What the person has read; an answer that comes meanwhile must be looked at, not cleared unseen.
  const [version] = useState(finding.version);
  const intent = useIntent();
  const reply = useMutation(findingActMutation(finding.moveId, finding.id, act));
  const faults = faultsOf(reply.error);
  const entering = finding.may[act] === "enter";
  const words = WORDS[act];
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const more = act === "not-cleared" ? { wouldSatisfy, photoIds: photos.map(({ id }) => id) } : {};
    const body = { version, text, ...more, enteredFor: entering ? enteredFor : null };
    reply.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form noValidate onSubmit={submit} aria-label={words.title} className="grid gap-4">
      <h3 className="text-17 font-[680]">{words.title}</h3>
      <FormErrors errors={faults.list} title={words.refused} />
      {act === "clear" && <p className="text-14 text-ink-2">Nothing more is said about a finding that is cleared. The rounds stay to be read.</p>}
      {entering && <EnteredForFields value={enteredFor} onChange={setEnteredFor} errors={faults.field} carrierName={finding.carrierName} />}
      <TextArea name="text" label={words.text} required={words.required} rows={3} value={text} onChange={(event) => setText(event.target.value)} error={faults.field("text")} />
      {act === "not-cleared" && (
        <>
          <TextArea name="wouldSatisfy" label="What would satisfy" hint="Part, measurement, condition or photo, so that one more answer is enough." required rows={3} value={wouldSatisfy} onChange={(event) => setWouldSatisfy(event.target.value)} error={faults.field("wouldSatisfy")} />
          <PhotoField moveId={finding.moveId} label="Photos" value={photos} onChange={setPhotos} error={faults.field("photoIds")} />
        </>
      )}
      <ActionBar>
        <Button variant="ghost" onClick={onDone}>Not now</Button>
        <Button type="submit" busy={reply.isPending}>{words.send}</Button>
      </ActionBar>
    </form>
  );
}
