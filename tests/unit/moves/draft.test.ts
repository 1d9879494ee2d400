import { describe, expect, it } from "vitest";
import { draftDifferences, draftRoute, draftUnit, emptyDraft, readForm, splitAliases, toOpening } from "@/lib/moves/draft";

const form = { ...emptyDraft("com_1"), answers: { mark: "ZVRX", number: "2783" }, origin: { name: "Sand Hollow elevator", place: "Sand Hollow", zone: "America/Chicago" } };

describe("a kept draft", () => {
  it("comes back as it was typed", () => expect(readForm(JSON.parse(JSON.stringify(form)), "com_1")).toEqual(form));
  it.each([{}, { legs: "none", answers: 3, origin: null }, { legs: [{ payer: "king" }, 7] }])("opens whatever it holds: %o", (body) => expect(readForm(body, "com_1").legs.length).toBeGreaterThan(0));
  it("is named by its unit and route", () => expect([draftUnit(form), draftRoute(form)]).toEqual(["ZVRX 2783", "Sand Hollow elevator to destination open"]));
  it("has a name before anything is typed", () => expect([draftUnit({}), draftRoute({})]).toEqual(["Unit not named yet", "origin open to destination open"]));
});

it("other names are split at commas, semicolons and lines, each once", () => expect(splitAliases(" VRHL 2783, 2783;VRHL 2783\n ZVRX 12 ,")).toEqual(["VRHL 2783", "2783", "ZVRX 12"]));

it("a leg’s key stays on the page", () => expect(toOpening(form).legs[0]).not.toHaveProperty("key"));

it("two versions are told apart field by field", () => {
  const other = { ...form, answers: { ...form.answers, number: "2784" }, note: "Call first" };
  expect(draftDifferences(form, other)).toEqual([{ path: "answers.number", mine: "2783", theirs: "2784" }, { path: "note", mine: "", theirs: "Call first" }]);
});
