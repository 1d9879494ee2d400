import { existsSync } from "node:fs";
import { join } from "node:path";
import mysql, { type Connection, type RowDataPacket } from "mysql2/promise";
import { pathToFileURL } from "node:url";
import { newId } from "@/lib/ids";
import { databaseUrls } from "./accounts";
import { requireNode } from "./arguments";
import { readEnvFile } from "./environment";
import { keepKeys } from "./keys";
import { portsFrom, START_PORTS } from "./ports";
import { Refused } from "./refused";

const USAGE = "Say whom: npm run admin -- somebody@example.org (or npm run admin -- --not somebody@example.org to take it back).";

/** Reads the words behind `npm run admin --`. */
export function adminWish(words: string[]): { email: string; siteAdmin: boolean } {
  const siteAdmin = words[0] !== "--not";
  const [email, ...rest] = siteAdmin ? words : words.slice(1);
  if (!email?.includes("@") || rest.length > 0) throw new Refused(USAGE);
  return { email: email.normalize("NFC").trim().toLowerCase(), siteAdmin };
}

/** Marks a person who has an account and a checked address as site administrator, or takes it back. Makes no account and no password. */
export async function setSiteAdmin(connection: Connection, { email, siteAdmin }: { email: string; siteAdmin: boolean }, at: Date): Promise<string> {
  const [rows] = await connection.query<RowDataPacket[]>("select id, name, email_verified as checked, disabled_at as disabledAt from users where email = ?", [email]);
  const person = rows[0];
  if (!person) throw new Refused(`Nobody has the address ${email}. Make an account at /sign-up first, then run this again.`);
  if (siteAdmin && !person.checked) throw new Refused(`The address ${email} has not been checked. Open the link that was mailed to it, then run this again.`);
  if (siteAdmin && person.disabledAt) throw new Refused(`The account of ${email} is disabled.`);
  await connection.beginTransaction();
  await connection.query("update users set site_admin = ?, updated_at = ? where id = ?", [siteAdmin, at, person.id]);
  await connection.query("insert into site_log (id, kind, by_user_id, detail, at) values (?, ?, null, ?, ?)", [newId("siteLog"), siteAdmin ? "site-admin.made" : "site-admin.ended", JSON.stringify({ userId: String(person.id), email }), at]);
  await connection.commit();
  return siteAdmin ? `${String(person.name)} (${email}) is a site administrator now.` : `${String(person.name)} (${email}) is no site administrator any more.`;
}

/** The database of the environment, or else that of this local copy. */
function databaseUrl(root: string): string {
  if (process.env.DATABASE_URL) return process.env.DATABASE_URL;
  const folder = join(root, ".data");
  if (!existsSync(join(folder, "keys.json"))) throw new Refused("There is no local copy here and no DATABASE_URL. Start one with npm start, or give DATABASE_URL.");
  return databaseUrls(keepKeys(folder), portsFrom(START_PORTS, process.env.TOWFOLIO_PORT_BASE).database).app;
}

async function main(): Promise<void> {
  requireNode(process.versions.node);
  const root = process.cwd();
  readEnvFile(root);
  const wish = adminWish(process.argv.slice(2));
  const uri = databaseUrl(root);
  let connection: Connection;
  try {
    connection = await mysql.createConnection({ uri, timezone: "Z" });
  } catch (fault) {
    throw new Refused("The database can’t be reached. Is the site running? Start it with npm start in another window.", { cause: fault });
  }
  try {
    process.stdout.write(`${await setSiteAdmin(connection, wish, new Date())}\n`);
  } finally {
    await connection.end();
  }
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? "").href) {
  main().catch((fault: unknown) => {
    process.stderr.write(`${fault instanceof Refused ? fault.message : (fault instanceof Error ? fault.stack : String(fault))}\n`);
    process.exitCode = 1;
  });
}
