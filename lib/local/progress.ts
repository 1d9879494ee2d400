const PATIENCE_MILLISECONDS = 10_000;
const WORTH_A_TIME_MILLISECONDS = 2_000;

/** Prints one line for the person at the terminal. */
export function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

/** Says what is being done, says every ten seconds that it still is, and how long it took when that was worth noticing. */
export async function step<T>(title: string, work: () => Promise<T>): Promise<T> {
  const began = Date.now();
  say(`${title} ...`);
  const patience = setInterval(() => say(`  still working, ${seconds(began)} s`), PATIENCE_MILLISECONDS);
  try {
    const result = await work();
    if (Date.now() - began >= WORTH_A_TIME_MILLISECONDS) say(`  done in ${seconds(began)} s`);
    return result;
  } finally {
    clearInterval(patience);
  }
}

function seconds(began: number): number {
  return Math.round((Date.now() - began) / 1_000);
}
