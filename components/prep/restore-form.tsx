"use client";

import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { PhotoField } from "@/components/evidence/photo-field";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextArea } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { PhotoView } from "@/lib/evidence/types";
import { restoreItemMutation, type RestoreAct } from "@/lib/prep/options";
import type { PrepItem, PrepList } from "@/lib/prep/types";

/** Puts an item back, keeps it as it is with a reason, or takes such a mark back. */
export function RestoreForm({ moveId, item, may, onDone }: { moveId: string; item: PrepItem; may: PrepList["may"]; onDone: () => void }) {
  const [note, setNote] = useState("");
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  const intent = useIntent();
  const restore = useMutation(restoreItemMutation(moveId));
  const faults = faultsOf(restore.error);
  const waiting = item.restoreState === "to-restore";
  const send = (act: RestoreAct) => {
    const body = act === "restored" ? { version: item.version, note, photoIds: photos.map((photo) => photo.id) } : { version: item.version, why: note };
    restore.mutate({ itemId: item.id, act, key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  if (!may.restore && !may.keep) return null;
  return (
    <div className="grid gap-3">
      <FormErrors errors={faults.list} />
      {waiting && may.photo && <PhotoField moveId={moveId} label="Photos" value={photos} onChange={setPhotos} error={faults.field("photoIds")} />}
      <TextArea name="note" id={`restore-${item.id}`} label={waiting ? "Note, or why it is kept as it is" : "Why it is taken back"} rows={2} value={note} onChange={(event) => setNote(event.target.value)} error={faults.field("note") ?? faults.field("why")} />
      <div className="grid gap-2.5 sm:flex">
        {waiting && may.restore && <Button size="large" busy={restore.isPending} onClick={() => send("restored")}>Put back</Button>}
        {waiting && may.keep && <Button variant="ghost" busy={restore.isPending} onClick={() => send("kept")}>Keep as it is</Button>}
        {!waiting && may.restore && <Button variant="ghost" busy={restore.isPending} onClick={() => send("reopen")}>Take this mark back</Button>}
      </div>
    </div>
  );
}
