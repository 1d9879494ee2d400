"use client";

import { useQuery } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import { Disclosure } from "@/components/ui/disclosure";
import { Empty } from "@/components/ui/empty";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Mono } from "@/components/ui/text";
import { byGroup, GROUP_LABELS, PHASE_LABELS, twinsOf } from "@/lib/prep/labels";
import { prepOptions } from "@/lib/prep/options";
import type { PrepList, PrepPhaseView } from "@/lib/prep/types";
import { PrepRow } from "./prep-row";
import { RestoreBoard } from "./restore-board";
import { SignPhase } from "./sign-phase";

/** The prep list of a move: both phases with their signatures, and after arrival the way back. */
export function PrepBoard({ moveId, first }: { moveId: string; first: PrepList }) {
  const { data: prep } = useQuery({ ...prepOptions(moveId), initialData: first });
  const twins = twinsOf(prep.items);
  return (
    <div className="grid gap-6">
      {prep.arrived && <RestoreBoard moveId={moveId} prep={prep} twins={twins} />}
      {prep.items.length === 0 ? (
        <Empty title="No prep list yet.">The list is made from the unit’s facts when the move is opened.</Empty>
      ) : (
        prep.phases.map((phase) => <Phase key={phase.phase} moveId={moveId} prep={prep} phase={phase} />)
      )}
      {!prep.arrived && twins.length > 0 && (
        <p className="text-14 text-ink-2">
          {twins.length} of these are put back after arrival, in an order of their own with its cautions. They open here once the receiver has looked the unit over.
        </p>
      )}
    </div>
  );
}

const LEADS = {
  "where-it-stands": "Everything done before the carrier’s engine comes. An uncoupled unit without air is held by its hand brake and chocks alone: they stay until it is coupled.",
  "when-coupled": "Done with the carrier’s engine coupled, at its instruction and under its protection. Signed at pickup.",
} as const;

function Phase({ moveId, prep, phase }: { moveId: string; prep: PrepList; phase: PrepPhaseView }) {
  const [openId, setOpenId] = useState<string | null>(null);
  const waits = phase.phase === "when-coupled" ? prep.coupledWaitsFor : null;
  return (
    <Sheet title={`Prep, ${PHASE_LABELS[phase.phase].toLowerCase()}`} lead={LEADS[phase.phase]} actions={<PhaseState phase={phase} />}>
      {phase.lifted && !phase.signature && (
        <Notice kind="stop" title="Changed since signed" className="mb-4">
          The signature no longer stands: {phase.lifted.why}. It is signed again when the list is complete.
        </Notice>
      )}
      {waits && <Notice kind="info" className="mb-4">{waits}</Notice>}
      {byGroup(prep.items, phase.phase).map(({ group, items, left }) => (
        <Group key={group} name={GROUP_LABELS[group]} done={items.length - left} total={items.length}>
          {items.map((item) => (
            <PrepRow key={item.id} moveId={moveId} item={item} zone={prep.originZone} may={prep.may.work && !waits} open={openId === item.id} onOpen={(open) => setOpenId((now) => (open ? item.id : now === item.id ? null : now))} />
          ))}
        </Group>
      ))}
      {prep.may.work && !waits && <SignPhase moveId={moveId} phase={phase} />}
    </Sheet>
  );
}

/** One group of the list; a finished one starts folded up, so that a phone shows what is left. */
function Group({ name, done, total, children }: { name: string; done: number; total: number; children: ReactNode }) {
  const [startsOpen] = useState(done < total);
  return (
    <Disclosure
      open={startsOpen}
      className="-mt-px"
      summary={
        <span className="flex w-full items-baseline justify-between gap-4">
          <h3 className="text-17 font-[640]">{name}</h3>
          <Mono className="text-14 text-ink-2">{done} of {total}</Mono>
        </span>
      }
    >
      <ol className="-ml-5 border border-rule-strong">{children}</ol>
    </Disclosure>
  );
}

function PhaseState({ phase }: { phase: PrepPhaseView }) {
  if (phase.signature) return <State tone="verdigris">Signed by {phase.signature.name}</State>;
  return <State tone={phase.left > 0 ? "brass" : "slate"}>{phase.left > 0 ? `${phase.total - phase.left} of ${phase.total} done` : "Complete, not signed"}</State>;
}
