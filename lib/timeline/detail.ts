/** What an entry tells of itself. Old entries stay as they were written, so nothing here may insist. */
export type Detail = Record<string, unknown>;

/** A text of an entry; null when it has none. */
export function textOf(detail: Detail, ...keys: string[]): string | null {
  for (const key of keys) {
    const value = detail[key];
    if (typeof value === "string" && value.trim() !== "") return value.trim();
    if (typeof value === "number" && Number.isFinite(value)) return String(value);
  }
  return null;
}

/** A number of an entry; null when it has none. */
export function numberOf(detail: Detail, ...keys: string[]): number | null {
  for (const key of keys) {
    const value = detail[key];
    if (typeof value === "number" && Number.isFinite(value)) return value;
    if (Array.isArray(value)) return value.length;
  }
  return null;
}

/** Several texts of an entry. */
export function textsOf(detail: Detail, key: string): string[] {
  const value = detail[key];
  return Array.isArray(value) ? value.filter((one): one is string => typeof one === "string" && one.trim() !== "") : [];
}

/** One of a known list; null when it is none of them. */
export function oneOf<T extends string>(list: readonly T[], given: unknown): T | null {
  return list.find((one) => one === given) ?? null;
}

const isChange = (one: unknown): one is { label: string; before?: unknown; after?: unknown } => typeof one === "object" && one !== null && "label" in one && typeof one.label === "string";

/** Changed fields, each before and after in words. */
export function changesOf(detail: Detail): string[] {
  const { changes } = detail;
  if (!Array.isArray(changes)) return [];
  return changes.filter(isChange).map(({ label, before, after }) => `${label}: ${typeof after === "string" ? after : "left empty"}${typeof before === "string" ? `, was ${before}` : ""}`);
}
