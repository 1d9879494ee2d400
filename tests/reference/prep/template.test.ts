import { describe, expect, it } from "vitest";
import { BRAKE_SCHEDULES } from "@/lib/moves/vocabulary";
import { chooseTemplate } from "@/lib/prep/choose";
import { RESTORE_BEFORE, RESTORE_STAGES, restoreOrder, restoreTooEarly } from "@/lib/prep/restore-order";
import { PREP_TEMPLATE } from "@/lib/prep/template/all";
import { BRAKE_BY_INSTRUCTION } from "@/lib/prep/template/brake-by-instruction";
import type { PrepTemplateItem } from "@/lib/prep/template/types";

/**
 * Ids as listed in the trade notes, common practice of the trade. Columns: id, evidence letters (P photo, M measurement,
 * V value, T tag), whether it is undone, the hazard named (empty where none is), "m" where the row is from memory.
 */
const NOTES = `
P1 P    undone fall
P2 P    undone -
P3 PT   undone permit
P4 PV   undone hot.work
P5 V    undone -
P6 P    undone -         m
P7 V    undone lock
P8 V    undone -         m
E1 PT   undone hydrogen
E2 PV   undone heavy
E3 P    undone -         m
E4 P    undone -
E5 P    undone -
E6 PV   undone hot
E7 PV   undone heavy
E8 PV   undone -         m
E9 V    undone -
A1 P    undone -
A2 P    undone brakes
A3 P    undone air
A4 P    undone brakes
A5 PV   undone air
A6 PV   undone pinch
A7 P    undone stencil
A8 PV   undone pressure  m
A9 PV   undone pressure  m
A10 P   undone -
A11 P   undone air
A12 P   -      air
A13 M   undone pinch
A14 PV  undone roll-away
A15 P   undone -         m
A16 P   undone fall
A17 V   undone -         m
R1 P    -      -
R2 V    undone -         m
R3 V    undone -
R4 M    undone -
R5 M    -      pinch     m
R6 P    -      -
R7a P   -      -
R7b P   -      -         m
R8 M    -      -         m
D1 MP   -      pinch     m
D2 P    -      -
D3 P    undone -
B1 P    undone cuts
B2 PT   undone -
B3 P    undone -         m
B4 P    -      -
B5 P    -      -         m
B6 P    -      -         m
B7 P    undone -
B8 V    undone -         m
B9 V    -      asbestos
T1 PT   undone -         m
T2 PT   undone -
T3 PT   undone -
T4 PT   undone -
T5 V    undone -
`
  .trim()
  .split("\n")
  .map((line) => line.split(/\s+/))
  .map(([id = "", evidence = "", undone = "", hazard = "", memory = ""]) => ({
    id,
    evidence,
    undone: undone === "undone",
    hazard: hazard === "-" ? null : new RegExp(hazard, "i"),
    memory: memory === "m",
  }));

/** Rows of our own for protection and pickup. */
const OURS = ["S1", "S2", "S3", "C1", "C2", "C3", "C4", "C5", "C6"];

const full = { brakeSchedule: "26-L", headEndPower: true, muFitted: true, motorsTraction: "dc", plainBearings: false, engineFitted: true } as const;
const checklist = chooseTemplate(full);
const byId = new Map(checklist.map((item) => [item.id, item]));
const item = (id: string): PrepTemplateItem => {
  const found = byId.get(id);
  if (!found) throw new Error(`No item ${id}`);
  return found;
};
const ids = (items: readonly { id: string }[]) => items.map(({ id }) => id);
const sorted = (list: readonly string[]) => [...list].sort();

