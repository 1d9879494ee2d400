import { describe, expect, it } from "vitest";
import { DEFAULT_FILTER, filterQuery, narrows, parseFilter, SORT_KEYS } from "@/lib/moves/list-filter";

describe("a filter in an address", () => {
  it("is the usual one when nothing is given", () => expect(parseFilter({})).toEqual(DEFAULT_FILTER));

  it.each([{ q: "ZVRX", stage: "all", sort: "-unit", page: "3" }, { waiting: "me", carrier: "Quillan & Sandbar" }, { waiting: "inspector", sort: "waiting" }, { stage: "interchange", page: "1" }])(
    "reads what it writes: %o",
    (given) => {
      const filter = parseFilter(given);
      expect(parseFilter(Object.fromEntries(new URLSearchParams(filterQuery(filter))))).toEqual(filter);
    },
  );

  it.each([{ sort: "drop table" }, { page: "-1" }, { page: "1e9" }, { page: "x" }, { waiting: "nobody" }, { stage: "" }, { sort: ["", "unit"] }])("takes what it does not know for not given: %o", (given) =>
    expect(parseFilter(given)).toEqual(DEFAULT_FILTER),
  );

  it("writes nothing for the usual list", () => expect(filterQuery(DEFAULT_FILTER)).toBe(""));
  it("keeps every order apart", () => {
    const orders = SORT_KEYS.flatMap((sort) => [false, true].map((descending) => filterQuery({ ...DEFAULT_FILTER, sort, descending })));
    expect(new Set(orders).size).toBe(SORT_KEYS.length * 2);
  });
  it("order and page do not narrow", () => expect(narrows({ ...DEFAULT_FILTER, sort: "unit", page: 2 })).toBe(false));
  it("a word narrows", () => expect(narrows({ ...DEFAULT_FILTER, q: "x" })).toBe(true));
});
