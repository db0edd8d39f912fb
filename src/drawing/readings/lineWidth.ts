const LEAST = 1.5;
const MOST = 7;

/**
 * Width of a conductor in px for its current, by its share of the site's largest current to the power 0.7, so
 * that a tenth of the current is still seen. 1.5 px without current, never above 7 px.
 */
export function lineWidth(ampere: number | null, largestAmpere: number): number {
  if (ampere === null || !(largestAmpere > 0)) return LEAST;
  const width = LEAST + (MOST - LEAST) * Math.min(ampere / largestAmpere, 1) ** 0.7;
  return Math.round(width * 4) / 4;
}
