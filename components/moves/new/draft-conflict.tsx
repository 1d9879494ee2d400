"use client";

import { Button } from "@/components/ui/button";
import { Sheet } from "@/components/ui/sheet";
import { Table, Td, Th } from "@/components/ui/table";
import { draftDifferences, type DraftForm } from "@/lib/moves/draft";
import { fieldWords } from "@/lib/moves/field-words";

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
              <Td label="Field">{fieldWords(one.path)}</Td>
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
