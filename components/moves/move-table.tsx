"use client";

import { createColumnHelper, rowSortingFeature, tableFeatures, useTable, type SortingState } from "@tanstack/react-table";
import { useMemo } from "react";
import { State } from "@/components/ui/state";
import { RowHead, Table, Td, Th } from "@/components/ui/table";
import { SORT_KEYS, type MoveFilter, type SortKey } from "@/lib/moves/list-filter";
import { STAGE_LABELS, STAGE_TONES } from "@/lib/moves/stages";
import type { MoveRow } from "@/lib/moves/types";
import { daysOfRow, RouteCell, UnitCell, WaitingCell } from "./move-cells";

/** A row with the moment to which its days are counted. */
type Line = MoveRow & { at: string };

const features = tableFeatures({ rowSortingFeature });
const helper = createColumnHelper<typeof features, Line>();

const columns = helper.columns([
  helper.display({ id: "unit", header: "Unit", enableSorting: true, cell: ({ row }) => <UnitCell row={row.original} /> }),
  helper.display({ id: "from", header: "From, to", cell: ({ row }) => `${row.original.originName} to ${row.original.destinationName}` }),
  helper.display({ id: "route", header: "Route", cell: ({ row }) => <RouteCell row={row.original} /> }),
  helper.display({ id: "waiting", header: "Waiting on", cell: ({ row }) => <WaitingCell row={row.original} at={row.original.at} /> }),
  helper.display({ id: "days", header: "Open, days", cell: ({ row }) => daysOfRow(row.original, row.original.at) }),
  helper.display({ id: "stage", header: "State", cell: ({ row }) => <State tone={STAGE_TONES[row.original.stage]}>{STAGE_LABELS[row.original.stage]}</State> }),
]);

const WIDTHS: Readonly<Record<string, string>> = { route: "sm:w-[17rem] max-lg:sm:hidden", days: "sm:w-20", waiting: "sm:w-56" };

const keyOf = (id: string): SortKey | null => SORT_KEYS.find((key) => key === id) ?? null;

export type MoveTableProps = { rows: readonly MoveRow[]; at: string; filter: MoveFilter; busy: boolean; onSort: (sort: SortKey, descending: boolean) => void };

/** The moves of one page. The server puts them in order; a head that is pressed asks it to. */
export function MoveTable({ rows, at, filter, busy, onSort }: MoveTableProps) {
  const data = useMemo(() => rows.map((row): Line => ({ ...row, at })), [rows, at]);
  const sorting: SortingState = [{ id: filter.sort, desc: filter.descending }];
  const table = useTable({ features, columns, data, state: { sorting }, manualSorting: true, getRowId: (row) => row.moveId });
  return (
    <Table caption="Moves" framed stack aria-busy={busy}>
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => {
              const key = keyOf(header.column.id);
              const sorted = filter.sort === key;
              return (
                <Th key={header.id} className={WIDTHS[header.column.id]} aria-sort={sorted ? (filter.descending ? "descending" : "ascending") : undefined}>
                  {key ? (
                    <button type="button" className="lab inline-flex min-h-6 items-center gap-1.5 text-left underline-offset-4 hover:underline pointer-coarse:min-h-11" onClick={() => onSort(key, sorted ? !filter.descending : false)}>
                      <table.FlexRender header={header} />
                      <SortSign descending={sorted ? filter.descending : null} />
                    </button>
                  ) : (
                    <table.FlexRender header={header} />
                  )}
                </Th>
              );
            })}
          </tr>
        ))}
      </thead>
      <tbody>
        {table.getRowModel().rows.map((row) => (
          <tr key={row.id}>
            {row.getAllCells().map((cell) =>
              cell.column.id === "unit" ? (
                <RowHead key={cell.id}>
                  <table.FlexRender cell={cell} />
                </RowHead>
              ) : (
                <Td key={cell.id} label={String(cell.column.columnDef.header)} mono={cell.column.id === "days"} className={WIDTHS[cell.column.id]}>
                  <table.FlexRender cell={cell} />
                </Td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function SortSign({ descending }: { descending: boolean | null }) {
  return (
    <svg aria-hidden="true" width="8" height="10" viewBox="0 0 8 10" className={descending === null ? "opacity-0" : undefined}>
      <path d={descending ? "M4 9V1M1 6l3 3 3-3" : "M4 1v8M1 4l3-3 3 3"} fill="none" stroke="currentColor" strokeWidth="1.6" />
    </svg>
  );
}
