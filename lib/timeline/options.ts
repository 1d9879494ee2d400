import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import { read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import type { Timeline } from "./types";

export const timelineKeys = {
  ofMove: (moveId: string) => ["timeline", moveId] as const,
  page: (moveId: string, show: number) => [...timelineKeys.ofMove(moveId), show] as const,
};

/** What happened on a move; read again while it is looked at. */
export const timelineOptions = (moveId: string, show: number) =>
  queryOptions({
    queryKey: timelineKeys.page(moveId, show),
    queryFn: ({ signal }) => read<Timeline>(`${routes.api.timeline(moveId)}?show=${show}`, signal),
    refetchInterval: 15_000,
    staleTime: 5_000,
    placeholderData: keepPreviousData,
  });
