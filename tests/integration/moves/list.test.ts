import { describe, expect, it } from "vitest";
import { cancelMove, openMove } from "@/lib/moves/commands";
import { DEFAULT_FILTER, type MoveFilter } from "@/lib/moves/list-filter";
import { listCarrierNames, listMoves } from "@/lib/moves/queries";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedMove, seedPerson } from "../../support/factories";
import { anOpening, countStatements } from "./support";

const database = withDatabase();

const DAY = 86_400_000;
const START = Date.UTC(2026, 8, 1);

async function aFleet(units: { mark: string; number: string; alias?: string; origin?: string; carrier?: string }[]): Promise<{ owner: Viewer; companyId: string; moveIds: string[] }> {
  const companyId = await seedCompany("Vellum Ridge");
  const owner = await seedPerson("R. Okafor", companyId, { manager: true });
  const moveIds: string[] = [];
  for (const [at, { mark, number, alias, origin = "Sand Hollow", carrier = "Quillan & Sandbar" }] of units.entries()) {
    const base = anOpening(companyId);
    const input = { ...base, answers: { ...base.answers, mark, number }, aliases: alias ? [alias] : [], origin: { ...base.origin, name: origin }, legs: base.legs.map((leg, seq) => (seq === 0 ? { ...leg, carrierName: carrier } : leg)) };
    moveIds.push((await openMove(owner, input, anAttempt({ at: new Date(START + at * DAY) }))).moveId);
  }
  return { owner, companyId, moveIds };
}

const numbers = async (viewer: Viewer, filter: Partial<MoveFilter>) => (await listMoves(viewer, { ...DEFAULT_FILTER, ...filter })).rows.map((row) => row.number);

describe("looking for a move", () => {
  const fleet = async () => aFleet([
    { mark: "ZVRX", number: "2783", alias: "VRHL 100%" },
    { mark: "ZKMX", number: "18", origin: "Perrin_Dock", carrier: "Perrin Dock Terminal" },
    { mark: "ZTBX", number: "4401", origin: "PerrinXDock" },
  ]);

  it("takes %, _ and \\ for what they are", async () => {
    const { owner } = await fleet();
    expect(await numbers(owner, { q: "%" })).toEqual(["2783"]);
    expect(await numbers(owner, { q: "100%" })).toEqual(["2783"]);
    expect(await numbers(owner, { q: "perrin_dock" })).toEqual(["18"]);
    expect(await numbers(owner, { q: "\\" })).toEqual([]);
    expect(await numbers(owner, { q: "' or 1=1 --" })).toEqual([]);
  });

  it("finds mark and number together or apart, other names, places and carriers; every word counts", async () => {
    const { owner } = await fleet();
    for (const q of ["zvrx 2783", "ZVRX2783", "2783 zvrx", "vrhl", "100"]) expect(await numbers(owner, { q })).toEqual(["2783"]);
    expect(await numbers(owner, { q: "perrin terminal" })).toEqual(["18"]);
    expect(await numbers(owner, { q: "zvrx 18" })).toEqual([]);
  });

  it("narrows by carrier, by part and by how far it is", async () => {
    const { owner, moveIds } = await fleet();
    expect(await numbers(owner, { carrier: "Perrin Dock Terminal" })).toEqual(["18"]);
    expect(await listCarrierNames(owner)).toEqual(["Perrin Dock Terminal", "Quillan & Sandbar", "Sable Mountain Lines"]);
    expect(await numbers(owner, { waiting: "me" })).toHaveLength(3);
    expect(await numbers(owner, { waiting: "inspector" })).toEqual([]);
    await cancelMove(owner, { moveId: moveIds[0] ?? "", reason: "Sold" }, anAttempt());
    expect(await numbers(owner, {})).toHaveLength(2);
    expect(await numbers(owner, { stage: "all" })).toHaveLength(3);
    expect(await numbers(owner, { stage: "cancelled" })).toEqual(["2783"]);
  });

  it("orders by each head both ways; numbers as numbers", async () => {
    const { owner } = await aFleet([{ mark: "ZA", number: "100" }, { mark: "ZA", number: "99" }, { mark: "ZB", number: "1" }]);
    expect(await numbers(owner, { sort: "unit", descending: false })).toEqual(["99", "100", "1"]);
    expect(await numbers(owner, { sort: "unit", descending: true })).toEqual(["1", "100", "99"]);
    expect(await numbers(owner, { sort: "days", descending: true })).toEqual(["100", "99", "1"]);
    expect(await numbers(owner, { sort: "days", descending: false })).toEqual(["1", "99", "100"]);
    expect(await numbers(owner, {})).toEqual(["100", "99", "1"]);
  });
});

