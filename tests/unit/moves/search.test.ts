import { describe, expect, it } from "vitest";
import { escapeLike, searchPatterns, searchTextOf } from "@/lib/moves/search";

describe("a search pattern", () => {
  it.each([
    ["100%", "100\\%"],
    ["a_b", "a\\_b"],
    ["back\\slash", "back\\\\slash"],
    ["ZVRX 2783", "ZVRX 2783"],
  ])("takes the wildcards of %s for themselves", (typed, escaped) => expect(escapeLike(typed)).toBe(escaped));

  it("looks for each word by itself, in lower case", () => expect(searchPatterns("  ZVRX   Hollow ")).toEqual(["%zvrx%", "%hollow%"]));
  it("is none for nothing typed", () => expect(searchPatterns("   ")).toEqual([]));
  it("stops at eight words", () => expect(searchPatterns("a b c d e f g h i j")).toHaveLength(8));
});

describe("the text a search looks through", () => {
  const text = searchTextOf({ caseNumber: "26-0041", mark: "ZVRX", number: "2783", aliases: ["VRHL 2783"], places: ["Sand Hollow", "Quill Creek"] });
  it.each(["zvrx 2783", "zvrx2783", "26-0041", "vrhl 2783", "vrhl2783", "sand hollow"])("holds %s", (word) => expect(text).toContain(word));
  it("never outgrows its column", () => expect(searchTextOf({ caseNumber: "1", mark: "Z", number: "1", aliases: [], places: ["x".repeat(3000)] })).toHaveLength(1000));
});
