import { expect, it } from "vitest";
import { caseNumberOf } from "@/lib/moves/case-number";

it.each([
  [2026, 1, "26-0001"],
  [2026, 41, "26-0041"],
  [2099, 9999, "99-9999"],
  [2100, 12345, "00-12345"],
])("%i, %i is %s", (year, running, number) => expect(caseNumberOf(year, running)).toBe(number));
