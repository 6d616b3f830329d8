import type { PlaneStiffness, PlaneTensor } from "./plane-stiffness.ts";

/**
 * A symmetric positive definite 3×3 matrix split as L D Lᵀ, to solve with it any number of times. `null` when it is not
 * positive definite to `floor` of its own diagonal: some direction has no stiffness.
 */
export interface Factor {
  /** Solution e of q e = n. */
  solve(n: PlaneTensor): PlaneTensor;
}

export function factor(q: PlaneStiffness, floor = 1e-13): Factor | null {
  const d1 = q.xx;
  if (!(d1 > 0)) return null;
  const l21 = q.xy / d1;
  const l31 = q.xs / d1;
  const d2 = q.yy - l21 * q.xy;
  const largest = Math.max(q.xx, q.yy, q.ss);
  if (!(d2 > floor * largest)) return null;
  const l32 = (q.ys - l31 * q.xy) / d2;
  const d3 = q.ss - l31 * q.xs - l32 * l32 * d2;
  if (!(d3 > floor * largest) || !(d1 > floor * largest)) return null;
  return {
    solve: (n) => {
      const y2 = n.y - l21 * n.x;
      const y3 = n.xy - l31 * n.x - l32 * y2;
      const xy = y3 / d3;
      const y = y2 / d2 - l32 * xy;
      return { x: n.x / d1 - l21 * y - l31 * xy, y, xy };
    },
  };
}
