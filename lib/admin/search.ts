import { OUTBOX_STATES, type OutboxState } from "@/lib/outbox/vocabulary";

/** What the administration's lists are narrowed to, as it stands in the address. */
export type CompanySearch = { search: string; doubled: boolean };

const first = (value: string | string[] | null | undefined) => (Array.isArray(value) ? value[0] : value) ?? "";
type Given = Record<string, string | string[] | undefined>;

export const companySearchOf = (given: Given): CompanySearch => ({ search: first(given.q).slice(0, 200), doubled: first(given.doubled) === "1" });
export const personSearchOf = (given: Given): string => first(given.q).slice(0, 254);
export const mailStateOf = (given: Given): OutboxState | null => OUTBOX_STATES.find((state) => state === first(given.state)) ?? null;