describe("the template against the trade notes", () => {
  it("holds exactly the ids of the notes and our own rows", () => {
    const expected = sorted([...NOTES.map(({ id }) => id), ...OURS]);
    expect(sorted([...new Set(ids(PREP_TEMPLATE))])).toEqual(expected);
    expect(sorted(ids(checklist))).toEqual(expected);
  });

  it.each(NOTES)("$id asks for the evidence of the notes", ({ id, evidence }) => {
    const asked = item(id).evidence;
    if (evidence.includes("P")) expect(asked.photo).toBe(true);
    if (evidence.includes("M")) expect(asked.measurement).toBe(true);
    if (evidence.includes("V")) expect(asked.value).not.toBeNull();
    if (evidence.includes("T")) expect(asked.tag).toBe(true);
    expect(asked.tag).toBe(evidence.includes("T"));
    expect(asked.measurement).toBe(evidence.includes("M"));
  });

  it.each(NOTES)("$id is undone only where the notes undo it", ({ id, undone }) => {
    expect(item(id).restore !== null).toBe(undone);
  });

  it.each(NOTES.filter(({ hazard }) => hazard))("$id carries the caution of the notes", ({ id, hazard }) => {
    expect(item(id).caution).toMatch(hazard ?? /^$/);
  });

  it.each(NOTES)("$id says where it comes from", ({ id, memory }) => {
    expect(item(id).source).toBe(memory ? "common practice" : "published");
  });

  it.each([...PREP_TEMPLATE])("$id says what, why and when, in sentences", (row) => {
    for (const text of [row.action, row.why, row.when]) expect(text).toMatch(/^[A-Z].+\.$/s);
    for (const text of [row.caution, row.restore?.action ?? null, row.restore?.caution ?? null]) if (text !== null) expect(text).toMatch(/^[A-Z].+\.$/s);
    expect(row.evidence.photo || row.evidence.measurement || row.evidence.tag || row.evidence.value !== null).toBe(true);
  });

  it("never tells a position by the way a handle points", () => {
    for (const row of PREP_TEMPLATE) expect(row.action, row.id).not.toMatch(/across|along the pipe/i);
    for (const id of ["A6", "A7"]) expect(item(id).caution).toMatch(/handle across the pipe means open/);
  });
});

describe("phases and order", () => {
  it("keeps for pickup only what needs the carrier's engine", () => {
    expect(ids(checklist.filter((row) => row.phase === "when-coupled"))).toEqual(["C1", "C2", "C3", "A9", "C4", "C5", "C6"]);
  });

  it("starts with protection, hand brake and chocks, and looks at the hand brake again last", () => {
    const standing = ids(checklist.filter((row) => row.phase === "where-it-stands"));
    expect(standing.slice(0, 3)).toEqual(["S1", "S2", "S3"]);
    expect(standing.at(-1)).toBe("A14");
  });

  it.each([
    ["A13", "A5", "piston travel is measured while there is air"],
    ["A12", "A5", "hoses are blown through while there is air"],
    ["A10", "E1", "the brake is set up before the battery switch opens"],
    ["E4", "E1", "loads are off before the battery switch opens"],
    ["T5", "B2", "papers and lists lie inside before the doors are locked"],
  ])("%s comes before %s: %s", (first, then) => {
    expect(item(first).order).toBeLessThan(item(then).order);
  });

  it("gives every row of a checklist its own place", () => {
    const places = checklist.map((row) => `${row.phase} ${row.order}`);
    expect(new Set(places).size).toBe(places.length);
  });

  it("warns at the battery switch that electronic brake equipment comes first", () => {
    expect(item("E1").caution).toMatch(/Electronic brake equipment is set up before this switch opens/);
  });

  it("releases the hand brake only when coupled", () => {
    expect(item("A14").action).toMatch(/released only when coupled \(C5\)/);
    expect(item("C5").action).toMatch(/A14/);
  });
});

