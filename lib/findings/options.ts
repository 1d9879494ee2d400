import { queryOptions } from "@tanstack/react-query";
import { read } from "@/lib/entry/fetcher";
import { inspectingMutation, inspectionKeys, INSPECTING_REFRESH_MS } from "@/lib/inspections/options";
import { routes } from "@/lib/routes";
import type { FindingAct } from "./rules";
import type { FindingDetail, FindingsBoard } from "./types";

export const findingKeys = {
  board: (moveId: string) => [...inspectionKeys.all(moveId), "findings"] as const,
  one: (moveId: string, findingId: string) => [...inspectionKeys.all(moveId), "findings", findingId] as const,
};

export const findingsOptions = (moveId: string) =>
  queryOptions({ queryKey: findingKeys.board(moveId), queryFn: ({ signal }) => read<FindingsBoard>(routes.api.findings(moveId), signal), staleTime: 5_000, refetchInterval: INSPECTING_REFRESH_MS });

export const findingOptions = (moveId: string, findingId: string) =>
  queryOptions({ queryKey: findingKeys.one(moveId, findingId), queryFn: ({ signal }) => read<FindingDetail>(routes.api.finding(moveId, findingId), signal), staleTime: 5_000, refetchInterval: INSPECTING_REFRESH_MS });

export const postFindingMutation = (moveId: string) => inspectingMutation<{ findingId: string; number: string; acceptanceWithdrawn: boolean }>(moveId, routes.api.findings(moveId));

export const findingActMutation = (moveId: string, findingId: string, act: FindingAct) => inspectingMutation<{ version: number }>(moveId, routes.api.findingAct(moveId, findingId, act));
