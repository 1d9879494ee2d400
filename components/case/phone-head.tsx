import Link from "next/link";
import { MarkStencil } from "@/components/drawing/mark-stencil";
import type { CaseFile } from "@/lib/moves/types";
import { routes } from "@/lib/routes";
import { headBoxes } from "./head-boxes";

/** What of a case's head stays on a phone while somebody works in one of its parts: the mark, and whose turn it is. */
export function PhoneHead({ file }: { file: CaseFile }) {
  const waiting = headBoxes(file).find((box) => box.tone === "waiting");
  return (
    <div className="border border-rule-strong bg-sheet sm:hidden">
      <div className="flex items-center justify-between gap-3 px-4 py-2.5">
        <h1>
          <MarkStencil mark={file.unit.mark} number={file.unit.number} size="row" />
        </h1>
        <Link href={routes.move(file.moveId)} className="inline-link inline-flex min-h-11 items-center text-14">
          Whole case
        </Link>
      </div>
      {waiting && (
        <p className="border-t border-rule bg-brass-wash px-4 py-2 text-14">
          <span className="text-ink-2">Waiting on </span>
          <span className="font-[620]">{waiting.value}</span>
          {waiting.detail && <span className="text-ink-2">, {waiting.detail}</span>}
        </p>
      )}
    </div>
  );
}
