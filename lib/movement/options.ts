import { mutationOptions, queryOptions, type QueryClient } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { moveKeys } from "@/lib/moves/options";
import { routes } from "@/lib/routes";
import type { Movement } from "./types";

export const movementKeys = { ofMove: (moveId: string) => ["movement", moveId] as const };

export const movementOptions = (moveId: string) =>
  queryOptions({ queryKey: movementKeys.ofMove(moveId), queryFn: ({ signal }) => read<Movement>(routes.api.movement(moveId), signal), staleTime: 5_000, refetchInterval: 15_000 });

type Sent = { key: string; body: Record<string, unknown> };

const readAnew = (client: QueryClient, moveId: string) =>
  Promise.all([client.invalidateQueries({ queryKey: movementKeys.ofMove(moveId) }), client.invalidateQueries({ queryKey: moveKeys.case(moveId) })]);

const mutation = <V extends Sent>(moveId: string, path: (sent: V) => string) =>
  mutationOptions({
    mutationFn: (sent: V) => call(path(sent), sent.body, sent.key),
    onSuccess: (_data, _sent, _result, { client }) => readAnew(client, moveId),
    // A refusal is shown at once; what it was about is read anew beside it.
    onError: (_error, _sent, _result, { client }) => void readAnew(client, moveId),
  });

export const giveInstructionMutation = (moveId: string) => mutation(moveId, () => routes.api.instructions(moveId));
export const withdrawInstructionMutation = (moveId: string) => mutation(moveId, ({ instructionId }: Sent & { instructionId: string }) => routes.api.withdrawInstruction(moveId, instructionId));
export const releaseUnitMutation = (moveId: string) => mutation(moveId, () => routes.api.release(moveId));
export const makeSightingMutation = (moveId: string) => mutation(moveId, () => routes.api.sightings(moveId));
export const retractSightingMutation = (moveId: string) => mutation(moveId, ({ sightingId }: Sent & { sightingId: string }) => routes.api.retractSighting(moveId, sightingId));
export const recordArrivalMutation = (moveId: string) => mutation(moveId, () => routes.api.arrival(moveId));
export const closeMoveMutation = (moveId: string) => mutation(moveId, () => routes.api.closeMove(moveId));
