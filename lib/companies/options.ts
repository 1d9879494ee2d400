import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import type { CompanySummary, CompanyView } from "./types";

export const companyKeys = { all: ["companies"] as const, list: () => [...companyKeys.all, "list"] as const, one: (companyId: string) => [...companyKeys.all, companyId] as const };

export const companiesOptions = () => queryOptions({ queryKey: companyKeys.list(), queryFn: ({ signal }) => read<CompanySummary[]>(routes.api.companies(), signal), refetchInterval: 15_000 });

export const companyOptions = (companyId: string) =>
  queryOptions({ queryKey: companyKeys.one(companyId), queryFn: ({ signal }) => read<CompanyView>(routes.api.company(companyId), signal), refetchInterval: 15_000 });

export type CompanyFacts = { name: string; mark: string; phone: string };
type Works = { inspects: boolean; bills: boolean; dispatches: boolean };
type Send<B> = { key: string; body: B };

/** A write on a company; afterwards the companies are read anew. */
const onCompany = <B, T = unknown>(path: (body: B) => string, method: "POST" | "PUT" | "DELETE", sent: (body: B) => unknown = (body) => body) =>
  mutationOptions({
    mutationFn: ({ key, body }: Send<B>) => call<T>(path(body), sent(body), key, method),
    onSettled: (_data, _error, _sent, _result, { client }) => client.invalidateQueries({ queryKey: companyKeys.all }),
  });

export const makeCompanyMutation = () => onCompany<CompanyFacts, { companyId: string }>(() => routes.api.companies(), "POST");
export const editCompanyMutation = (companyId: string) => onCompany<CompanyFacts & { version: number }>(() => routes.api.company(companyId), "PUT");
export const admitMemberMutation = (companyId: string) => onCompany<Works & { userId: string }>(({ userId }) => routes.api.member(companyId, userId), "POST");
export const changeMemberMutation = (companyId: string) => onCompany<Works & { userId: string; manager: boolean }>(({ userId }) => routes.api.member(companyId, userId), "PUT");
export const removeMemberMutation = (companyId: string) => onCompany<{ userId: string }>(({ userId }) => routes.api.member(companyId, userId), "DELETE", () => ({}));
export const inviteColleagueMutation = (companyId: string) => onCompany<Works & { email: string; name: string }>(() => routes.api.companyInvitations(companyId), "POST");
export const colleagueAgainMutation = (companyId: string) => onCompany<{ invitationId: string }>(({ invitationId }) => routes.api.companyInvitationAgain(companyId, invitationId), "POST", () => ({}));
export const revokeColleagueMutation = (companyId: string) => onCompany<{ invitationId: string }>(({ invitationId }) => routes.api.companyInvitation(companyId, invitationId), "DELETE", () => ({}));
