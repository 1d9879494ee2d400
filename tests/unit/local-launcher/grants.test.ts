import { describe, expect, it } from "vitest";
import { rightChanges, rightFaults, rightsHeld, singleRights } from "@/lib/local/grants";

describe("the rights of the application", () => {
  it("are read one by one, columns too", () => {
    expect(singleRights("SELECT, UPDATE (`state`, `version`), INSERT")).toEqual(["SELECT", "UPDATE(state)", "UPDATE(version)", "INSERT"]);
  });

  it("are read from what the server says, for one schema", () => {
    const lines = [
      "GRANT USAGE ON *.* TO `app`@`127.0.0.1` IDENTIFIED BY PASSWORD '*00'",
      "GRANT ALL PRIVILEGES ON `cases\\_1`.* TO `app`@`127.0.0.1`",
      "GRANT SELECT, UPDATE (`until`) ON `cases_1`.`waits` TO `app`@`127.0.0.1`",
      "GRANT DELETE ON `other`.`waits` TO `app`@`127.0.0.1`",
    ];
    expect(rightsHeld(lines, "cases_1")).toEqual({ "*": ["ALL PRIVILEGES"], waits: ["SELECT", "UPDATE(until)"] });
  });

  it("are left alone when they are as wanted", () => {
    expect(rightChanges({ waits: ["INSERT", "SELECT", "UPDATE(until)"] }, { waits: ["SELECT", "INSERT", "UPDATE(until)"] })).toEqual([]);
  });

  it("lose what is too much and gain what is missing", () => {
    const held = { "*": ["ALL PRIVILEGES"], record: ["SELECT", "UPDATE"], old: ["SELECT"] };
    expect(rightChanges(held, { record: ["SELECT", "INSERT"] })).toEqual([
      { kind: "revoke", table: "*", rights: ["ALL PRIVILEGES"] },
      { kind: "revoke", table: "old", rights: ["SELECT"] },
      { kind: "revoke", table: "record", rights: ["UPDATE"] },
      { kind: "grant", table: "record", rights: ["INSERT"] },
    ]);
  });

  it("have a row for every table, and no other", () => {
    expect(rightFaults(["moves"], { moves: [] })).toEqual([]);
    expect(rightFaults(["moves", "legs"], { moves: [], gone: [] })).toEqual([expect.stringContaining("legs"), expect.stringContaining("gone")]);
  });
});
