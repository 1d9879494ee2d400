import Link from "next/link";
import { stripOfRow } from "@/components/case/case-strip";
import { MarkStencil } from "@/components/drawing/mark-stencil";
import { SmallStrip } from "@/components/drawing/small-strip";
import { daysOpen } from "@/lib/moves/days-split";
import type { MoveRow } from "@/lib/moves/types";
import { waitDetail, waitName } from "@/lib/moves/waits";
import { daysBetween } from "@/lib/moves/when";
import { routes } from "@/lib/routes";

/** The unit of a row; its link is the way into the case. */
export function UnitCell({ row }: { row: MoveRow }) {
  return (
    <Link href={routes.move(row.moveId)} className="inline-flex min-h-11 flex-col justify-center underline-offset-4 hover:underline">
      <MarkStencil mark={row.mark} number={row.number} />
      <span className="figure text-13 text-ink-2 max-sm:text-14">{row.caseNumber}</span>
    </Link>
  );
}

export function RouteCell({ row }: { row: MoveRow }) {
  const carriers = row.legs.map((leg) => leg.carrierName).join(", then ");
  return <SmallStrip {...stripOfRow(row)} shape={row.shape} label={`Carriers: ${carriers}`} />;
}

/** Whose turn it is, for how long and to do what. */
export function WaitingCell({ row, at }: { row: MoveRow; at: string }) {
  const { waiting } = row;
  if (!waiting) return <span className="text-ink-2">Nobody</span>;
  const days = daysBetween(waiting.since, at);
  return (
    <>
      <span className="block font-semibold">{waiting.you ? "You" : waiting.yourCompany ? `Your company: ${waitName(waiting)}` : waitName(waiting)}</span>
      <span className="block text-ink-2">{waitDetail(waiting, days)}</span>
    </>
  );
}

export const daysOfRow = (row: MoveRow, at: string) => daysOpen(row.openedAt, row.endedAt, at);
