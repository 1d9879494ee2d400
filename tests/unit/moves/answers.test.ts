import { describe, expect, it } from "vitest";
import { changedAnswers, joinAnswers, splitAnswers } from "@/lib/moves/answers";
import { unitChanges } from "@/lib/moves/changes";

const answers = { mark: "ZVRX", number: "2783", shape: "hood", "f-end": "short-hood", axles: "6", weight: "362400", brakes: "26-L", bearings: "", coupler: "", fuel: "200", water: "" };

describe("answers and columns", () => {
  const { columns, facts } = splitAnswers(answers);
  it("puts what is computed with into columns and the rest by key", () => {
    expect(columns).toMatchObject({ mark: "ZVRX", axles: 6, weightLb: 362400, model: null, builtYear: null, bearings: "", alignment: "" });
    expect(facts).toEqual({ fuel: "200" });
  });
  it("come back as they were, without the empty ones", () => {
    const { bearings: _b, coupler: _c, water: _w, ...given } = answers;
    expect(joinAnswers(columns, facts)).toEqual(given);
  });
});

describe("what was changed", () => {
  it("is told in the order of the catalogue, empty as nothing", () => {
    expect(changedAnswers({ weight: "1", fuel: "" }, { fuel: "200", weight: "2" })).toEqual([{ key: "weight", before: "1", after: "2" }, { key: "fuel", before: null, after: "200" }]);
  });
  it("is told in words", () => {
    expect(unitChanges({ answers: { weight: "360000" }, aliases: [] }, { answers: { weight: "362400", "hand-brake": "yes" }, aliases: ["VRHL 2783"] })).toEqual([
      { key: "hand-brake", label: "Does the hand brake hold, and does it release fully?", before: null, after: "Holds and releases fully" },
      { key: "weight", label: "How much does it weigh as it will travel?", before: "360,000 lb", after: "362,400 lb" },
      { key: "aliases", label: "Other marks and numbers", before: null, after: "VRHL 2783" },
    ]);
  });
});
