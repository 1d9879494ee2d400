"use client";

import { useMutation, useQuery } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { DateField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { TextArea, TextField } from "@/components/ui/text-field";
import { acceptancesOptions, signAcceptanceMutation } from "@/lib/acceptance/options";
import { acceptanceStatement } from "@/lib/acceptance/statement";
import type { AcceptanceLeg, Acceptances } from "@/lib/acceptance/types";
import type { RestrictionId } from "@/lib/acceptance/vocabulary";
import { faultsOf } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import { CoveredFindings } from "./covered-findings";
import { RestrictionField } from "./restriction-field";

export type AcceptanceFormProps = { moveId: string; legId: string; first: Acceptances };

/** What an acceptance would cover, what is missing for it, and where it is signed or entered. */
export function AcceptanceForm({ moveId, legId, first }: AcceptanceFormProps) {
  const { data } = useQuery({ ...acceptancesOptions(moveId), initialData: first });
  const leg = data.legs.find((one) => one.legId === legId);
  if (!leg) return null;
  return (
    <div className="grid max-w-[640px] gap-5">
      <CoveredFindings moveId={moveId} findings={leg.findings} />
      {leg.missing.length > 0 && (
        <Notice kind="stop" title="It can’t be signed yet">
          <ul className="list-disc pl-5">
            {leg.missing.map((one) => (
              <li key={one}>{one}</li>
            ))}
          </ul>
        </Notice>
      )}
      {leg.standing && <Notice kind="done">This leg is accepted already. Withdraw that acceptance before another is signed.</Notice>}
      {leg.maySign ? (
        <SignForm moveId={moveId} leg={leg} unit={data.unit} entering={leg.maySign === "enter"} />
      ) : (
        <div><LinkButton href={routes.findings(moveId)} variant="ghost">Back to the findings</LinkButton></div>
      )}
    </div>
  );
}

function SignForm({ moveId, leg, unit, entering }: { moveId: string; leg: AcceptanceLeg; unit: string; entering: boolean }) {
  const router = useRouter();
  const [restrictions, setRestrictions] = useState<RestrictionId[]>([]);
  const [given, setGiven] = useState({ restrictionNote: "", number: "", validUntil: "", name: "" });
  const [enteredFor, setEnteredFor] = useState(EMPTY_ENTERED_FOR);
  // What the person has before them; a change of it under their hands must not be signed unseen.
  const [seen, setSeen] = useState(leg.rowsHash);
  const intent = useIntent();
  const sign = useMutation(signAcceptanceMutation(moveId));
  const faults = faultsOf(sign.error);
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const source = enteredFor.source;
  const reported = entering ? { source: source || "paper", heardOn: enteredFor.heardOn, saidBy: enteredFor.saidBy } as const : null;
  const complete = !entering || (source !== "" && enteredFor.heardOn !== "" && enteredFor.saidBy !== "");
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { ...given, legId: leg.legId, restrictions, rowsHash: seen, enteredFor: entering ? enteredFor : null };
    // Awaited, not given as a callback: once the acceptance stands this form is gone, and callbacks of a form that is gone are not called.
    void sign.mutateAsync({ key: intent.key(body), body }).then(() => { intent.done(); router.push(routes.findings(moveId)); }, () => undefined);
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-5">
      <FormErrors errors={faults.list} title="Not signed." />
      {seen !== leg.rowsHash && (
        <Notice live="status" title="Changed while this page was open">
          <p>Findings or prep are no longer as they were. Look at them above once more.</p>
          <Button variant="ghost" size="small" className="mt-2" onClick={() => setSeen(leg.rowsHash)}>I have looked again</Button>
        </Notice>
      )}
      {entering && <EnteredForFields value={enteredFor} onChange={setEnteredFor} errors={faults.field} carrierName={leg.carrierName} />}
      <RestrictionField value={restrictions} onChange={setRestrictions} error={faults.field("restrictions")} />
      <TextArea {...type("restrictionNote")} label="Restrictions in words" hint="What the list does not say." rows={2} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField {...type("number")} label="The carrier’s number for it" mono autoComplete="off" />
        <DateField {...type("validUntil")} label="Valid until" hint="Leave empty when no day is set." />
      </div>
      <section aria-label={entering ? "What is entered" : "What is signed"} className="border-2 border-ink px-4 py-3.5">
        <p className="lab mb-1.5">{entering ? "What is entered" : "What is signed"}</p>
        <p className="text-15">
          {complete ? acceptanceStatement({ unit, carrierName: leg.carrierName, fromPlace: leg.fromPlace, toPlace: leg.toPlace, restrictions, restrictionNote: given.restrictionNote.trim() || null, validUntil: given.validUntil || null, reported }) : "Say above how it came, on which day and who said it; the sentence that is kept then stands here."}
        </p>
        <TextField {...type("name")} label={entering ? "Your name, as the one who enters it" : "Your name"} required autoComplete="name" className="mt-3" />
      </section>
      <ActionBar>
        <LinkButton href={routes.findings(moveId)} variant="ghost">Back</LinkButton>
        <Button type="submit" busy={sign.isPending} busyWords={entering ? "Entering…" : "Signing…"}>{entering ? "Enter the acceptance" : "Sign the acceptance"}</Button>
      </ActionBar>
    </form>
  );
}
