"use client";

import { useQuery } from "@tanstack/react-query";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { feesOptions } from "@/lib/fees/options";
import type { FeesView } from "@/lib/fees/types";
import { LegFees } from "./leg-fees";

/** The fees of a move that the viewer may see, leg by leg; follows what others do meanwhile. */
export function FeesBoard({ moveId, first }: { moveId: string; first: FeesView }) {
  const { data: fees } = useQuery({ ...feesOptions(moveId), initialData: first });
  return (
    <Sheet title="Fees" lead="What each carrier asks for its leg, who agreed, and what is paid. Only the owner and a leg’s payer and payee see its amounts; everybody else sees whether billing is cleared.">
      {!fees.open && (
        <Notice kind="info" className="mb-4">
          Work on this move has ended; nothing here changes any more.
        </Notice>
      )}
      <div className="grid gap-6">
        {fees.legs.map((leg) => (
          <LegFees key={leg.legId} moveId={moveId} leg={leg} />
        ))}
      </div>
    </Sheet>
  );
}
