"use client";

import { useQuery } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useTransition, type ReactNode } from "react";
import { Empty } from "@/components/ui/empty";
import { LinkButton } from "@/components/ui/link-button";
import { PageHead } from "@/components/ui/page-head";
import { Pager } from "@/components/ui/pager";
import { filterQuery, narrows, PAGE_SIZE, parseFilter, type MoveFilter } from "@/lib/moves/list-filter";
import { movesOptions } from "@/lib/moves/options";
import type { MovePage } from "@/lib/moves/types";
import { routes } from "@/lib/routes";
import { MoveFilters } from "./move-filters";
import { MoveTable } from "./move-table";

const addressOf = (filter: MoveFilter) => `${routes.moves()}${filterQuery(filter)}`;

/** "4 open, 2 wait on you or your company." */
function headWords({ open, waitingOnYou }: MovePage): string {
  const waiting = waitingOnYou === 0 ? "None waits" : waitingOnYou === 1 ? "1 waits" : `${waitingOnYou} wait`;
  return `${open} open. ${waiting} on you or your company.`;
}

function pageWords({ total, rows }: MovePage, page: number): string {
  const first = (page - 1) * PAGE_SIZE + 1;
  return `${first} to ${first + rows.length - 1} of ${total} moves`;
}

function NothingHere({ filter, total }: { filter: MoveFilter; total: number }) {
  if (total > 0) {
    return (
      <Empty title="There are fewer moves than that." action={<LinkButton href={addressOf({ ...filter, page: 1 })} variant="ghost">To the first page</LinkButton>}>
        This page of the list is empty; some moves may have ended since.
      </Empty>
    );
  }
  if (narrows(filter)) {
    return (
      <Empty title="No move fits." action={<LinkButton href={routes.moves()} variant="ghost">Show all open moves</LinkButton>}>
        Look at the boxes above: each of them narrows the list. Words are looked for in marks, numbers, other names of the unit, places and carriers.
      </Empty>
    );
  }
  return (
    <Empty title="No moves yet." action={<LinkButton href={routes.newMove()}>Open a move</LinkButton>}>
      A move is the case file of one locomotive that goes by rail dead in tow. Its owner opens it: the unit, from where to where, over which carriers, and who pays. If another company opened one and wants you
      on it, you get a letter with a link; the move then stands here.
    </Empty>
  );
}

export type MoveListProps = {
  filter: MoveFilter;
  carriers: readonly string[];
  /** Stands between the head and the list: the drafts. */
  children?: ReactNode;
};

/** The viewer's moves. What narrows and orders them stands in the address, so that it can be sent to somebody and the back button works. */
export function MoveList({ filter, carriers, children }: MoveListProps) {
  const router = useRouter();
  const [going, startGoing] = useTransition();
  const { data, isPlaceholderData, isError } = useQuery(movesOptions(filter));
  const go = (next: MoveFilter, replace = false) => {
    const move = replace ? router.replace : router.push;
    startGoing(() => move(addressOf(next), { scroll: false }));
  };
  const narrow = (changed: Record<string, string>) => {
    const current = Object.fromEntries(new URLSearchParams(filterQuery(filter)));
    go(parseFilter({ ...current, ...changed, page: "1" }), "q" in changed);
  };
  const page = data?.filter.page ?? filter.page;
  const pages = Math.ceil((data?.total ?? 0) / PAGE_SIZE);
  return (
    <>
      <PageHead title="Moves" lead={data ? headWords(data) : " "} actions={<LinkButton href={routes.newMove()}>Open a move</LinkButton>} />
      {children}
      <MoveFilters filter={filter} carriers={carriers} onChange={narrow} />
      {data && data.rows.length > 0 && (
        <MoveTable rows={data.rows} at={data.at} filter={filter} busy={going || isPlaceholderData} onSort={(sort, descending) => go({ ...filter, sort, descending, page: 1 })} />
      )}
      {data && data.rows.length === 0 && (
        <div className="border border-rule-strong bg-sheet p-4 sm:p-6">
          <NothingHere filter={filter} total={data.total} />
        </div>
      )}
      {data && data.rows.length > 0 && (
        <Pager label="Pages of moves" words={pageWords(data, page)} previousHref={page > 1 ? addressOf({ ...filter, page: page - 1 }) : null} nextHref={page < pages ? addressOf({ ...filter, page: page + 1 }) : null} />
      )}
      <p role="status" className="mt-2 text-14 text-ink-2">
        {isError && "No connection. The list stands as it was last read."}
      </p>
    </>
  );
}
