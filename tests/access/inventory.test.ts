import { expect, it } from "vitest";
import { actionsOf, doorsOf, importersOf, inlineActionsOf, offeredBy, pagesOf, readTree, type Offered } from "./inventory";
import { INNER, INNER_NAMED_BY, INNER_TAKES, PLUMBING, WRITE_PATH } from "./inner";
import { ACTIONS_TABLE } from "./rows/actions";
import { DOORS } from "./rows/doors";
import { PAGES } from "./rows/pages";
import { TABLE } from "./table";

const tree = readTree();
const offered = offeredBy(tree);

const isInner = ({ room, name }: Pick<Offered, "room" | "name">) => INNER[room]?.includes(name) ?? false;

/** Sentences for what is there without a row, and for rows of what is not there. */
function differences(what: string, there: readonly string[], rows: readonly string[]): string[] {
  return [
    ...there.filter((name) => !rows.includes(name)).map((name) => `${what} ${name} has no row in tests/access/rows: say who may.`),
    ...[...new Set(rows)].filter((name) => !there.includes(name)).map((name) => `A row in tests/access/rows is for ${what.toLowerCase()} ${name}, which is not there.`),
  ];
}

it("reads every room that has rows", () => {
  expect(offered.length).toBeGreaterThan(40);
  expect(Object.keys(TABLE).filter((room) => !offered.some((one) => one.room === room))).toEqual([]);
});

it("every query and command has a row, and no row is left over", () => {
  const there = offered.filter((one) => !isInner(one)).map(({ room, name }) => `${room}.${name}`);
  const rows = Object.entries(TABLE).flatMap(([room, list]) => list.map(({ name }) => `${room}.${name}`));
  expect(differences("The query or command", there, rows)).toEqual([]);
});

it("no row is there twice", () => {
  const titles = Object.entries(TABLE).flatMap(([room, rows]) => rows.map(({ name, as = "" }) => `${room}.${name} ${as}`));
  expect(titles.filter((title, index) => titles.indexOf(title) !== index)).toEqual([]);
});

it("every query and command takes the viewer first", () => {
  const others = offered.filter((one) => !isInner(one) && one.takesFirst !== "viewer");
  expect(others.map(({ file, name, takesFirst }) => `${name} in ${file} takes ${takesFirst ?? "nothing"} first`)).toEqual([]);
});

it("inner functions take the transaction of whoever calls them, and only queries and commands do", () => {
  const faults = Object.entries(INNER).flatMap(([room, names]) => names.flatMap((name) => {
    const found = offered.find((one) => one.room === room && one.name === name);
    if (!found) return [`The inner function ${room}.${name} is not there.`];
    const takes = INNER_TAKES.includes(found.takesFirst ?? "") || WRITE_PATH.includes(name) ? [] : [`${room}.${name} takes ${found.takesFirst ?? "nothing"} first, not ${INNER_TAKES.join(" or ")}.`];
    const strangers = importersOf(tree, found).filter((path) => !/^lib\/[a-z-]+\/(?:queries|commands)[./]/.test(path) && !PLUMBING.test(path) && !INNER_NAMED_BY[name]?.includes(path));
    return [...takes, ...strangers.map((path) => `${path} calls ${room}.${name}, which asks nobody.`)];
  }));
  expect(faults).toEqual([]);
});

it("every door has a row, and no row is left over", () => {
  expect(differences("The door", doorsOf(tree), DOORS.map(({ door }) => door))).toEqual([]);
});

it("every page has a row, and no row is left over", () => {
  expect(differences("The page", pagesOf(tree), PAGES.map(({ page }) => page))).toEqual([]);
});

it("every server action has a row, and no row is left over", () => {
  expect(differences("The server action", actionsOf(tree), Object.keys(ACTIONS_TABLE))).toEqual([]);
});

it("no function is made a server action in passing", () => {
  expect(inlineActionsOf(tree)).toEqual([]);
});
