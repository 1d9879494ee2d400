import { Box, BoxGrid } from "@/components/ui/box";
import { Sheet } from "@/components/ui/sheet";
import { MarkStencil } from "@/components/drawing/mark-stencil";
import type { DraftForm, LegForm } from "@/lib/moves/draft";

const OPEN = "still open";

const payerOf = ({ payer, payerName }: LegForm, ownerName: string) => (payer === "ours" ? ownerName : payer === "other" ? payerName || OPEN : "nobody named yet");

/** The whole move on one card before it is opened, and what comes next. */
export function ReviewSection({ form, ownerName }: { form: DraftForm; ownerName: string }) {
  const { answers, origin, destination, legs } = form;
  const named = Boolean(answers.mark || answers.number);
  return (
    <Sheet title="5. Look it over">
      <p className="mb-3">{named ? <MarkStencil mark={answers.mark ?? ""} number={answers.number ?? ""} size="title" /> : <span className="text-ink-2">The unit has no mark and number yet.</span>}</p>
      <BoxGrid>
        <Box label="From" detail={origin.place}>
          {origin.name || OPEN}
        </Box>
        <Box label="To" detail={destination.place}>
          {destination.name || OPEN}
        </Box>
        {legs.map((leg, at) => (
          <Box key={leg.key} label={`Leg ${at + 1}`} detail={`paid by ${payerOf(leg, ownerName)}`}>
            {leg.carrierName || OPEN}
          </Box>
        ))}
      </BoxGrid>
      <p className="mt-4 max-w-[66ch] text-14 text-ink-2">
        Opening gives the move its case number and a prep list that fits the unit. Next you invite the contractor who prepares it, then carriers, payers and the receiver. What is still unknown can be filled in later; a
        carrier who does not work here can be entered for. Nothing is sent to anybody yet.
      </p>
    </Sheet>
  );
}
