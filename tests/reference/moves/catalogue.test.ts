import { describe, expect, it } from "vitest";
import { answerText, CATALOGUE, findRequirement, MOVE_REQUIREMENTS, UNIT_REQUIREMENTS } from "@/lib/moves/catalogue";
import { REQUIREMENT_GROUPS } from "@/lib/moves/requirements/types";
import { chooseTemplate } from "@/lib/prep/choose";
import { prepFactsOf } from "@/lib/prep/facts";

/** What published carrier pages and tariffs ask, as gathered in the trade notes, and the keys under which it is asked here. */
const ASKED: Record<string, readonly string[]> = {
  "register entry and status": ["register"],
  "mark and number": ["mark", "number"],
  "AEI tags": ["aei"],
  "journal bearing type": ["bearings"],
  "alignment control": ["coupler"],
  "draft gear, drawbar, cut lever, knuckle": ["draft-gear", "coupler-state"],
  "stop blocks": ["stop-blocks"],
  "brake schedule, operative when dead, straight air": ["brakes", "brakes-dead", "straight-air"],
  "air date, stencil and register": ["air-date", "air-date-register"],
  "hand brake": ["hand-brake"],
  wheels: ["wheels"],
  "hose dates": ["hoses"],
  "brake shoes": ["shoes"],
  "gear ratio": ["gear-ratio"],
  "trucks, axles, spacing, truck centers, wheel and journal size": ["axles", "axle-spacing", "truck-centers", "wheel-diameter", "journal-size"],
  "height, width, length, weight": ["height", "width", "length", "weight"],
  "fuel on board": ["fuel"],
  "cooling water": ["water"],
  "cannot be started": ["inoperable"],
  "safe access": ["access"],
  "legal before an inspection is ordered": ["legal"],
  windows: ["glazing"],
  "reflective sheeting": ["reflectors"],
  "written authority and payer": ["authority"],
  "credit or prepayment": ["credit"],
  "insurance certificate": ["insurance"],
  "payer on the bill": ["payer-on-bill"],
  "customer number": ["customer-id"],
  attendant: ["rider"],
  notice: ["lead-time"],
};

/** Not asked by a carrier's page, but by an inspector's sheet, the outline drawing or the preparation. */
const OURS = ["model", "built", "shape", "f-end", "traction-motors", "engine", "mu", "head-end-power"];

const keys = CATALOGUE.map(({ key }) => key);

describe("the requirement catalogue", () => {
  it("asks what the trade notes list, and nothing else but our own few", () => {
    expect([...keys].sort()).toEqual([...Object.values(ASKED).flat(), ...OURS].sort());
    expect(new Set(keys).size).toBe(keys.length);
  });

  it.each([...CATALOGUE])("$key is a question with a hint", (requirement) => {
    expect(requirement.question).toMatch(/^[A-Z].+\?$/);
    expect(requirement.hint).toMatch(/^[A-Z].+\.$/);
    expect(requirement.kind === "choice").toBe(requirement.choices !== undefined);
    expect(REQUIREMENT_GROUPS).toContain(requirement.group);
  });

  it("parts what belongs to the unit from what belongs to the move", () => {
    expect(UNIT_REQUIREMENTS.length + MOVE_REQUIREMENTS.length).toBe(CATALOGUE.length);
    expect(MOVE_REQUIREMENTS.map(({ key }) => key)).toEqual(["fuel", "water", "inoperable", "access", "authority", "credit", "insurance", "payer-on-bill", "customer-id", "rider", "lead-time"]);
  });

  it("names each column once", () => {
    const columns = CATALOGUE.flatMap(({ column }) => (column === null ? [] : [column]));
    expect([...columns].sort()).toEqual(["alignment", "axles", "bearings", "brakeSchedule", "builtYear", "fEnd", "mark", "model", "number", "shape", "weightLb"]);
  });

  it.each([
    ["bearings", "plain", "Plain"],
    ["fuel", "180", "180 US gal"],
    ["gear-ratio", "62:15", "62:15"],
    ["gone", "as typed", "as typed"],
  ])("reads %s = %s as %s", (key, value, expected) => {
    expect(answerText(key, value)).toBe(expected);
  });

  it("answers null for an unknown key", () => {
    expect(findRequirement("gone")).toBeNull();
  });
});

describe("from the unit to its checklist", () => {
  const unit = { brakeSchedule: "26-L", bearings: "plain", facts: { mu: "no", "head-end-power": "no", "traction-motors": "dc" } };

  it("uses the answers given and leaves the rest unknown", () => {
    expect(prepFactsOf(unit)).toEqual({ brakeSchedule: "26-L", plainBearings: true, headEndPower: false, muFitted: false, motorsTraction: "dc", engineFitted: null });
  });

  it("reads keys that the catalogue asks", () => {
    for (const key of ["mu", "head-end-power", "traction-motors", "engine"]) expect(findRequirement(key)?.ofEquipment).toBe(true);
  });

  it("leaves cable work out of a unit that has no cables", () => {
    const ids = chooseTemplate(prepFactsOf(unit)).map(({ id }) => id);
    expect(ids).not.toContain("E8");
    expect(ids).toContain("P1");
  });
});
