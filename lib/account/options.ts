import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import type { AccountView } from "./types";

export const accountKeys = { all: ["account"] as const };

export const accountOptions = () => queryOptions({ queryKey: accountKeys.all, queryFn: ({ signal }) => read<AccountView>(routes.api.account(), signal), refetchInterval: 15_000 });

type Send<B> = { key: string; body: B };

/** A write on the own account; whatever it was, the account is read anew. */
const onAccount = <B>(path: (body: B) => string, method: "POST" | "PUT" | "DELETE", sent: (body: B) => unknown = (body) => body) =>
  mutationOptions({
    mutationFn: ({ key, body }: Send<B>) => call<unknown>(path(body), sent(body), key, method),
    onSettled: (_data, _error, _sent, _result, { client }) => client.invalidateQueries({ queryKey: accountKeys.all }),
  });

export const renameMutation = () => onAccount<{ name: string }>(() => routes.api.account(), "PUT");
export const endSessionMutation = () => onAccount<{ sessionId: string }>(({ sessionId }) => routes.api.session(sessionId), "DELETE", () => ({}));
export const endOtherSessionsMutation = () => onAccount<Record<string, never>>(() => routes.api.sessions(), "DELETE");
export const changePasswordMutation = () => onAccount<{ currentPassword: string; newPassword: string; endOthers: boolean }>(() => routes.api.password(), "POST");
