import { randomBytes } from "node:crypto";
import type { EnteredForInput } from "@/lib/access/input";
import type { Refusal } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import { CARRIER_A, SEATED, type Persona } from "./personas";
import { seedRich, type Rich } from "./rich";
import type { Ids, Row } from "./row";
import { nextCase, seedCase, type Case } from "./scenario";
import { offBoard } from "./steps";

type Who = { right: readonly Persona[]; hidden?: readonly Persona[]; empty?: readonly Persona[]; open?: boolean; own?: boolean; named?: boolean; wrongCode?: Refusal; hiddenCode?: Refusal; told?: Row["told"] };
type Base = Who & { name: string; as?: string };

const OURS = /\b([a-z]{3})_[0-9a-f]{28}\b/g;

/** Every id of ours in it becomes one of nothing, but those of the case for who sits on it. */
function strange<T extends { moveId: string; legA: string; legB: string }>(given: T, persona: Persona): T {
  const made = JSON.parse(JSON.stringify(given).replace(OURS, (_all, kind: string) => `${kind}_${randomBytes(14).toString("hex")}`)) as T;
  const { moveId, legA, legB } = given;
  return SEATED.some((one) => one === persona) ? { ...made, moveId, legA, legB } : made;
}

const shared = ({ name, as, right, hidden = [], empty = [], open = false, own = false, named = true, wrongCode = "not_your_part", hiddenCode = "not_found", told = {} }: Base): Omit<Row, "reads" | "prepare"> =>
  ({ name, ...(as && { as }), right, hidden, empty, open, own, named, wrongCode, hiddenCode, told });

const idsOf = ({ moveId, legA, legB, companies, findingId, photoId, draftId, quoteId, sessionId, paymentSession }: Rich) => ({ moveId, legA, legB, companyId: companies.owner, carrierId: companies.carrierA, findingId, photoId, draftId, quoteId, sessionId, paymentSession });

let known: Promise<Rich> | undefined;

/** The one case that all reads are asked about. */
export const rich = (): Promise<Rich> => (known ??= seedRich());

/** A read: all personas ask the one case that holds every secret. `needle` says what only who is right finds in a list that is open to all; `shows` which secrets the answer is made to hand out. */
export function query(given: Base & { run: (viewer: Viewer, ids: ReturnType<typeof idsOf>) => Promise<unknown>; needle?: (ids: ReturnType<typeof idsOf>) => string; shows?: { what: RegExp; to: readonly Persona[] } }): Row {
  const prepare = async () => {
    const of = await rich();
    const ids = idsOf(of);
    const secrets = of.secrets.map((one) => (given.shows?.what.test(one.what) ? { ...one, may: [...one.may, ...given.shows.to] } : one));
    return { people: of.people, secrets, needle: given.needle?.(ids) ?? null, call: (viewer: Viewer) => given.run(viewer, ids), callStrange: (viewer: Viewer, persona: Persona) => given.run(viewer, strange(ids, persona)) };
  };
  return { ...shared(given), reads: true, prepare };
}

/** Known of every case. */
type Always = { moveId: string; legA: string; legB: string; companyId: string; carrierId: string };

/** A write: each right persona has a case of their own, made ready for just this step; `fresh` also has people of its own, for steps that change people. */
export function step<S extends Ids>(given: Base & { fresh?: true; seed: (of: Case) => Promise<S>; run: (viewer: Viewer, ids: S & Always) => Promise<unknown> }): Row {
  const prepare = async () => {
    const of = await (given.fresh ? seedCase() : nextCase());
    const ids = { moveId: of.moveId, legA: of.legA, legB: of.legB, companyId: of.companies.owner, carrierId: of.companies.carrierA, ...(await given.seed(of)) };
    return { people: of.people, secrets: of.secrets, needle: null, call: (viewer: Viewer) => given.run(viewer, ids), callStrange: (viewer: Viewer, persona: Persona) => given.run(viewer, strange(ids, persona)) };
  };
  return { ...shared(given), reads: false, prepare };
}

/** How news of an absent carrier came in. */
const HEARD: EnteredForInput = { source: "e-mail", heardOn: "2026-11-18", saidBy: "V. Sorrel", reference: null };

type CarrierStep<S extends Ids> = Omit<Base, "as" | "right" | "own"> & {
  own: readonly Persona[];
  /** Who enters it while the carrier of leg A is not on board. */
  enter: readonly Persona[];
  seed: (of: Case) => Promise<S>;
  run: (viewer: Viewer, ids: S & Always, enteredFor: EnteredForInput | null) => Promise<unknown>;
};

/** A step of the carrier of leg A, in three rows: done by itself, entered for one that is not on board, and entered for one that is, which nobody may. */
export function carrierSteps<S extends Ids>({ name, own, enter, hidden = [], seed, run }: CarrierStep<S>): Row[] {
  const seedAbsent = async (of: Case) => {
    const ids = await seed(of);
    await offBoard(of);
    return ids;
  };
  return [
    step<S>({ name, right: own, hidden, seed, run: (viewer, ids) => run(viewer, ids, null) }),
    step<S>({ name, as: "entered for an absent carrier", right: enter, hidden: [...CARRIER_A, ...hidden.filter((one) => !CARRIER_A.includes(one))], seed: seedAbsent, run: (viewer, ids) => run(viewer, ids, HEARD) }),
    step<S>({ name, as: "entered for a carrier on board", right: [], hidden, seed, run: (viewer, ids) => run(viewer, ids, HEARD) }),
  ];
}

/** What asks only who the viewer is: everybody may, each for themselves. */
export const EVERYBODY: readonly Persona[] = [...SEATED, "outsider", "removed", "siteAdmin"];
