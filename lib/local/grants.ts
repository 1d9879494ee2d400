/** What the application may do with each table: `SELECT`, or `UPDATE(a, b)` for a right on some columns only. */
export type TableRights = Record<string, readonly string[]>;

/** One change of rights, ready to be written as a grant or a revoke. */
export type RightChange = { kind: "grant" | "revoke"; table: string; rights: string[] };

const GRANT_LINE = /^GRANT (.+?) ON `((?:[^`]|``)+)`\.(?:`((?:[^`]|``)+)`|(\*)) TO /i;
const RIGHT = /([A-Za-z ]+?)\s*(?:\(([^)]*)\))?\s*(?:,|$)/g;

/** Splits a list of rights into single ones, columns too, so that two lists can be compared: `UPDATE(a)`, `UPDATE(b)`. */
export function singleRights(list: string): string[] {
  return [...list.matchAll(RIGHT)].flatMap(([, word = "", columns]) => {
    const right = word.trim().toUpperCase();
    if (columns === undefined) return [right];
    return columns.split(",").map((column) => `${right}(${column.replaceAll("`", "").trim()})`);
  });
}

/** Reads what `show grants` says of one schema: rights by table, "*" standing for the whole schema. */
export function rightsHeld(lines: string[], schema: string): TableRights {
  const held: Record<string, string[]> = {};
  for (const line of lines) {
    const [, rights = "", on, table, all] = GRANT_LINE.exec(line) ?? [];
    if (on?.replaceAll("\\", "") === schema) held[table ?? all ?? "*"] = singleRights(rights);
  }
  return held;
}

/** The grants and revokes that turn what is held into what is wanted; none when they agree. */
export function rightChanges(held: TableRights, wanted: TableRights): RightChange[] {
  const tables = [...new Set([...Object.keys(held), ...Object.keys(wanted)])].sort();
  return tables.flatMap((table) => {
    const now = held[table] ?? [];
    const then = (wanted[table] ?? []).flatMap(singleRights);
    const surplus = now.filter((right) => !then.includes(right));
    const missing = then.filter((right) => !now.includes(right));
    return [change("revoke", table, surplus), change("grant", table, missing)].filter(({ rights }) => rights.length > 0);
  });
}

function change(kind: RightChange["kind"], table: string, rights: string[]): RightChange {
  return { kind, table, rights };
}

/** Tables without a row among the rights, and rows without a table: each in one sentence. */
export function rightFaults(tables: string[], wanted: TableRights): string[] {
  return [
    ...tables.filter((table) => !(table in wanted)).map((table) => `The table ${table} has no row in db/grants.ts.`),
    ...Object.keys(wanted).filter((table) => !tables.includes(table)).map((table) => `db/grants.ts names the table ${table}, which the database does not have.`),
  ];
}
