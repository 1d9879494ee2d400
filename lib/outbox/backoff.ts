/** Seconds before each further try: from five seconds up to five minutes. */
const STEPS = [5, 15, 30, 60, 120, 300];

/** When to try again after `attempts` tries. */
export function nextTry(attempts: number, now: Date): Date {
  const seconds = STEPS[Math.min(Math.max(attempts, 1), STEPS.length) - 1] ?? 300;
  return new Date(now.getTime() + seconds * 1000);
}
