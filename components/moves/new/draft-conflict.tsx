"use client";

import { Button } from "@/components/ui/button";
import { Sheet } from "@/components/ui/sheet";
import { Table, Td, Th } from "@/components/ui/table";
import { findRequirement } from "@/lib/moves/catalogue";
import { draftDifferences, type DraftForm } from "@/lib/moves/draft";

const WORDS: Readonly<Record<string, string>> = {
  companyId: "Company", aliases: "Other marks and numbers", "origin.name": "Where it stands", "origin.place": "Where it stands, town", "origin.zone": "Where it stands, time zone",
  "destination.name": "Where it goes", "destination.place": "Where it goes, town", "destination.zone": "Where it goes, time zone", wantedFrom: "Not before", wantedTo: "Wanted by", note: "Note",
};
const LEG_WORDS: Readonly<Record<string, string>> = { carrierName: "carrier", carrierMark: "carrier’s code", toPlace: "interchange", toZone: "time zone", miles: "miles", payer: "who pays", payerName: "payer’s name" };

function wordsOf(path: string): string {
  const [first = "", second = "", third = ""] = path.split(".");
  if (first === "answers") return findRequirement(second)?.question ?? second;
  if (first === "legs") return `Leg ${Number(second) + 1}, ${LEG_WORDS[third] ?? third}`;
  return WORDS[path] ?? path;
}

export type DraftConflictProps = { mine: DraftForm; theirs: DraftForm; onMine: () => void; onTheirs: () => void };

/** Two people wrote the same draft: every field that differs, both ways, and the choice. */
export function DraftConflict({ mine, theirs, onMine, onTheirs }: DraftConflictProps) {
  const differences = draftDifferences(mine, theirs);
  return (
    <Sheet title="This draft was saved from somewhere else too" lead="By a colleague, or by you on another page. Both are shown where they differ; nothing is lost until you choose." className="border-2 border-oxide">
      <Table caption="Where the two differ" stack>
        <thead>
          <tr>
            <Th>Field</Th>
            <Th>On this page</Th>
            <Th>Saved meanwhile</Th>
          </tr>
        </thead>
        <tbody>
          {differences.map((one) => (
            <tr key={one.path}>
              <Td label="Field">{wordsOf(one.path)}</Td>
              <Td label="On this page">{one.mine || "empty"}</Td>
              <Td label="Saved meanwhile">{one.theirs || "empty"}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <div className="mt-4 flex flex-wrap gap-2.5">
        <Button onClick={onMine}>Keep what is on this page</Button>
        <Button variant="ghost" onClick={onTheirs}>
          Take what was saved meanwhile
        </Button>
      </div>
    </Sheet>
  );
}
