"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { TextArea } from "@/components/ui/text-field";
import { cancelMoveMutation, moveKeys } from "@/lib/moves/options";
import type { CaseFile } from "@/lib/moves/types";
import { routes } from "@/lib/routes";
import { useAttemptKey } from "../use-attempt-key";
import { fieldErrorOf } from "./save-state";

/** Ends the case without the move; asks for the reason and says what it does not do. */
export function CancelDialog({ file, onClose }: { file: CaseFile; onClose: () => void }) {
  const router = useRouter();
  const client = useQueryClient();
  const [reason, setReason] = useState("");
  const [key, renewKey] = useAttemptKey();
  const cancel = useMutation({
    ...cancelMoveMutation(file.moveId),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: moveKeys.all });
      onClose();
      router.push(routes.move(file.moveId));
    },
    onError: renewKey,
  });
  const carrier = file.legs.findLast((leg) => leg.takenOver) ?? null;
  const message = fieldErrorOf(cancel.error)("reason");
  return (
    <Dialog
      open
      onClose={onClose}
      title="Cancel this move?"
      actions={
        <>
          <Button variant="ghost" onClick={onClose}>
            Keep it open
          </Button>
          <Button busy={cancel.isPending} busyWords="Cancelling…" onClick={() => cancel.mutate({ input: { reason }, key })}>
            Cancel the move
          </Button>
        </>
      }
    >
      <div className="grid gap-4">
        <p>The case stays readable for everybody on it, and nothing on it changes any more. Everybody who works on it gets a letter with your reason. This can’t be undone.</p>
        <Notice title={carrier ? `${carrier.carrierName} has the unit.` : "This page stops no train."}>
          Cancelling here takes back no inspection order, no release and no movement instruction. Tell every carrier’s desk yourself, and the people who work on the unit.
        </Notice>
        <TextArea name="reason" label="Why" required maxLength={1000} value={reason} onChange={(event) => setReason(event.target.value)} error={message} />
        {cancel.error && !message && (
          <p role="alert" className="font-[620] text-oxide">
            {cancel.error.message}
          </p>
        )}
      </div>
    </Dialog>
  );
}
