"use client";

import { useQuery } from "@tanstack/react-query";
import { Sheet } from "@/components/ui/sheet";
import { caseOptions } from "@/lib/moves/options";
import type { CaseFile } from "@/lib/moves/types";
import { formatDay, formatWhen } from "@/lib/moves/when";
import { LegConditions } from "./leg-conditions";
import { WhatWaits } from "./what-waits";

function wanted({ wantedFrom, wantedTo }: CaseFile): string | null {
  if (wantedFrom && wantedTo) return `Wanted between ${formatDay(wantedFrom)} and ${formatDay(wantedTo)}.`;
  if (wantedFrom) return `Wanted from ${formatDay(wantedFrom)} on.`;
  return wantedTo ? `Wanted by ${formatDay(wantedTo)}.` : null;
}

/** The first page of a case: what waits now, and what each carrier still needs before it moves the unit. */
export function CaseNow({ moveId }: { moveId: string }) {
  const { data: file } = useQuery(caseOptions(moveId));
  if (!file) return null;
  const next = file.legs.find((leg) => !leg.takenOver);
  const others = file.legs.filter((leg) => leg !== next);
  const window = wanted(file);
  return (
    <Sheet className="px-0! py-0!">
      <div className="lg:grid lg:grid-cols-[minmax(0,1fr)_320px]">
        <div className="px-4 py-5 sm:px-6">
          <h2 className="mb-3 text-21 font-[680] tracking-[-0.01em]">What waits now</h2>
          <WhatWaits file={file} />
          <p className="mt-6 max-w-[66ch] text-14 text-ink-2">
            Opened {formatWhen(file.openedAt, file.origin.zone)} for {file.ownerName}. {window}
          </p>
          {file.note && <p className="mt-2 max-w-[66ch] whitespace-pre-line text-14">{file.note}</p>}
          {others.length > 0 && (
            <div className="mt-8 grid gap-x-8 gap-y-6 sm:grid-cols-2">
              {others.map((leg) => (
                <LegConditions key={leg.legId} leg={leg} current={false} />
              ))}
            </div>
          )}
        </div>
        <div className="border-t border-rule px-4 py-5 sm:px-5 lg:border-t-0 lg:border-l">
          {next ? <LegConditions leg={next} current={file.state === "open"} /> : <p className="text-14">Every carrier has taken the unit over in its turn.</p>}
          <p className="mt-4 text-13 text-ink-2 max-sm:text-14">
            A unit is accepted by the signature of the carrier’s inspector and moves on the instruction of the carrier’s transport desk. What stands here informs them and takes the place of neither: the carrier’s
            rules, local codes and a qualified person’s judgment prevail.
          </p>
        </div>
      </div>
    </Sheet>
  );
}
