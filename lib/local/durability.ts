/** The server's own variables by name, as text. */
export type ServerVariables = Record<string, string | undefined>;

type Rule = { name: string; safe: (value: string, all: ServerVariables) => boolean; wanted: string; otherwise: string };

const STRICT_MODES = ["ERROR_FOR_DIVISION_BY_ZERO", "NO_ENGINE_SUBSTITUTION"];

const is = (wanted: string) => (value: string) => value.toUpperCase() === wanted;

const RULES: Rule[] = [
  { name: "innodb_flush_log_at_trx_commit", safe: is("1"), wanted: "1", otherwise: "a power cut loses writes that were already acknowledged" },
  { name: "innodb_doublewrite", safe: is("ON"), wanted: "ON", otherwise: "a power cut can leave half-written pages" },
  { name: "innodb_flush_method", safe: is("O_DIRECT"), wanted: "O_DIRECT", otherwise: "writes may wait in the operating system" },
  { name: "innodb_rollback_on_timeout", safe: is("ON"), wanted: "ON", otherwise: "a lock wait undoes only half of a transaction" },
  { name: "innodb_force_recovery", safe: is("0"), wanted: "0", otherwise: "the server runs in a rescue mode" },
  { name: "sync_binlog", safe: (value, all) => all.log_bin?.toUpperCase() !== "ON" || value === "1", wanted: "1 while log_bin is ON", otherwise: "the binary log can miss acknowledged writes" },
  { name: "local_infile", safe: is("OFF"), wanted: "OFF", otherwise: "files of this machine could be read through the database" },
  { name: "sql_mode", safe: isStrict, wanted: `STRICT_TRANS_TABLES, ${STRICT_MODES.join(", ")}`, otherwise: "values that do not fit are changed silently" },
  { name: "foreign_key_checks", safe: is("ON"), wanted: "ON", otherwise: "rows can point at nothing" },
  { name: "unique_checks", safe: is("ON"), wanted: "ON", otherwise: "doubled rows can slip in" },
  { name: "check_constraint_checks", safe: is("ON"), wanted: "ON", otherwise: "rows can break their table's rules" },
  { name: "time_zone", safe: isUtc, wanted: "+00:00", otherwise: "the database would stamp rows in local time" },
];

/** What of a database server's settings would lose or bend data: one sentence each; empty when all is safe. */
export function unsafeSettings(variables: ServerVariables): string[] {
  return RULES.flatMap(({ name, safe, wanted, otherwise }) => {
    const value = variables[name];
    if (value === undefined) return [`${name} cannot be read; it has to be ${wanted}, or ${otherwise}.`];
    return safe(value, variables) ? [] : [`${name} is ${value === "" ? "empty" : value}; it has to be ${wanted}, or ${otherwise}.`];
  });
}

function isStrict(value: string): boolean {
  const modes = value.toUpperCase().split(",");
  return (modes.includes("STRICT_TRANS_TABLES") || modes.includes("STRICT_ALL_TABLES")) && STRICT_MODES.every((mode) => modes.includes(mode));
}

function isUtc(value: string, all: ServerVariables): boolean {
  return ["+00:00", "UTC"].includes(value) || (value === "SYSTEM" && all.system_time_zone === "UTC");
}
