"use client";

import { useQuery } from "@tanstack/react-query";
import { clsx } from "clsx";
import { useSelectedLayoutSegment } from "next/navigation";
import { RouteStrip } from "@/components/drawing/route-strip";
import { Notice } from "@/components/ui/notice";
import { caseOptions } from "@/lib/moves/options";
import { formatWhen } from "@/lib/moves/when";
import { CardHead } from "./card-head";
import { stripOfCase } from "./case-strip";
import { PhoneHead } from "./phone-head";
import { describeUnit, headBoxes } from "./head-boxes";

/** The head of a case, kept up to date while it is looked at: the unit, its facts, its route. On a phone only the first page shows it whole; the others keep the mark and whose turn it is. */
export function CaseHead({ moveId }: { moveId: string }) {
  const { data: file, isError } = useQuery(caseOptions(moveId));
  const onPart = useSelectedLayoutSegment() !== null;
  if (!file) return null;
  return (
    <div>
      {file.state !== "open" && (
        <Notice kind="info" className="mb-3">
          {file.state === "closed" ? "This move is closed" : "This move was cancelled"}
          {file.endedAt && `, ${formatWhen(file.endedAt, file.destination.zone)}`}. Nothing on it changes any more.
        </Notice>
      )}
      {onPart && <PhoneHead file={file} />}
      <div className={clsx(onPart && "max-sm:hidden")}>
        <CardHead caseNumber={`Case ${file.caseNumber} · dead in tow`} mark={file.unit.mark} number={file.unit.number} description={describeUnit(file)} boxes={headBoxes(file)} />
        <div className="border border-t-0 border-rule-strong bg-sheet px-4 py-4 sm:px-12 sm:pb-6">
          <RouteStrip {...stripOfCase(file)} />
        </div>
      </div>
      <p role="status" className="text-13 text-ink-2 max-sm:text-14">
        {isError && `No connection. This is the case as of ${formatWhen(file.at, file.origin.zone)}.`}
      </p>
    </div>
  );
}
