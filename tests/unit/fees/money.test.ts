import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatMoney, readMoney, sumCents } from "@/lib/fees/money";

describe("an amount as typed", () => {
  it.each([
    ["4,185.00", 418_500], ["4185", 418_500], ["4185.00", 418_500], ["$4,185.00", 418_500], ["$ 4,185", 418_500], [" 12.34 ", 1234],
    ["0.50", 50], ["0.01", 1], ["1,000,000.00", null], ["999,999.99", 99_999_999], ["19.99", 1999], ["1.10", 110], ["0.29", 29], ["4.35", 435], ["1,234,567", null], ["007", 700],
  ])("%s", (typed, cents) => {
    expect(readMoney(typed).cents).toBe(cents);
  });

  it.each([
    ["", "Enter an amount."], ["   ", "Enter an amount."], ["$", "Enter an amount."],
    ["0", "above zero"], ["0.00", "above zero"], ["-5", "above zero"], ["(5.00)", "above zero"],
    ["4.185,00", "after a point"], ["12,5", "after a point"], ["1,85", "after a point"],
    ["4185.5", "two digits"], ["4185.", "two digits"], ["4185.005", "two digits"], [".", "two digits"],
    ["41,85,000", "every three digits"], ["4,1850", "every three digits"], [",185", "every three digits"], ["1.000.000", "every three digits"],
    ["1e3", "such as"], ["four", "such as"], ["0x10", "such as"], ["١٢٣", "such as"], ["12 000", "such as"], ["5 USD", "such as"], ["NaN", "such as"], ["Infinity", "such as"], ["1,000.00.00", "every three digits"],
    ["1000000", "At most"], ["9".repeat(400), "At most"],
  ])("%s is refused in words", (typed, words) => {
    const { cents, fault } = readMoney(typed);
    expect(cents).toBeNull();
    expect(fault).toContain(words);
  });

  it("reads back exactly what it prints, for every amount", () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 99_999_999 }), (cents) => readMoney(formatMoney(cents)).cents === cents));
  });
});

it.each([[0, "$0.00"], [5, "$0.05"], [418_500, "$4,185.00"], [100, "$1.00"], [99_999_999, "$999,999.99"], [123_456_789_00, "$123,456,789.00"], [-418_500, "−$4,185.00"]])("%i cents print as %s", (cents, text) => {
  expect(formatMoney(cents)).toBe(text);
});

it("sums in whole cents", () => {
  expect(sumCents([{ amountCents: 10 }, { amountCents: 20 }, { amountCents: 29 }])).toBe(59);
  expect(sumCents([])).toBe(0);
});
