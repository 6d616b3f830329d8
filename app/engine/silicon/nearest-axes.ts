import type { SiliconDirection } from "../directional/plane-stiffness.ts";

/**
 * Crystal direction nearest to an axis of the wafer's face at `angle` (rad) from x, on silicon (100) whose x axis, to the notch, is
 * <110>: that one itself within 22.5° of x or of the axis across it, <100> between.
 */
export function nearestAxes(angle: number): SiliconDirection {
  return Math.cos(4 * angle) >= 0 ? "110" : "100";
}
