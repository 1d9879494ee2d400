import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { moveKeys } from "@/lib/moves/options";
import { routes } from "@/lib/routes";
import type { PrepList } from "./types";
import type { PrepPhase } from "./vocabulary";

export const prepKeys = { ofMove: (moveId: string) => ["prep", moveId] as const };

export const prepOptions = (moveId: string) =>
  queryOptions({ queryKey: prepKeys.ofMove(moveId), queryFn: ({ signal }) => read<PrepList>(routes.api.prep(moveId), signal), staleTime: 5_000, refetchInterval: 15_000 });

type Sent<T> = { key: string; body: T };
export type Act = "done" | "skip" | "reopen";
export type RestoreAct = "restored" | "kept" | "reopen";

/** Writes of the prep list; each takes the key of one intent, so that pressing twice does it once. */
const mutation = <V extends { key: string; body: unknown }>(moveId: string, path: (sent: V) => string) =>
  mutationOptions({
    mutationFn: (sent: V) => call(path(sent), sent.body, sent.key),
    onSettled: (_data, _error, _sent, _result, { client }) =>
      Promise.all([client.invalidateQueries({ queryKey: prepKeys.ofMove(moveId) }), client.invalidateQueries({ queryKey: moveKeys.case(moveId) })]),
  });

export const prepItemMutation = (moveId: string) => mutation(moveId, ({ itemId, act }: Sent<Record<string, unknown>> & { itemId: string; act: Act }) => routes.api.prepItem(moveId, itemId, act));
export const restoreItemMutation = (moveId: string) => mutation(moveId, ({ itemId, act }: Sent<Record<string, unknown>> & { itemId: string; act: RestoreAct }) => routes.api.restoreItem(moveId, itemId, act));
export const signPhaseMutation = (moveId: string) => mutation<Sent<{ phase: PrepPhase; name: string; rowsHash: string }>>(moveId, () => routes.api.prepSign(moveId));
