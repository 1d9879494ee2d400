import type { Connection, RowDataPacket } from "mysql2/promise";
import { unsafeSettings, type ServerVariables } from "./durability";
import { Refused } from "./refused";

/** Reads the settings that the server really runs on, whatever its file says, and refuses those that could lose data. */
export async function requireSafeDatabase(connection: Connection): Promise<void> {
  const [rows] = await connection.query<RowDataPacket[]>("show global variables");
  const variables: ServerVariables = Object.fromEntries(rows.map((row) => [String(row.Variable_name), String(row.Value)]));
  const faults = unsafeSettings(variables);
  if (faults.length > 0) throw new Refused(["The database server's settings are not safe to keep cases in:", ...faults.map((fault) => `  - ${fault}`)].join("\n"));
}
