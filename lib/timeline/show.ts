/** How many entries a page shows at first, and by how many it grows. */
export const SHOW_STEP = 60;
const MOST = 3000;

/** The number of entries asked for in an address; whole steps only, so that what is kept in the browser stays small. */
export function showOf(given: string | null | undefined): number {
  const asked = Number(given ?? SHOW_STEP);
  if (!Number.isFinite(asked) || asked <= SHOW_STEP) return SHOW_STEP;
  return Math.min(MOST, Math.ceil(asked / SHOW_STEP) * SHOW_STEP);
}
