/** Seconds before each further try: from five seconds up to five minutes. */
const STEPS = [5, 15, 30, 60, 120, 300];

/** RFC 5321 4.5.4.1: who sends mail keeps trying for four to five days at least. */
const GIVE_UP_MS = 5 * 24 * 3600_000;

/** When to try again after `attempts` tries. */
export function nextTry(attempts: number, now: Date): Date {
  const seconds = STEPS[Math.min(Math.max(attempts, 1), STEPS.length) - 1] ?? 300;
  return new Date(now.getTime() + seconds * 1000);
}

/** Whether what was written at `createdAt` has been tried long enough. Counted in time, not in tries: a mail server that is away for an hour costs nothing. */
export const givenUp = (createdAt: Date, now: Date): boolean => now.getTime() - createdAt.getTime() > GIVE_UP_MS;
