import { exportProblems } from "./exports";
import { habitProblems } from "./habits";
import { importProblems } from "./imports";
import { readSource, type Source } from "./read";

/** Everything wrong with one file. */
export const problemsOf = (source: Source): string[] => [...importProblems(source), ...exportProblems(source), ...habitProblems(source)];

/** The same for a file that exists only as text. */
export const problems = (path: string, text: string): string[] => problemsOf(readSource(path, text));
