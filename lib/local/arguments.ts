import { Refused } from "./refused";

/** How `npm start` was asked to run. */
export type StartMode = "site" | "development" | "database";

const FLAGS: Record<string, StartMode> = { "--dev": "development", "--database": "database" };

/** Reads the words behind `npm start --`: none for the built site, --dev, or --database for the database alone. */
export function startMode(words: string[]): StartMode {
  const [first, ...rest] = words;
  if (first === undefined) return "site";
  const mode = FLAGS[first];
  if (mode === undefined || rest.length > 0) {
    throw new Refused(`"${words.join(" ")}" is not understood. Use npm start, npm run dev, or npm start -- --database.`);
  }
  return mode;
}

/** Whether this Node is of the release line that the product is tested with. */
export function requireNode(version: string): void {
  const [major = 0, minor = 0] = version.replace(/^v/, "").split(".").map(Number);
  if (major !== 20 || minor < 20) throw new Refused(`This needs Node 20 (20.20 or later); this is Node ${version}.`);
}
