import { queryOptions } from "@tanstack/react-query";
import { read } from "@/lib/entry/fetcher";
import { inspectingMutation, inspectionKeys, INSPECTING_REFRESH_MS } from "@/lib/inspections/options";
import { routes } from "@/lib/routes";
import type { Acceptances } from "./types";

export const acceptanceKeys = { ofMove: (moveId: string) => [...inspectionKeys.all(moveId), "acceptances"] as const };

export const acceptancesOptions = (moveId: string) =>
  queryOptions({ queryKey: acceptanceKeys.ofMove(moveId), queryFn: ({ signal }) => read<Acceptances>(routes.api.acceptances(moveId), signal), staleTime: 5_000, refetchInterval: INSPECTING_REFRESH_MS });

export const signAcceptanceMutation = (moveId: string) => inspectingMutation<{ acceptanceId: string }>(moveId, routes.api.acceptances(moveId));

export const withdrawAcceptanceMutation = (moveId: string, acceptanceId: string) => inspectingMutation<{ acceptanceId: string }>(moveId, routes.api.withdrawAcceptance(moveId, acceptanceId));
