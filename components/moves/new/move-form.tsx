"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useEffect, useState, useSyncExternalStore, type FormEvent } from "react";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { SelectField } from "@/components/ui/select-field";
import { CallError } from "@/lib/entry/fetcher";
import { emptyDraft, readForm, toOpening, type DraftForm } from "@/lib/moves/draft";
import { fieldWords } from "@/lib/moves/field-words";
import { beginDraft, moveKeys, openMoveMutation, readDraft, saveDraft } from "@/lib/moves/options";
import type { Draft } from "@/lib/moves/types";
import { routes } from "@/lib/routes";
import { DraftSaver } from "../draft-saver";
import { DraftConflict } from "./draft-conflict";
import { DraftState } from "./draft-state";
import { EndsSection } from "./ends-section";
import { ReviewSection } from "./review-section";
import { RouteSection } from "./route-section";
import { UnitSection } from "./unit-section";
import { WhenSection } from "./when-section";

/** A fault in the list at the top names its field, where several fields can have the same fault. */
const faultLine = (name: string, message: string) => (name.startsWith("answers.") ? message : `${fieldWords(name)}: ${message.charAt(0).toLowerCase()}${message.slice(1)}`);

export type OwnCompany = { companyId: string; companyName: string };
export type MoveFormProps = { companies: readonly OwnCompany[]; draft: Draft | null };

/** The address follows the draft without a page change, so that reloading or sharing it comes back here. */
const showDraft = (draftId: string) => window.history.replaceState(null, "", routes.draft(draftId));

const newSaver = (form: DraftForm, draft: Draft | null) => new DraftSaver(form, draft, { begin: beginDraft, save: saveDraft, read: readDraft, began: showDraft });

/** Leaving the page is asked about only while something on it is not kept. */
function useLeaveQuestion(unkept: boolean) {
  useEffect(() => {
    if (!unkept) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [unkept]);
}

/** Opens the draft's move; the same content again happens once, whatever the connection does. */
function useOpening(saver: DraftSaver) {
  const router = useRouter();
  const client = useQueryClient();
  const [sent, setSent] = useState({ key: crypto.randomUUID() as string, body: "" });
  const open = useMutation({
    ...openMoveMutation(),
    onSuccess: ({ moveId }) => {
      void client.invalidateQueries({ queryKey: moveKeys.lists() });
      router.push(routes.move(moveId));
    },
    onError: (error) => (error instanceof CallError && error.status === 404 ? saver.lose() : saver.resume()),
  });
  const start = async (form: DraftForm) => {
    await saver.flush();
    saver.stop();
    const input = toOpening(form);
    const body = JSON.stringify(input);
    const key = sent.body === "" || sent.body === body ? sent.key : crypto.randomUUID();
    setSent({ key, body });
    open.mutate({ draftId: saver.draftId, input, key });
  };
  return { start, open };
}

/** Writes a new move down. Kept as a draft while it is typed; opening checks everything at once and loses nothing. */
export function MoveForm({ companies, draft }: MoveFormProps) {
  const [form, setForm] = useState(() => (draft ? readForm(draft.body, draft.companyId) : emptyDraft(companies[0]?.companyId ?? "")));
  const [saver] = useState(() => newSaver(form, draft));
  const status = useSyncExternalStore(saver.subscribe, saver.getStatus, saver.getStatus);
  const { start, open } = useOpening(saver);
  useLeaveQuestion((status.kind === "unsent" || status.kind === "saving" || status.kind === "failed" || status.kind === "conflict" || status.kind === "gone") && !open.isSuccess);
  const put = (next: DraftForm) => {
    setForm(next);
    saver.change(next);
  };
  const change = (patch: Partial<DraftForm>) => put({ ...form, ...patch });
  const fields = open.error instanceof CallError ? open.error.fields : {};
  const errorOf = (path: string) => fields[path]?.[0] ?? null;
  const ownerName = companies.find((one) => one.companyId === form.companyId)?.companyName ?? "";
  const section = { form, change, errorOf };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (!open.isPending && !open.isSuccess) void start(form);
  };
  const faults = Object.entries(fields).flatMap(([name, messages]) => messages.map((message) => ({ name, message: faultLine(name, message) })));
  return (
    <form noValidate onSubmit={submit} className="grid gap-6">
      <DraftState status={status} onKeepAnew={() => saver.keepAnew()} />
      {open.error && <FormErrors title={open.error.message} errors={faults.length > 0 ? faults : [{ message: "Everything that was typed is still here." }]} />}
      {status.kind === "conflict" && (
        <DraftConflict
          mine={form}
          theirs={status.theirs}
          onMine={() => saver.settle(form)}
          onTheirs={() => {
            setForm(status.theirs);
            saver.settle(status.theirs);
          }}
        />
      )}
      {companies.length > 1 && (
        <SelectField name="companyId" label="Which of your companies owns the unit" required className="max-w-120" value={form.companyId} choices={companies.map((one) => ({ value: one.companyId, label: one.companyName }))} onChange={(event) => change({ companyId: event.target.value })} error={errorOf("companyId")} />
      )}
      <UnitSection {...section} />
      <EndsSection {...section} />
      <RouteSection {...section} ownerName={ownerName} />
      <WhenSection {...section} />
      <ReviewSection form={form} ownerName={ownerName} />
      <ActionBar>
        <Button type="submit" busy={open.isPending || open.isSuccess} busyWords="Opening…">
          Open the move
        </Button>
      </ActionBar>
    </form>
  );
}
