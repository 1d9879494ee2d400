"use client";

import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { PART_LABELS } from "@/lib/access/vocabulary";
import { removePartyMutation } from "@/lib/parties/options";
import { missingWords, partyRows, type PartyRow } from "@/lib/parties/rows";
import type { Party, PartyLeg, PeopleView } from "@/lib/parties/types";
import { worksWords } from "@/lib/parties/words";

/** Companies by part, with those parts that nobody holds yet. */
export function PartyTable({ moveId, people, edits, onInvite }: { moveId: string; people: PeopleView; edits: boolean; onInvite: (slot: string) => void }) {
  const legOf = (legId: string | null) => people.legs.find((leg) => leg.legId === legId) ?? null;
  return (
    <Table caption="Companies on this move" stack>
      <thead>
        <tr><Th>Part</Th><Th>Company</Th><Th>People</Th>{edits && <Th><span className="sr-only">Changes</span></Th>}</tr>
      </thead>
      <tbody>
        {partyRows(people).map((row) => ("party" in row ? <SeatedRow key={row.key} moveId={moveId} party={row.party} leg={legOf(row.party.legId)} edits={edits} /> : <MissingRow key={row.key} row={row} edits={edits} onInvite={onInvite} />))}
      </tbody>
    </Table>
  );
}

function LegLine({ leg }: { leg: PartyLeg | null }) {
  return leg && <span className="block text-ink-2">leg {leg.seq}, {leg.fromPlace} to {leg.toPlace}</span>;
}

function SeatedRow({ moveId, party, leg, edits }: { moveId: string; party: Party; leg: PartyLeg | null; edits: boolean }) {
  const remove = useWrite(removePartyMutation(moveId));
  return (
    <tr>
      <Td label="Part"><b>{PART_LABELS[party.part]}</b><LegLine leg={leg} /></Td>
      <Td label="Company">{party.companyName}{party.companyMark && <span className="figure text-ink-2"> {party.companyMark}</span>}</Td>
      <Td label="People">
        {party.people.length === 0 ? <State tone="brass">Nobody has joined yet</State> : (
          <ul className="grid gap-1">
            {party.people.map((person) => (
              <li key={person.userId}>
                {person.name}
                {party.part === "carrier" && <span className="text-ink-2">, {worksWords(person) || "no work given"}</span>}
                {person.guest && <> <State>Guest of this move</State></>}
              </li>
            ))}
          </ul>
        )}
      </Td>
      {edits && (
        <Td>
          {party.part !== "owner" && (
            <ConfirmButton opener="Take off" of={`${party.companyName}, ${PART_LABELS[party.part].toLowerCase()}`} title={`Take ${party.companyName} off the move?`} confirm="Take off" body={{ seatId: party.seatId }} write={remove}>
              <p>Its people stop seeing the case at once, and its open letters are void. What they did stays in the record under their names.</p>
              {party.part === "carrier" && <p>Its name stays on the leg; its steps can then be entered for it.</p>}
            </ConfirmButton>
          )}
        </Td>
      )}
    </tr>
  );
}

function MissingRow({ row, edits, onInvite }: { row: Extract<PartyRow, { missing: string }>; edits: boolean; onInvite: (slot: string) => void }) {
  const { title, words } = missingWords(row);
  return (
    <tr>
      <Td label="Part"><b>{PART_LABELS[row.missing]}</b><LegLine leg={row.leg} /></Td>
      <Td label="Company" className="text-ink-2">{title}</Td>
      <Td label="People" className="text-ink-2">{words}</Td>
      {edits && (
        <Td>
          <Button variant="ghost" size="small" onClick={() => onInvite(row.key)}>Invite<span className="sr-only"> {PART_LABELS[row.missing].toLowerCase()}{row.leg ? ` of leg ${row.leg.seq}` : ""}</span></Button>
        </Td>
      )}
    </tr>
  );
}