describe("what is not confirmed stays open", () => {
  it("the multiple-unit valve: sources disagree", () => {
    expect(item("A4").why).toMatch(/Sources disagree/);
    expect(item("A4").evidence.value).not.toBeNull();
  });

  it("25 to 30 psi: from memory", () => {
    expect(item("A8").action).toMatch(/25 to 30 psi.*from memory, not confirmed/);
  });

  it.each(BRAKE_SCHEDULES.filter((schedule) => schedule !== "26-L"))("%s gets no steps of another schedule", (brakeSchedule) => {
    const rows = chooseTemplate({ ...full, brakeSchedule }).filter((row) => /^A([1-9]|10)$/.test(row.id));
    expect(ids(rows).length).toBe(10);
    for (const row of rows) {
      expect(BRAKE_BY_INSTRUCTION).toContain(row);
      expect(row.action).toMatch(/: per carrier's instruction\./);
      expect(row.action).not.toMatch(/psi|HANDLE|OUT\b|LEAD|TRAIL|\bopen\b|\bclosed?\b/);
      expect(row.evidence.photo && row.evidence.value !== null).toBe(true);
    }
  });
});

describe("choosing by what is known", () => {
  it("keeps everything when nothing is known, with the brake by instruction", () => {
    const unknown = chooseTemplate({});
    expect(sorted(ids(unknown))).toEqual(sorted(ids(checklist)));
    expect(unknown.find((row) => row.id === "A2")?.action).toMatch(/per carrier's instruction/);
    expect(unknown.find((row) => row.id === "A4")?.action).toMatch(/per carrier's instruction/);
    expect(chooseTemplate({ brakeSchedule: null, muFitted: null })).toEqual(unknown);
  });

  it.each([
    [{ muFitted: false }, ["A11", "A4"]],
    [{ muFitted: false, headEndPower: false }, ["A11", "A4", "E8"]],
    [{ headEndPower: false }, []],
    [{ motorsTraction: "none" as const }, ["E6", "E7", "R2", "R3"]],
    [{ engineFitted: false }, ["E3", "P1", "P3", "P4", "P5", "P6", "P7", "P8"]],
  ])("%j leaves out %j", (known, left) => {
    const kept = ids(chooseTemplate({ ...full, ...known }));
    expect(sorted(ids(checklist).filter((id) => !kept.includes(id)))).toEqual(left);
  });

  it("asks more of plain bearings once they are known", () => {
    const bearingRow = (plainBearings: boolean | null) => chooseTemplate({ plainBearings }).find((row) => row.id === "R1");
    expect(bearingRow(true)?.action).toMatch(/^Every plain bearing/);
    expect(bearingRow(false)?.action).toMatch(/^Every journal bearing/);
    expect(bearingRow(null)?.action).toMatch(/On plain bearings also/);
  });
});

describe("the way back", () => {
  const back = ids(restoreOrder(checklist));

  it("has a step for every item that is undone, once", () => {
    expect(sorted(back)).toEqual(sorted(ids(checklist.filter((row) => row.restore !== null))));
  });

  it.each(RESTORE_BEFORE)("$first comes before $then", ({ first, then }) => {
    expect(back.indexOf(first)).toBeGreaterThanOrEqual(0);
    expect(back.indexOf(first)).toBeLessThan(back.indexOf(then));
  });

  it("closes the battery switch last of all electrical items", () => {
    const electrical = back.filter((id) => item(id).group === "electrical");
    expect(electrical.at(-1)).toBe("E1");
    expect(item("E1").restore?.action).toMatch(/last.*polarity/);
  });

  it("carries the cautions of the return to service", () => {
    expect(item("P1").restore?.action).toMatch(/before the engine is barred over or started/);
    expect(item("P7").restore?.caution).toMatch(/cocks open while barring/);
    expect(item("E6").restore?.action).toMatch(/insulation .*before any power/);
    expect(item("A7").restore?.action).toMatch(/Close the dead-engine cock/);
    expect(item("A9").restore?.action).toMatch(/Test the locomotive brake/);
  });

  it("ends the brake stage with the brake test", () => {
    expect(restoreOrder(checklist).filter((step) => step.stage === "brakes").at(-1)?.id).toBe("A9");
  });

  it("secures the unit first", () => {
    expect(back.slice(0, 3)).toEqual(["C5", "C6", "C1"]);
  });

  it("names only ids of the template", () => {
    const known = new Set(ids(PREP_TEMPLATE));
    for (const id of RESTORE_STAGES.flatMap((stage) => [...stage.items])) expect(known).toContain(id);
  });

  it("says what has to be put back first", () => {
    expect(restoreTooEarly("E1", new Set(["E6", "P1"]))).toEqual(["Motors pass their insulation test before power comes back."]);
    expect(restoreTooEarly("E1", new Set(["P1"]))).toEqual([]);
  });
});
