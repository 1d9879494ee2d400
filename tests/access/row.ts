import type { Refusal } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import type { Persona } from "./personas";
import type { Secret } from "./secrets";

/** What a call needs to know of a scenario: ids, versions, words. No people. */
export type Ids = { readonly [key: string]: string | number | null | readonly string[] | readonly [string, string] };

/** A scenario made ready for one row. */
export type Ready = {
  people: Record<Persona, Viewer>;
  call: (viewer: Viewer) => Promise<unknown>;
  /** The same with ids that belong to nothing; for who sits on the case, within the case. */
  callStrange: (viewer: Viewer, persona: Persona) => Promise<unknown>;
  secrets: readonly Secret[];
  /** What only a right persona finds in the answer of a list that everybody may ask for. */
  needle: string | null;
};

/** Who may call a query or command, and how everybody else is told. Seated personas that are not named are refused as acting in a wrong part. */
export type Row = {
  name: string;
  /** Which case of it, when there are several. */
  as?: string;
  /** Succeed. */
  right: readonly Persona[];
  /** Learn no more than an outsider. */
  hidden: readonly Persona[];
  /** May ask, and get `null`. */
  empty: readonly Persona[];
  /** Anybody signed in may ask; only who is right finds the needle. */
  open: boolean;
  /** How a wrong part is refused. */
  wrongCode: Refusal;
  /** How an outsider is refused; the same words as for an id of nothing. */
  hiddenCode: Refusal;
  /** Outsiders whom something else stops before. */
  told: Partial<Record<Persona, Refusal>>;
  /** True for what neither policy nor scope has a say in: it asks who the viewer is or which companies are theirs, and nothing else. */
  own: boolean;
  /** False for what names nothing by id, so that it can't be asked about nothing. */
  named: boolean;
  /** True for a read: every persona asks one scenario that holds every kind of secret. */
  reads: boolean;
  prepare: () => Promise<Ready>;
};
