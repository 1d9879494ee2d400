/** JSON with the keys of every object in order, so that the same content always gives the same text. Undefined members are left out, as JSON does. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(",")}]`;
  if (value !== null && typeof value === "object") {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
      .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
    return `{${members.join(",")}}`;
  }
  return JSON.stringify(value ?? null);
}

export const CHAIN_START = "0".repeat(64);

export type ChainEntry = {
  moveId: string; seq: number; kind: string;
  byUserId: string | null; byName: string; byCompanyId: string | null; byCompanyName: string | null; byPart: string | null;
  legId: string | null; enteredFor: unknown; detail: unknown; at: string;
};

/** The text whose SHA-256 is an entry's hash: the hash before it, a line break, the entry's canonical JSON. */
export const chainText = (previous: string, entry: ChainEntry) => `${previous}\n${canonicalJson(entry)}`;
