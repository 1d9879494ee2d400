/** The steps of a full run, in their order. */
export const STEPS = ["types", "lint", "unit", "dom", "reference", "integration", "access", "e2e"] as const;

export type StepName = (typeof STEPS)[number];

/** What to run: some steps or all, and words for the runner of the step, such as a name pattern. */
export type Choice = { steps: StepName[]; extra: string[] };

/** Reads the words behind `npm test --`: names of steps first, and what follows them goes to their runner. */
export function readChoice(words: string[]): Choice {
  const firstExtra = words.findIndex((word) => !isStep(word));
  const named = (firstExtra === -1 ? words : words.slice(0, firstExtra)).filter(isStep);
  const extra = firstExtra === -1 ? [] : words.slice(firstExtra);
  if (extra.length > 0 && named.length === 0) throw new Error(`"${extra[0]}" is no step. The steps are: ${STEPS.join(", ")}.`);
  return { steps: named.length === 0 ? [...STEPS] : STEPS.filter((step) => named.includes(step)), extra };
}

function isStep(word: string): word is StepName {
  return (STEPS as readonly string[]).includes(word);
}
