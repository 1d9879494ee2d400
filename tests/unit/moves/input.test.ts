import { describe, expect, it } from "vitest";
import { fieldErrors } from "@/lib/entry/command";
import { openMoveInput } from "@/lib/moves/input";

const leg = { carrierName: "Quillan & Sandbar", carrierMark: "zqsr", toPlace: "Ardell", toZone: "America/Denver", miles: "174", payer: "ours", payerName: "" };
const last = { carrierName: "Sable Mountain Lines", carrierMark: "", toPlace: "", toZone: "", miles: "", payer: "other", payerName: "Fenn Valley Fund" };
const good = {
  companyId: `com_${"0".repeat(28)}`,
  answers: { mark: " ZVRX ", number: "2783", shape: "hood", "f-end": "short-hood", axles: "6", weight: "362,400", fuel: "" },
  aliases: ["VRHL 2783"],
  origin: { name: "Sand Hollow elevator", place: "Sand Hollow", zone: "America/Chicago" },
  destination: { name: "Vellum Ridge shops", place: "Quill Creek", zone: "America/Denver" },
  legs: [leg, last],
  wantedFrom: "2027-01-04", wantedTo: "", note: "",
};
const faults = (given: unknown) => {
  const parsed = openMoveInput.safeParse(given);
  return parsed.success ? {} : fieldErrors(parsed.error);
};

describe("a move to be opened", () => {
  it("is taken as typed, trimmed, with figures without commas and codes in capitals", () => {
    const parsed = openMoveInput.parse(good);
    expect(parsed.answers).toMatchObject({ mark: "ZVRX", weight: "362400" });
    expect(parsed.legs).toMatchObject([{ carrierMark: "ZQSR", miles: 174 }, { carrierMark: null, miles: null }]);
    expect(parsed).toMatchObject({ draftId: null, wantedFrom: "2027-01-04", wantedTo: null, note: null });
  });

  it("tells every fault at once, each under its field", () => {
    const wrong = {
      ...good, companyId: "", answers: { weight: "9", register: "maybe", "air-date": "2026-02-30", nonsense: "x" }, aliases: ["x".repeat(41)],
      origin: { name: "", place: "", zone: "Nowhere/Else" }, legs: [{ ...leg, carrierName: "", carrierMark: "12", toPlace: "", toZone: "", miles: "far", payer: "other", payerName: "" }, { ...last, payer: "king" }],
      wantedFrom: "2027-02-01", wantedTo: "2027-01-01",
    };
    expect(Object.keys(faults(wrong)).sort()).toEqual([
      "aliases.0", "answers.air-date", "answers.axles", "answers.f-end", "answers.mark", "answers.nonsense", "answers.number", "answers.register", "answers.shape", "answers.weight", "companyId",
      "legs.0.carrierMark", "legs.0.carrierName", "legs.0.miles", "legs.0.payerName", "legs.0.toPlace", "legs.0.toZone", "legs.1.payer", "origin.name", "origin.place", "origin.zone", "wantedTo",
    ]);
  });

  it("says each fault once and in words", () => {
    for (const messages of Object.values(faults({ ...good, legs: [{ ...leg, toPlace: "", carrierMark: "12", miles: "far" }, last] }))) {
      expect(messages).toHaveLength(1);
      expect(messages[0]).toMatch(/^[A-Z].*\.$/);
    }
  });

  it.each([[{ ...good, legs: [] }, "legs"], [{ ...good, legs: "none" }, "legs"], [{ ...good, secret: 1 }, "secret"], [{ ...good, answers: { ...good.answers, mark: "Z\u0007" } }, "answers.mark"], [{ ...good, answers: { ...good.answers, mark: "Z\nX" } }, "answers.mark"]])("is refused: %#", (given, path) => expect(faults(given)).toHaveProperty([path]));

  it("finds no fault with where the last leg ends when the destination is empty", () =>
    expect(Object.keys(faults({ ...good, destination: { name: "", place: "", zone: "" } })).sort()).toEqual(["destination.name", "destination.place", "destination.zone"]));

  it("may leave bearings, coupler and brakes open", () => expect(faults({ ...good, answers: { ...good.answers, bearings: "", coupler: "", brakes: "" } })).toEqual({}));
});
