import { ApiError, missing } from "./api-error";
import type { Books, Scope } from "./books";
import type { Paging } from "./params";

type Item = { id: string; created?: number };

/** One page of a list, newest first. */
export function page<T extends Item>(items: readonly T[], url: string, { limit = 10, starting_after: after, ending_before: before, created }: Paging) {
  const wanted = items.filter((item) => createdWithin(item.created ?? 0, created)).sort((a, b) => (b.created ?? 0) - (a.created ?? 0));
  const indexOf = (id: string, param: string) => {
    const at = wanted.findIndex((item) => item.id === id);
    if (at < 0) throw missing("object", id, param);
    return at;
  };
  const from = after === undefined ? 0 : indexOf(after, "starting_after") + 1;
  const upTo = before === undefined ? wanted.length : indexOf(before, "ending_before");
  const rest = wanted.slice(from, upTo);
  const data = before === undefined ? rest.slice(0, limit) : rest.slice(-limit);
  return { object: "list" as const, url, has_more: rest.length > data.length, data };
}

function createdWithin(at: number, created: Paging["created"]): boolean {
  if (created === undefined) return true;
  if (typeof created === "number") return at === created;
  const { gt = -1, gte = 0, lt = Infinity, lte = Infinity } = created;
  return at > gt && at >= gte && at < lt && at <= lte;
}

/** What `expand` may open, as steps from an object to the one that it names. */
type Openers = Record<string, (id: string) => object | undefined>;

/** Puts whole objects in the place of ids where the caller asked for them. */
export function expand(books: Books, object: object, paths: readonly string[] | undefined): object {
  const openers: Openers = {
    payment_intent: (id) => books.intents.get(id)?.object,
    latest_charge: (id) => books.charges.get(id)?.object,
    charge: (id) => books.charges.get(id)?.object,
  };
  return (paths ?? []).reduce((opened, path) => openPath(books, openers, opened, path.split("."), path), object);
}

function openPath(books: Books, openers: Openers, object: object, [name = "", ...rest]: string[], path: string): object {
  const fields = object as Record<string, unknown>;
  if (name === "line_items" && fields.object === "checkout.session") return { ...object, line_items: linesOf(books, String(fields.id)) };
  const opener = openers[name];
  if (!opener || !(name in fields)) throw new ApiError(400, { message: `This property cannot be expanded (${path}).` });
  const value = fields[name];
  const whole = typeof value === "string" ? opener(value) : value;
  if (typeof whole !== "object" || whole === null) return object;
  return { ...object, [name]: rest.length ? openPath(books, openers, whole, rest, path) : whole };
}

const linesOf = (books: Books, id: string) => ({
  object: "list",
  data: books.sessions.get(id)?.lines ?? [],
  has_more: false,
  url: `/v1/checkout/sessions/${id}/line_items`,
});

/** The objects of one account out of a shelf's records. */
export const under = <T>(records: readonly { object: T; scope: Scope }[], scope: Scope): T[] =>
  records.filter((record) => record.scope === scope).map((record) => record.object);
