const MAX_LENGTH = 1000;

/** What a list's search looks through: the unit under every name it has, the case, the places; lower case. */
export function searchTextOf(known: { caseNumber: string; mark: string; number: string; aliases: readonly string[]; places: readonly string[] }): string {
  const { caseNumber, mark, number, aliases, places } = known;
  const words = [`${mark} ${number}`, `${mark}${number}`, caseNumber, ...aliases, ...aliases.map((alias) => alias.replaceAll(/\s+/g, "")), ...places];
  return [...new Set(words.map((word) => word.normalize("NFC").toLowerCase()))].join(" ").slice(0, MAX_LENGTH);
}

/** Text that stands for itself inside a LIKE pattern: its own wildcards and escapes lose their meaning. */
export const escapeLike = (text: string) => text.replaceAll(/[\\%_]/g, (char) => `\\${char}`);

/** One pattern for each word that was typed; all of them must be found. */
export function searchPatterns(typed: string): string[] {
  const words = typed.normalize("NFC").toLowerCase().split(/\s+/).filter((word) => word !== "");
  return words.slice(0, 8).map((word) => `%${escapeLike(word)}%`);
}
