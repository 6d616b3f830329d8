import { requireStress, requireThickness, requireWithin } from "../inputs.ts";

/**
 * Force of a film per width of wafer, N/m: its stress (Pa, tension positive) times its thickness (m) times the area fraction
 * that it covers (0 to 1, default 1).
 */
export function filmForce(i: { stress: number; thickness: number; coverage?: number }): number {
  return (
    requireStress("stress", i.stress) *
    requireThickness("thickness", i.thickness) *
    requireWithin("coverage", i.coverage ?? 1, 0, 1, "1")
  );
}
