import type { ProfilePoint } from "#app/engine/profile/points.ts";

/** Points that are kept of a profile beside its figures; instruments write far more than a curve can show. */
export const KEPT_POINTS = 10_000;

/**
 * The points of a profile for drawing and keeping; a fit is given all of them instead. More than `most` become the means of equal
 * stretches: their parabola has the same curvature to 1e-9, because a stretch is so short that its own sagitta is the same everywhere.
 * @param profile SI, in any order
 */
export function profilePoints(
  { x, z, from, to }: { x: Float64Array; z: Float64Array; from: number; to: number },
  most = KEPT_POINTS,
): ProfilePoint[] {
  if (x.length <= most || from === to) return Array.from(x, (position, n) => ({ x: position, z: z[n] ?? 0 }));
  const [positions, heights, counts] = [new Float64Array(most), new Float64Array(most), new Uint32Array(most)];
  const perMetre = most / (to - from);
  for (let n = 0; n < x.length; n += 1) {
    const position = x[n] ?? 0;
    const stretch = Math.min(most - 1, Math.floor((position - from) * perMetre));
    positions[stretch] = (positions[stretch] ?? 0) + position;
    heights[stretch] = (heights[stretch] ?? 0) + (z[n] ?? 0);
    counts[stretch] = (counts[stretch] ?? 0) + 1;
  }
  const points: ProfilePoint[] = [];
  counts.forEach((count, n) => {
    if (count > 0) points.push({ x: (positions[n] ?? 0) / count, z: (heights[n] ?? 0) / count });
  });
  return points;
}