describe("many moves", () => {
  it("are paged without a gap or a repeat, and take the same number of statements whether they are 10 or 200", async () => {
    const small = await aFleet(Array.from({ length: 10 }, (_, at) => ({ mark: "ZS", number: String(at) })));
    const large = await aFleet(Array.from({ length: 200 }, (_, at) => ({ mark: "ZL", number: String(at) })));
    const filter: MoveFilter = { ...DEFAULT_FILTER, q: "z", sort: "from" };
    const few = await countStatements(() => listMoves(small.owner, filter));
    expect(await countStatements(() => listMoves(large.owner, filter))).toBe(few);
    expect(few).toBeLessThanOrEqual(6);
    const pages = await Promise.all([1, 2, 3, 4, 5, 6, 7, 8, 9].map((page) => listMoves(large.owner, { ...filter, page })));
    expect(pages.map((page) => page.rows.length)).toEqual([25, 25, 25, 25, 25, 25, 25, 25, 0]);
    expect(new Set(pages.flatMap((page) => page.rows.map((row) => row.moveId))).size).toBe(200);
    expect(pages[0]).toMatchObject({ total: 200, open: 200, waitingOnYou: 200 });
  }, 120_000);
});

describe("whose list it is", () => {
  it("holds only moves on which the viewer’s companies sit", async () => {
    const { moveId, owner, inspectorA, deskB, payer, outsider, removed } = await seedMove();
    for (const viewer of [owner, inspectorA, deskB, payer]) expect((await listMoves(viewer, DEFAULT_FILTER)).rows.map((row) => row.moveId)).toEqual([moveId]);
    for (const viewer of [outsider, removed]) expect(await listMoves(viewer, { ...DEFAULT_FILTER, stage: "all" })).toMatchObject({ rows: [], total: 0, open: 0, waitingOnYou: 0 });
  });

  it("tells whose turn it is: the inspector’s own, his company’s, nobody else’s", async () => {
    const { moveId, contractor, inspectorA, clerkA, inspectorB } = await seedMove();
    const mine = async (viewer: Viewer) => {
      const { rows, waitingOnYou } = await listMoves(viewer, DEFAULT_FILTER);
      return [rows[0]?.waiting?.you, rows[0]?.waiting?.yourCompany, waitingOnYou];
    };
    expect(await mine(contractor)).toEqual([true, false, 1]);
    const { root } = database;
    const admin = await root();
    await admin.query("update moves m join legs l on l.move_id = m.id and l.seq = 1 set m.waiting_part = 'inspector', m.waiting_for = 'inspect', m.waiting_leg_id = l.id where m.id = ?", [moveId]);
    await admin.end();
    expect(await mine(inspectorA)).toEqual([true, false, 1]);
    expect(await mine(clerkA)).toEqual([false, true, 1]);
    expect(await mine(inspectorB)).toEqual([false, false, 0]);
    expect(await numbers(inspectorA, { waiting: "me" })).toEqual(["2783"]);
    expect(await numbers(clerkA, { waiting: "me" })).toEqual([]);
    expect(await numbers(clerkA, { waiting: "company" })).toEqual(["2783"]);
  });
});
