import { keepPreviousData, mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import type { OutboxState } from "@/lib/outbox/vocabulary";
import { routes } from "@/lib/routes";
import type { CompanySearch } from "./search";
import type { AdminCompany, AdminMail, AdminPerson } from "./types";

export const adminKeys = {
  all: ["admin"] as const,
  companies: (search: CompanySearch) => [...adminKeys.all, "companies", search] as const,
  people: (search: string) => [...adminKeys.all, "people", search] as const,
  mail: (state: OutboxState | null) => [...adminKeys.all, "mail", state] as const,
};

const live = { refetchInterval: 15_000, placeholderData: keepPreviousData };

export const adminCompaniesOptions = (given: CompanySearch) =>
  queryOptions({ queryKey: adminKeys.companies(given), queryFn: ({ signal }) => read<AdminCompany[]>(`${routes.api.adminCompanies()}?${new URLSearchParams({ q: given.search, doubled: given.doubled ? "1" : "" })}`, signal), ...live });

export const adminPeopleOptions = (search: string) =>
  queryOptions({ queryKey: adminKeys.people(search), queryFn: ({ signal }) => read<AdminPerson[]>(`${routes.api.adminPeople()}?${new URLSearchParams({ q: search })}`, signal), ...live });

export const adminMailOptions = (state: OutboxState | null) =>
  queryOptions({ queryKey: adminKeys.mail(state), queryFn: ({ signal }) => read<AdminMail[]>(`${routes.api.adminMail()}?${new URLSearchParams({ state: state ?? "" })}`, signal), ...live });

const onSite = <B>(path: (body: B) => string, sent: (body: B) => unknown = () => ({})) =>
  mutationOptions({
    mutationFn: ({ key, body }: { key: string; body: B }) => call<unknown>(path(body), sent(body), key),
    onSettled: (_data, _error, _sent, _result, { client }) => client.invalidateQueries({ queryKey: adminKeys.all }),
  });

export const mergeCompaniesMutation = () => onSite<{ keepId: string; goneId: string }>(() => routes.api.adminMerge(), (body) => body);
export const personMutation = (act: "disable" | "enable" | "end-sessions") => onSite<{ userId: string }>(({ userId }) => routes.api.adminPerson(userId, act));
export const retryMailMutation = () => onSite<{ outboxId: string }>(({ outboxId }) => routes.api.adminMailRetry(outboxId));
