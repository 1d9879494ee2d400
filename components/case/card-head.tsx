import { Box, BoxGrid, type BoxSpan } from "@/components/ui/box";
import { MarkStencil } from "@/components/drawing/mark-stencil";

export type CardHeadBox = { label: string; value: string; detail?: string | null; mono?: boolean; tone?: "waiting"; span: BoxSpan };

export type CardHeadProps = {
  caseNumber: string;
  mark: string;
  number: string;
  /** Lines under the mark: what the unit is, its age. */
  description: readonly string[];
  boxes: readonly CardHeadBox[];
};

/** The head of a case file: the unit's mark in stencil, then its facts in ruled boxes. The mark is the page's heading. */
export function CardHead({ caseNumber, mark, number, description, boxes }: CardHeadProps) {
  return (
    <div className="border border-rule-strong bg-sheet lg:grid lg:grid-cols-[330px_minmax(0,1fr)]">
      <div className="flex flex-col justify-between gap-3 border-b border-rule-strong px-4 pt-4 pb-3.5 sm:px-5 lg:border-r lg:border-b-0">
        <p className="lab">{caseNumber}</p>
        <h1>
          <MarkStencil mark={mark} number={number} size="head" />
        </h1>
        <p className="text-14 text-ink-2">
          {description.map((line) => (
            <span key={line} className="block">
              {line}
            </span>
          ))}
        </p>
      </div>
      <BoxGrid framed={false}>
        {boxes.map(({ value, ...box }) => (
          <Box key={box.label} {...box}>
            {value}
          </Box>
        ))}
      </BoxGrid>
    </div>
  );
}
