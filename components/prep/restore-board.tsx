"use client";

import { useState } from "react";
import { PhotoStrip } from "@/components/evidence/photo-strip";
import { Empty } from "@/components/ui/empty";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { TickBox } from "@/components/ui/tick-box";
import { formatWhen } from "@/lib/moves/when";
import type { PrepItem, PrepList } from "@/lib/prep/types";
import { RestoreForm } from "./restore-form";

/** The way back after arrival: what was done for the tow, in the order in which it is undone. */
export function RestoreBoard({ moveId, prep, twins }: { moveId: string; prep: PrepList; twins: PrepItem[] }) {
  const [openId, setOpenId] = useState<string | null>(null);
  const left = twins.filter((item) => item.restoreState === "to-restore").length;
  return (
    <Sheet title="Put back after the tow" lead="In this order: secured first, the battery switch last of the electrical items, the brake tested before the tow card comes off. What stays as it is, for instance on a display piece, the receiver says so." actions={<State tone={left > 0 ? "brass" : "verdigris"}>{left > 0 ? `${left} of ${twins.length} left` : "All put back or kept"}</State>}>
      {twins.length === 0 ? (
        <Empty title="Nothing to put back.">No item that was done has a way back.</Empty>
      ) : (
        <ol className="border border-rule-strong">
          {twins.map((item) => (
            <RestoreRow key={item.id} {...{ moveId, item, prep }} open={openId === item.id} onOpen={(open) => setOpenId((now) => (open ? item.id : now === item.id ? null : now))} />
          ))}
        </ol>
      )}
    </Sheet>
  );
}

function RestoreRow({ moveId, item, prep, open, onOpen }: { moveId: string; item: PrepItem; prep: PrepList; open: boolean; onOpen: (open: boolean) => void }) {
  const waiting = item.restoreState === "to-restore";
  return (
    <li className={open ? "border-2 border-ink bg-sheet" : "border-t border-rule first:border-t-0"}>
      <button type="button" aria-expanded={open} onClick={() => onOpen(!open)} className="flex min-h-13 w-full items-start gap-3 px-3.5 py-3 text-left">
        <TickBox state={waiting ? "to-do" : item.restoreState === "kept" ? "not-applicable" : "done"} size={24} className="mt-0.5" />
        <span className="min-w-0">
          <span className={open ? "block text-17 font-[640]" : "block text-15"}>{item.restoreAction}</span>
          <span className="block text-14 text-ink-2">{underLine(item, prep.destinationZone)}</span>
        </span>
      </button>
      {open && (
        <div className="grid gap-3 px-3.5 pb-4">
          <p className="max-w-[66ch] text-14 text-ink-2">Done for the tow: {item.action}{item.value ? ` ${item.valueLabel ?? "Value"}: ${item.value}.` : ""}</p>
          {item.photos.length > 0 && <PhotoStrip photos={item.photos} />}
          {item.restoreCaution && <Notice title="Caution">{item.restoreCaution}</Notice>}
          {item.restoreNote && <p className="text-14">{item.restoreNote}</p>}
          {item.restorePhotos.length > 0 && <PhotoStrip photos={item.restorePhotos} />}
          <RestoreForm {...{ moveId, item }} may={prep.may} onDone={() => onOpen(false)} />
        </div>
      )}
    </li>
  );
}

function underLine(item: PrepItem, zone: string): string {
  if (item.restoreState === "to-restore") return "waits to be put back";
  const by = item.restoredByName && item.restoredAt ? `${item.restoredByName}, ${formatWhen(item.restoredAt, zone)}` : "";
  return item.restoreState === "kept" ? `kept as it is (${by})` : by;
}
