"use client";

import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { FilterBar, FilterSelect } from "@/components/ui/filter-box";
import { FormErrors } from "@/components/ui/form-errors";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import type { Tone } from "@/components/ui/tone";
import { adminMailOptions, retryMailMutation } from "@/lib/admin/options";
import type { AdminMail } from "@/lib/admin/types";
import { formatFullWhen } from "@/lib/moves/when";
import { OUTBOX_STATES, type OutboxState } from "@/lib/outbox/vocabulary";

const STATES: Record<OutboxState, { tone: Tone; words: string }> = {
  ready: { tone: "brass", words: "Waits" },
  taken: { tone: "slate", words: "On its way" },
  done: { tone: "verdigris", words: "Handed over" },
  failed: { tone: "oxide", words: "Given up" },
};

/** The e-mails of the site, sent and failed, without what they say. */
export function MailList({ first, state: asked }: { first: AdminMail[]; state: OutboxState | null }) {
  const [state, setState] = useState(asked);
  const { data = [] } = useQuery({ ...adminMailOptions(state), initialData: state === asked ? first : undefined });
  const retry = useWrite(retryMailMutation());
  return (
    <Sheet title="E-mail" lead="The newest hundred, without what they say: letters hold links that sign people in. One that failed is tried for some hours, then given up.">
      <FormErrors errors={retry.faults.list} title="Not tried again." />
      <FilterBar>
        <FilterSelect name="state" label="State" blank="any" choices={OUTBOX_STATES.map((value) => ({ value, label: STATES[value].words.toLowerCase() }))} value={state ?? ""} onChange={(event) => setState(OUTBOX_STATES.find((one) => one === event.target.value) ?? null)} />
      </FilterBar>
      {data.length === 0 ? <Empty className="mt-4" title="No e-mail.">None is in this state.</Empty> : (
        <Table caption="E-mails" framed stack>
          <thead>
            <tr><Th>Written</Th><Th>To</Th><Th>What</Th><Th>State</Th><Th>Tries</Th><Th><span className="sr-only">Try again</span></Th></tr>
          </thead>
          <tbody>
            {data.map((mail) => (
              <tr key={mail.outboxId}>
                <Td label="Written" mono>{formatFullWhen(mail.createdAt, "UTC")}</Td>
                <Td label="To" className="[overflow-wrap:anywhere]">{mail.to}</Td>
                <Td label="What">{mail.kind.replaceAll("-", " ")}</Td>
                <Td label="State">
                  <State tone={STATES[mail.state].tone}>{STATES[mail.state].words}</State>
                  {mail.lastError && <span className="block max-w-[40ch] text-ink-2 [overflow-wrap:anywhere]">{mail.lastError}</span>}
                  {mail.attempts > 0 && mail.nextTryAt && <span className="block text-ink-2">next try {formatFullWhen(mail.nextTryAt, "UTC")}</span>}
                </Td>
                <Td label="Tries" mono>{mail.attempts}</Td>
                <Td>{mail.state === "failed" && <Button variant="plain" size="small" busy={retry.busy} busyWords="One moment…" onClick={() => retry.send({ outboxId: mail.outboxId })}>Try again<span className="sr-only"> to {mail.to}</span></Button>}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </Sheet>
  );
}
