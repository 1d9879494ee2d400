"use client";

import { PhotoStrip } from "@/components/evidence/photo-strip";
import { Notice } from "@/components/ui/notice";
import { TickBox, type TickState } from "@/components/ui/tick-box";
import { formatWhen } from "@/lib/moves/when";
import { proofWords } from "@/lib/prep/labels";
import type { PrepItem } from "@/lib/prep/types";
import { FinishForm } from "./finish-form";
import { ReopenForm } from "./reopen-form";

type RowProps = { moveId: string; item: PrepItem; zone: string; may: boolean; open: boolean; onOpen: (open: boolean) => void };

const TICK: Record<PrepItem["state"], TickState> = { done: "done", "to-do": "to-do", "not-applicable": "not-applicable" };

/** One item: a line with a box when closed, the only box with a heavy rule when open. */
export function PrepRow({ moveId, item, zone, may, open, onOpen }: RowProps) {
  return (
    <li className={open ? "border-2 border-ink bg-sheet" : "border-t border-rule first:border-t-0"}>
      <button type="button" aria-expanded={open} onClick={() => onOpen(!open)} className="flex min-h-13 w-full items-start gap-3 px-3.5 py-3 text-left">
        <TickBox state={TICK[item.state]} size={24} className="mt-0.5" />
        <span className="min-w-0">
          <span className={open ? "block text-17 font-[640]" : "block text-15"}>{item.action}</span>
          <span className="block text-14 text-ink-2">{underLine(item, zone)}</span>
        </span>
      </button>
      {open && (
        <div className="grid gap-3 px-3.5 pb-4">
          <p className="max-w-[66ch] text-14 text-ink-2">
            {item.why} {item.published ? "" : "Common practice, without a published source."}
          </p>
          {item.caution && <Notice title="Caution">{item.caution}</Notice>}
          <Done item={item} />
          {may && (item.state === "to-do" ? <FinishForm moveId={moveId} item={item} onDone={() => onOpen(false)} /> : <ReopenForm moveId={moveId} item={item} onDone={() => onOpen(false)} />)}
        </div>
      )}
    </li>
  );
}

function underLine(item: PrepItem, zone: string): string {
  if (item.state === "to-do") return proofWords(item);
  const by = item.byName && item.at ? `${item.byName}, ${formatWhen(item.at, zone)}` : "";
  if (item.state === "not-applicable") return `does not apply: ${item.skippedWhy ?? ""}${by ? ` (${by})` : ""}`;
  const photos = item.photos.length > 0 ? `, ${item.photos.length} ${item.photos.length === 1 ? "photo" : "photos"}` : "";
  return `${by}${item.tagNumber ? `, tag ${item.tagNumber}` : ""}${photos}`;
}

function Done({ item }: { item: PrepItem }) {
  if (item.state !== "done") return null;
  return (
    <>
      <dl className="grid gap-1 text-14">
        {item.value && <Fact label={item.valueLabel ?? "Value"} value={`${item.value}${item.valueUnit ? ` ${item.valueUnit}` : ""}`} />}
        {item.tagNumber && <Fact label="Tag" value={item.tagNumber} />}
        {item.note && <Fact label="Note" value={item.note} />}
      </dl>
      {item.photos.length > 0 && <PhotoStrip photos={item.photos} />}
    </>
  );
}

const Fact = ({ label, value }: { label: string; value: string }) => (
  <div className="flex flex-wrap gap-x-2">
    <dt className="text-ink-2">{label}:</dt>
    <dd className="font-[560] whitespace-pre-line">{value}</dd>
  </div>
);
