import { State } from "@/components/ui/state";
import { RowHead, Table, Td, Th } from "@/components/ui/table";
import { TextLink } from "@/components/ui/link-button";
import { Mono } from "@/components/ui/text";
import type { FindingView } from "@/lib/findings/types";
import { SEVERITY_LABELS } from "@/lib/findings/vocabulary";
import { shortStateWords } from "@/lib/findings/words";
import { airNote } from "@/lib/inspections/rules";
import { routes } from "@/lib/routes";
import { isOver, toneOfFinding } from "./finding-tone";

const photoWords = ({ photoCount }: FindingView) => (photoCount === 0 ? "no photo" : photoCount === 1 ? "1 photo" : `${photoCount} photos`);

export type FindingTableProps = { moveId: string; caption: string; findings: readonly FindingView[]; now: string };

/** The findings of one carrier; on a phone each is a block of its own. */
export function FindingTable({ moveId, caption, findings, now }: FindingTableProps) {
  return (
    <Table caption={caption} stack>
      <thead>
        <tr>
          <Th>No.</Th>
          <Th>Where</Th>
          <Th>Found</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {findings.map((finding) => (
          <Row key={finding.id} moveId={moveId} finding={finding} now={now} />
        ))}
      </tbody>
    </Table>
  );
}

function Row({ moveId, finding, now }: { moveId: string; finding: FindingView; now: string }) {
  const note = airNote(finding.air, finding.group === "brakes");
  const { severity, state } = finding;
  return (
    <tr>
      <Td mono className="max-sm:text-ink-2">{finding.label}</Td>
      <RowHead>
        <TextLink href={routes.finding(moveId, finding.id)} className="inline-flex items-center py-0.5 font-[680] max-sm:min-h-11 max-sm:text-17">{finding.component}</TextLink>
        {finding.where && finding.where !== finding.component && <span className="block text-ink-2">{finding.where}</span>}
        <span className={severity === "stops-move" && !isOver(state) ? "block font-[620] text-oxide" : "block text-ink-2"}>{SEVERITY_LABELS[severity]}</span>
      </RowHead>
      <Td label="Found">
        <div>
          {finding.reading ? <Mono className="block font-semibold">{finding.reading}</Mono> : <span className="line-clamp-2">{finding.observed}</span>}
          <span className="block text-ink-2">{[photoWords(finding), note].filter((part) => part !== null).join(", ")}</span>
        </div>
      </Td>
      <Td label="State">
        <State tone={toneOfFinding(finding)}>{shortStateWords(finding, now)}</State>
      </Td>
    </tr>
  );
}
