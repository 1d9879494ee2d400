import { expect, it } from "vitest";
import { daysOpen, daysWords, splitDays } from "@/lib/moves/days-split";

const at = (day: number, hour = 0) => new Date(Date.UTC(2026, 10, day, hour)).toISOString();

it("adds up what one party took before it rounds, a carrier’s people as one, the open wait up to now", () => {
  const shares = splitDays([
    { part: "contractor", name: "Ibarra", since: at(1), until: at(3, 12) },
    { part: "inspector", name: "Quillan", since: at(3, 12), until: at(5) },
    { part: "contractor", name: "Ibarra", since: at(5), until: at(6, 12) },
    { part: "desk", name: "Quillan", since: at(6, 12), until: null },
  ], at(10));
  expect(shares).toEqual([{ part: "carrier", name: "Quillan", days: 5 }, { part: "contractor", name: "Ibarra", days: 4 }]);
  expect(daysWords(shares)).toBe("5 with carriers, 4 with the contractor");
});

it("leaves out who did not take a whole day", () => expect(splitDays([{ part: "owner", name: "V", since: at(1), until: at(1, 20) }], at(2))).toEqual([]));
it("a case that ended stops counting", () => expect([daysOpen(at(1), null, at(11)), daysOpen(at(1), at(4), at(11))]).toEqual([10, 3]));
