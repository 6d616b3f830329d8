/** The exaggerations that a page may be drawn at. */
export const EXAGGERATIONS = [1, 2, 5, 10, 15, 20, 50, 100, 150, 200, 400, 1000] as const;

/** Greatest drawn height of a bow line as a share of its drawn width. */
const GREATEST_SHARE = 0.45;

/**
 * One exaggeration for every bow line of a page (strip, table and side lists): the largest of the series at which the
 * largest bow stays within 0.45 of the drawn width, so that small bows look flat, and should. At least 1.
 * @param bows bows of the page's wafers, m, either sign; rolled wafers are left out (they are drawn at ×1)
 * @param diameter wafer diameter, m
 */
export function chooseExaggeration(bows: readonly number[], diameter: number): number {
  const largest = bows.reduce((most, bow) => Math.max(most, Math.abs(bow)), 0);
  let chosen: number = EXAGGERATIONS[0];
  for (const candidate of EXAGGERATIONS) {
    if ((largest * candidate) / diameter <= GREATEST_SHARE) chosen = candidate;
  }
  return chosen;
}
