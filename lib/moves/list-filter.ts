import { PARTS, type Part } from "@/lib/access/vocabulary";
import { STAGES, type Stage } from "@/lib/standing/vocabulary";

/** Columns by which the list can be put in order; `waiting` and `days` count days, so the longest come last unless descending. */
export const SORT_KEYS = ["waiting", "days", "unit", "from", "stage"] as const;
export type SortKey = (typeof SORT_KEYS)[number];

/** `me`: what the viewer can do; `company`: what waits on any of their companies; otherwise one part. */
export type WaitingFilter = "me" | "company" | Part;

/** `open` hides what is closed or cancelled. */
export type StageFilter = "open" | "all" | Stage;

export type MoveFilter = { q: string; waiting: WaitingFilter | null; stage: StageFilter; carrier: string | null; sort: SortKey; descending: boolean; page: number };

export const DEFAULT_FILTER: MoveFilter = { q: "", waiting: null, stage: "open", carrier: null, sort: "waiting", descending: true, page: 1 };

export const PAGE_SIZE = 25;
const MAX_PAGE = 10_000;

const WAITING: readonly WaitingFilter[] = ["me", "company", ...PARTS];
const STAGE_CHOICES: readonly StageFilter[] = ["open", "all", ...STAGES];

type Given = Readonly<Record<string, string | readonly string[] | undefined>>;

const one = (value: string | readonly string[] | undefined) => (typeof value === "string" ? value : (value?.[0] ?? "")).trim();
const oneOf = <T extends string>(list: readonly T[], value: string): T | null => list.find((item) => item === value) ?? null;

/** A filter as it stands in an address. What is not known there counts as not given, so that an old link still opens. */
export function parseFilter(given: Given): MoveFilter {
  const sort = one(given.sort);
  const key = oneOf(SORT_KEYS, sort.replace(/^-/, ""));
  const page = Number(one(given.page));
  return {
    q: one(given.q).slice(0, 100),
    waiting: oneOf(WAITING, one(given.waiting)),
    stage: oneOf(STAGE_CHOICES, one(given.stage)) ?? "open",
    carrier: one(given.carrier).slice(0, 200) || null,
    sort: key ?? DEFAULT_FILTER.sort,
    descending: key ? sort.startsWith("-") : DEFAULT_FILTER.descending,
    page: Number.isInteger(page) && page >= 1 && page <= MAX_PAGE ? page : 1,
  };
}

/** The filter as the end of an address; only what differs from the usual is written, empty when nothing does. */
export function filterQuery(filter: MoveFilter): string {
  const query = new URLSearchParams();
  if (filter.q) query.set("q", filter.q);
  if (filter.waiting) query.set("waiting", filter.waiting);
  if (filter.stage !== DEFAULT_FILTER.stage) query.set("stage", filter.stage);
  if (filter.carrier) query.set("carrier", filter.carrier);
  if (filter.sort !== DEFAULT_FILTER.sort || filter.descending !== DEFAULT_FILTER.descending) query.set("sort", `${filter.descending ? "-" : ""}${filter.sort}`);
  if (filter.page > 1) query.set("page", String(filter.page));
  const text = query.toString();
  return text ? `?${text}` : "";
}

/** Whether anything but order and page narrows the list. */
export const narrows = (filter: MoveFilter) => filter.q !== "" || filter.waiting !== null || filter.stage !== DEFAULT_FILTER.stage || filter.carrier !== null;
