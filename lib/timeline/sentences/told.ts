import type { Detail } from "../detail";
import type { Sentence } from "../types";

/** How one kind of entry is told. */
export type Told = {
  /** Who may read its particulars; everybody, where left out. */
  area?: "prep" | "findings" | "money" | "unit";
  /** All that others read. */
  plain: string;
  tell: (detail: Detail) => Sentence;
  /** A note for those who may read one more area. */
  aside?: { area: "money"; note: (detail: Detail) => string | null };
  /** Words for a run of them in one day. */
  folded?: (n: number) => string;
  /** Which part of the case it belongs to. */
  place?: "prep" | "findings" | "fees" | "movement" | "people" | "unit";
};

/** For kinds that say the same to everybody who reads them. */
export const toAll = (plain: string, tell: Told["tell"], place?: Told["place"]): Told => ({ plain, tell, ...(place && { place }) });
