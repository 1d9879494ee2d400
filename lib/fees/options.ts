import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { moveKeys } from "@/lib/moves/options";
import { routes } from "@/lib/routes";
import type { ClearForm, QuoteForm, VoidForm } from "./input";
import type { FeesView } from "./types";

export const feeKeys = { ofMove: (moveId: string) => ["fees", moveId] as const };

/** The fees that the viewer may see, read again while they are looked at. */
export const feesOptions = (moveId: string) =>
  queryOptions({ queryKey: feeKeys.ofMove(moveId), queryFn: ({ signal }) => read<FeesView>(routes.api.fees(moveId), signal), staleTime: 5_000, refetchInterval: 15_000 });

/** One write on fees; each takes the key of one intent, so that pressing twice does it once. Fees and the case's head are read anew, fees also while another page shows, since the form for a quote leads back to them. */
const mutation = <V extends { key: string }, T>(moveId: string, run: (sent: V) => Promise<T>) =>
  mutationOptions({
    mutationFn: run,
    onSettled: (_data, _error, _sent, _result, { client }) =>
      Promise.all([client.invalidateQueries({ queryKey: feeKeys.ofMove(moveId), refetchType: "all" }), client.invalidateQueries({ queryKey: moveKeys.case(moveId) })]),
  });

/** As typed; what is missing or not a word of ours, the server says. */
type Body<T> = Omit<T, "moveId" | "quoteId" | "enteredFor" | "lines"> & { enteredFor: object | null };
type QuoteBody = Body<QuoteForm> & { lines: readonly { kind: string; description: string; amount: string }[] };

export const giveQuoteMutation = (moveId: string) => mutation(moveId, ({ body, key }: { body: QuoteBody; key: string }) => call<{ quoteId: string }>(routes.api.quotes(moveId), body, key));

export const agreeMutation = (moveId: string, quoteId: string) => mutation(moveId, ({ key }: { key: string }) => call<{ quoteId: string }>(routes.api.quoteAct(moveId, quoteId, "agree"), {}, key));

export const voidMutation = (moveId: string, quoteId: string) => mutation(moveId, ({ body, key }: { body: Body<VoidForm>; key: string }) => call<{ quoteId: string }>(routes.api.quoteAct(moveId, quoteId, "void"), body, key));

/** Gives the address of the payment page. */
export const payMutation = (moveId: string, quoteId: string) => mutation(moveId, ({ key }: { key: string }) => call<{ paymentId: string; url: string }>(routes.api.quoteAct(moveId, quoteId, "pay"), {}, key));

export const clearMutation = (moveId: string) => mutation(moveId, ({ body, key }: { body: Body<ClearForm>; key: string }) => call<{ clearanceId: string }>(routes.api.clearBilling(moveId), body, key));
