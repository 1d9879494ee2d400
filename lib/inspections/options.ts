import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { moveKeys } from "@/lib/moves/options";
import { routes } from "@/lib/routes";
import type { Inspections } from "./types";

/** Visits, findings and acceptances of a move hang together: after a write on one all are read anew. */
export const inspectionKeys = {
  all: (moveId: string) => ["inspecting", moveId] as const,
  visits: (moveId: string) => [...inspectionKeys.all(moveId), "visits"] as const,
};

/** How often what others may have changed is read while somebody looks at it. */
export const INSPECTING_REFRESH_MS = 12_000;

export const inspectionsOptions = (moveId: string) =>
  queryOptions({ queryKey: inspectionKeys.visits(moveId), queryFn: ({ signal }) => read<Inspections>(routes.api.inspections(moveId), signal), staleTime: 5_000, refetchInterval: INSPECTING_REFRESH_MS });

/** One write of a carrier's inspector or of an answer; `key` stays the same while the same thing is tried again. */
export type Sent = { key: string; body: Record<string, unknown> };

/** Never shown before the server has said so. */
export const inspectingMutation = <Answer>(moveId: string, path: string) =>
  mutationOptions({
    mutationFn: ({ key, body }: Sent) => call<Answer>(path, body, key),
    onSettled: (_answer, _error, _sent, _result, { client }) =>
      Promise.all([client.invalidateQueries({ queryKey: inspectionKeys.all(moveId) }), client.invalidateQueries({ queryKey: moveKeys.case(moveId) })]),
  });

export const recordVisitMutation = (moveId: string) => inspectingMutation<{ inspectionId: string; legId: string; number: number }>(moveId, routes.api.inspections(moveId));
