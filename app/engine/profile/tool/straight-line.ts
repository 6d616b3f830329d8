/** y = intercept + slope x by weighted least squares. */
export interface StraightLine {
  slope: number;
  intercept: number;
  slopeUncertainty: number;
  interceptUncertainty: number;
  /** sum of squares of the weighted residuals */
  chiSquare: number;
  degreesOfFreedom: number;
}

/**
 * Straight line through points of given standard uncertainty in y; null when all lie at one x or there are fewer than two. Its
 * uncertainties are those of the points as stated.
 * Source: JCGM 100:2008, annex H.3.
 */
export function straightLine(points: readonly { x: number; y: number; u: number }[]): StraightLine | null {
  const weights = points.map(({ u }) => 1 / (u * u));
  const total = weights.reduce((sum, w) => sum + w, 0);
  if (points.length < 2 || !(total > 0)) return null;
  const mean = (of: (n: number) => number) => weights.reduce((sum, w, n) => sum + w * of(n), 0) / total;
  const centre = mean((n) => points[n]?.x ?? 0);
  const middle = mean((n) => points[n]?.y ?? 0);
  const spread = mean((n) => ((points[n]?.x ?? 0) - centre) ** 2);
  if (!(spread > 1e-24 * centre * centre) || !(spread > 0)) return null;
  const slope = mean((n) => ((points[n]?.x ?? 0) - centre) * ((points[n]?.y ?? 0) - middle)) / spread;
  const slopeVariance = 1 / (total * spread);
  return {
    slope,
    intercept: middle - slope * centre,
    slopeUncertainty: Math.sqrt(slopeVariance),
    interceptUncertainty: Math.sqrt(1 / total + centre * centre * slopeVariance),
    chiSquare: points.reduce(
      (sum, { x, y }, n) => sum + (weights[n] ?? 0) * (y - middle - slope * (x - centre)) ** 2,
      0,
    ),
    degreesOfFreedom: points.length - 2,
  };
}
