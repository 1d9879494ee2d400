"use client";

import { useEffect, useRef, useState } from "react";
import { FilterBar, FilterSelect, FilterText } from "@/components/ui/filter-box";
import { PART_LABELS, PARTS } from "@/lib/access/vocabulary";
import { type MoveFilter } from "@/lib/moves/list-filter";
import { STAGE_LABELS } from "@/lib/moves/stages";
import { STAGES } from "@/lib/standing/vocabulary";

const TYPING_PAUSE_MS = 300;

const WAITING = [
  { value: "me", label: "me" },
  { value: "company", label: "me or my company" },
  { group: "Any of them", choices: PARTS.filter((part) => part !== "carrier").map((part) => ({ value: part, label: PART_LABELS[part] })) },
];

const WHERE = [
  { value: "open", label: "all that are open" },
  { value: "all", label: "all, ended too" },
  { group: "Only", choices: STAGES.map((stage) => ({ value: stage, label: STAGE_LABELS[stage] })) },
];

export type MoveFiltersProps = {
  filter: MoveFilter;
  carriers: readonly string[];
  /** What was typed or chosen, by the names that stand in the address. */
  onChange: (changed: Record<string, string>) => void;
};

/** What narrows the list, in boxes above it. A plain form, so that it works before the page is live. */
export function MoveFilters({ filter, carriers, onChange }: MoveFiltersProps) {
  const [typed, setTyped] = useState(filter.q);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const type = (q: string) => {
    setTyped(q);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => onChange({ q }), TYPING_PAUSE_MS);
  };
  return (
    <search>
      <form
        method="get"
        onSubmit={(event) => {
          event.preventDefault();
          clearTimeout(timer.current);
          onChange({ q: typed });
        }}
      >
        <FilterBar>
          <FilterText name="q" label="Mark, number, place, carrier" placeholder="any" autoComplete="off" maxLength={100} value={typed} onChange={(event) => type(event.target.value)} />
          <FilterSelect name="waiting" label="Waiting on" blank="anyone" choices={WAITING} value={filter.waiting ?? ""} onChange={(event) => onChange({ waiting: event.target.value })} />
          <FilterSelect name="stage" label="How far it is" choices={WHERE} value={filter.stage} onChange={(event) => onChange({ stage: event.target.value })} />
          <FilterSelect
            name="carrier"
            label="Carrier"
            blank="all"
            choices={carriers.map((name) => ({ value: name, label: name }))}
            value={filter.carrier ?? ""}
            onChange={(event) => onChange({ carrier: event.target.value })}
          />
        </FilterBar>
      </form>
    </search>
  );
}
