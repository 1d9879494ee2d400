import { describe, expect, it } from "vitest";
import { unsafeSettings, type ServerVariables } from "@/lib/local/durability";

const SAFE: ServerVariables = {
  innodb_flush_log_at_trx_commit: "1",
  innodb_doublewrite: "ON",
  innodb_flush_method: "O_DIRECT",
  innodb_rollback_on_timeout: "ON",
  innodb_force_recovery: "0",
  log_bin: "OFF",
  sync_binlog: "0",
  local_infile: "OFF",
  sql_mode: "STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION",
  foreign_key_checks: "ON",
  unique_checks: "ON",
  check_constraint_checks: "ON",
  time_zone: "+00:00",
};

describe("the settings of a database server", () => {
  it.each([
    ["as the launcher sets them", {}],
    ["with a binary log that is written through", { log_bin: "ON", sync_binlog: "1" }],
    ["strict for all tables", { sql_mode: "NO_ENGINE_SUBSTITUTION,STRICT_ALL_TABLES,ERROR_FOR_DIVISION_BY_ZERO" }],
    ["on a machine whose own zone is UTC", { time_zone: "SYSTEM", system_time_zone: "UTC" }],
  ])("are safe %s", (_, change) => {
    expect(unsafeSettings({ ...SAFE, ...change })).toEqual([]);
  });

  it.each([
    ["innodb_flush_log_at_trx_commit", "0"],
    ["innodb_flush_log_at_trx_commit", "2"],
    ["innodb_doublewrite", "OFF"],
    ["innodb_flush_method", "nosync"],
    ["innodb_rollback_on_timeout", "OFF"],
    ["innodb_force_recovery", "6"],
    ["local_infile", "ON"],
    ["sql_mode", ""],
    ["sql_mode", "STRICT_TRANS_TABLES,NO_ENGINE_SUBSTITUTION"],
    ["sql_mode", "ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION"],
    ["foreign_key_checks", "OFF"],
    ["unique_checks", "OFF"],
    ["check_constraint_checks", "OFF"],
    ["time_zone", "America/Chicago"],
    ["time_zone", "SYSTEM"],
  ])("are refused with %s = %s", (name, value) => {
    const faults = unsafeSettings({ ...SAFE, system_time_zone: "CST", [name]: value });
    expect(faults).toHaveLength(1);
    expect(faults[0]).toContain(name);
  });

  it("are refused with a binary log that is not written through", () => {
    expect(unsafeSettings({ ...SAFE, log_bin: "ON" })).toEqual([expect.stringContaining("sync_binlog")]);
  });

  it.each(Object.keys(SAFE).filter((name) => name !== "log_bin"))("are refused when %s cannot be read", (name) => {
    expect(unsafeSettings({ ...SAFE, [name]: undefined })).toEqual([expect.stringContaining(`${name} cannot be read`)]);
  });
});
