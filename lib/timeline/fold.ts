import { foldedWords } from "./sentences";
import type { Entry } from "./types";
import { plainText } from "./words";

const lineOf = (entry: Entry) => [plainText(entry.parts), entry.note].filter(Boolean).join(": ");

const sameHand = (a: Entry, b: Entry) => a.kind === b.kind && a.by === b.by && a.company === b.company && !a.enteredFor && !b.enteredFor;

/** Puts runs of small entries of one day together, such as a dozen photos: the newest stands for them and lists them. Photos that come in between do not end a run of other photos. */
export function foldDay(entries: readonly Entry[]): Entry[] {
  const folded: (Entry & { run: Entry[] })[] = [];
  let open: (Entry & { run: Entry[] })[] = [];
  for (const entry of entries) {
    if (!foldedWords(entry.kind)) open = [];
    const host = open.find((one) => sameHand(one, entry));
    if (host) {
      host.run.push(entry);
      continue;
    }
    const next = { ...entry, run: [entry] };
    folded.push(next);
    if (foldedWords(entry.kind)) open.push(next);
  }
  return folded.map(({ run, ...entry }) => {
    const words = foldedWords(entry.kind);
    if (!words || run.length < 2) return entry;
    const lines = [...new Set(run.map(lineOf))];
    return { ...entry, parts: [{ text: words(run.length) }], note: null, folded: lines.length > 1 ? lines : [], photos: run.reduce((sum, one) => sum + one.photos, 0) };
  });
}
