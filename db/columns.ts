import { customType, date, datetime, text, varchar } from "drizzle-orm/mysql-core";

/** Prefixed id such as `mov_0193…`; ascii and binary, so that only the very same id is equal. Wide enough for the sign-in library's own ids. */
export const id = (name: string) => customType<{ data: string }>({ dataType: () => "varchar(64) character set ascii collate ascii_bin" })(name);

/** Lower-case hex SHA-256. */
export const sha256 = (name: string) => customType<{ data: string }>({ dataType: () => "char(64) character set ascii collate ascii_bin" })(name);

/** Short code in plain ascii: a kind, a state, a key. */
export const code = (name: string) => customType<{ data: string }>({ dataType: () => "varchar(120) character set ascii collate ascii_bin" })(name);

/** Moment in UTC, milliseconds kept. */
export const instant = (name: string) => datetime(name, { mode: "date", fsp: 3 });

/** Calendar day as `2026-11-24`, without time or zone. */
export const day = (name: string) => date(name, { mode: "string" });

/** One line of text that a person typed. */
export const label = (name: string) => varchar(name, { length: 200 });

/** Several lines that a person typed; the doors cap it well below this. */
export const words = (name: string) => text(name);

/** IANA zone of a place, such as `America/Chicago`. */
export const zone = (name: string) => varchar(name, { length: 60 });

/** JSON as MariaDB keeps it (checked text); accepts text or object on the way back, as the driver's habit differs by version. */
export const jsonText = <T>(name: string) =>
  customType<{ data: T; driverData: string }>({
    dataType: () => "json",
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (value) => (typeof value === "string" ? JSON.parse(value) : value) as T,
  })(name);
