"use client";

import { useQuery } from "@tanstack/react-query";
import { type ReactNode } from "react";
import { AcceptanceBlock } from "@/components/acceptance/acceptance-block";
import { VisitList } from "@/components/inspections/visit-list";
import { Empty } from "@/components/ui/empty";
import { LinkButton } from "@/components/ui/link-button";
import { Sheet } from "@/components/ui/sheet";
import { acceptancesOptions } from "@/lib/acceptance/options";
import type { Acceptances } from "@/lib/acceptance/types";
import { findingsOptions } from "@/lib/findings/options";
import type { FindingsBoard as Board, FindingView } from "@/lib/findings/types";
import { countWords } from "@/lib/findings/words";
import { inspectionsOptions } from "@/lib/inspections/options";
import type { InspectedLeg, Inspections, MayStep } from "@/lib/inspections/types";
import { routes } from "@/lib/routes";
import { FindingTable } from "./finding-table";

export type FindingsBoardProps = { moveId: string; first: { inspections: Inspections; board: Board; acceptances: Acceptances } };

/** Carrier by carrier: visits, findings and acceptance, kept up to date while they are looked at. */
export function FindingsBoard({ moveId, first }: FindingsBoardProps) {
  const { data: inspections } = useQuery({ ...inspectionsOptions(moveId), initialData: first.inspections });
  const { data: board } = useQuery({ ...findingsOptions(moveId), initialData: first.board });
  const { data: acceptances } = useQuery({ ...acceptancesOptions(moveId), initialData: first.acceptances });
  return (
    <div>
      <div className="grid gap-6">
        {inspections.legs.map((leg) => {
          const acceptance = acceptances.legs.find((one) => one.legId === leg.legId);
          return (
            <Leg key={leg.legId} moveId={moveId} leg={leg} findings={board.findings.filter((finding) => finding.legId === leg.legId)} mayPost={board.mayPost.find((one) => one.legId === leg.legId)?.may ?? null} now={board.at}>
              {acceptance && <AcceptanceBlock moveId={moveId} leg={acceptance} />}
            </Leg>
          );
        })}
      </div>
      <p className="mt-4 max-w-[80ch] text-13 text-ink-2 max-sm:text-14">
        A finding is cleared only by the inspector of its leg, and what was said stays to be read. What stands here informs qualified people; the carrier’s rules, local codes and a qualified person’s judgment prevail.
      </p>
    </div>
  );
}

type LegProps = { moveId: string; leg: InspectedLeg; findings: FindingView[]; mayPost: MayStep; now: string; children: ReactNode };

function Leg({ moveId, leg, findings, mayPost, now, children }: LegProps) {
  const visit = leg.visits.at(-1);
  const lead = [leg.carrierMark, `leg ${leg.seq}`, `takes over at ${leg.fromPlace}`, countWords(findings)].filter(Boolean).join(", ");
  return (
    <section aria-labelledby={`${leg.legId}-name`} className="border border-rule-strong bg-sheet lg:grid lg:grid-cols-[minmax(0,1fr)_310px]">
      <div className="min-w-0 px-4 py-5 sm:px-6">
        <div className="mb-3.5 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
          <div>
            <h2 id={`${leg.legId}-name`} className="text-21 font-[680] tracking-[-0.01em]">{leg.carrierName}</h2>
            <p className="mt-0.5 text-14 text-ink-2">{lead}</p>
          </div>
          <div className="no-print flex flex-wrap gap-2.5">
            {leg.mayVisit && <LinkButton href={routes.visit(moveId, leg.legId)} variant={visit ? "ghost" : "solid"}>Record a visit</LinkButton>}
            {mayPost && visit && <LinkButton href={routes.postFinding(moveId, visit.id)}>Post a finding</LinkButton>}
          </div>
        </div>
        {findings.length > 0 ? (
          <FindingTable moveId={moveId} caption={`Findings of ${leg.carrierName}`} findings={findings} now={now} />
        ) : (
          <Empty title={visit ? "No findings." : "Not inspected yet."}>
            {visit
              ? `${leg.carrierName}’s inspector was here and wrote nothing up. A finding is posted under a visit, by the inspector of this leg.`
              : `${leg.carrierName}’s inspector records the visit here and posts what was found${leg.onBoard ? "." : "; nobody of this carrier is on board, so the owner or the contractor enters it from paper, e-mail or phone."}`}
          </Empty>
        )}
        {leg.visits.length > 0 && (
          <Sheet bare level={3} title={leg.visits.length === 1 ? "The visit" : "Visits"} className="mt-6">
            <VisitList visits={leg.visits} />
          </Sheet>
        )}
      </div>
      <div className="border-t border-rule px-4 py-5 sm:px-5 lg:border-t-0 lg:border-l">{children}</div>
    </section>
  );
}
