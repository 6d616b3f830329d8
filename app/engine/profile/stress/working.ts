import { stoneyStressWorking } from "../../stoney/working.ts";
import { siliconBiaxialModulus } from "../../silicon/biaxial-modulus.ts";
import type { Working, WorkingLine } from "../../working.ts";
import { directionalFilmStress, type DirectionalStressInput } from "./directional-stress.ts";
import { stressBothWays, type FullModelInput } from "./full-model.ts";
import { stressBudget, type StressBudgetInput } from "./stress-budget.ts";

/** The full model's stress of `stressBothWays` as data, Stoney's beneath it; null when the wafer has rolled. */
export function fullStressWorking(i: FullModelInput): Working | null {
  const found = stressBothWays(i);
  if (found.full === null) return null;
  return {
    equation: "film-stress-full",
    inputs: [
      { symbol: "κ", meaning: "curvature after the film", value: i.after, unit: "1/m" },
      { symbol: "κ_0", meaning: "curvature before the film", value: i.before, unit: "1/m" },
      { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
      { symbol: "h", meaning: "wafer thickness", value: i.substrateThickness, unit: "m" },
      { symbol: "h_f", meaning: "film thickness", value: i.filmThickness, unit: "m" },
      { symbol: "d_h", meaning: "share by the film's thickness", value: found.byThickness ?? 0, unit: "1" },
      { symbol: "d_w", meaning: "share by the size of the bow", value: found.byDeflection ?? 0, unit: "1" },
    ],
    result: { symbol: "σ_f", meaning: "film stress, tension positive", value: found.full, unit: "Pa" },
    note: found.sentence,
    from: [
      stoneyStressWorking({
        ...i,
        curvatureChange: i.after - i.before,
        biaxialModulus: siliconBiaxialModulus(i.orientation),
      }),
    ],
  };
}

/** The principal stress of `directionalFilmStress` as data. */
export function directionalStressWorking(i: DirectionalStressInput): Working {
  const { stress, principal } = directionalFilmStress(i);
  const lines: WorkingLine[] = [
    { symbol: "σ_x", meaning: "stress towards the notch", value: stress.x, unit: "Pa" },
    { symbol: "σ_y", meaning: "stress across it", value: stress.y, unit: "Pa" },
    { symbol: "τ", meaning: "shear", value: stress.xy, unit: "Pa" },
    { symbol: "θ", meaning: "angle of the larger stress from the notch", value: principal.angle, unit: "rad" },
  ];
  return {
    equation: "directional-film-stress",
    inputs: [
      { symbol: "κ_x", meaning: "change of curvature towards the notch", value: i.change.x, unit: "1/m" },
      { symbol: "κ_y", meaning: "change of curvature across it", value: i.change.y, unit: "1/m" },
      { symbol: "t", meaning: "change of twist", value: i.change.twist, unit: "1/m" },
      { symbol: "h", meaning: "wafer thickness", value: i.substrateThickness, unit: "m" },
      { symbol: "h_f", meaning: "film thickness", value: i.filmThickness, unit: "m" },
      ...lines,
    ],
    result: { symbol: "σ_1", meaning: "larger principal stress", value: principal.high, unit: "Pa" },
  };
}

/** The expanded uncertainty of `stressBudget` as data, one line for each input. */
export function stressBudgetWorking(i: StressBudgetInput): Working {
  const budget = stressBudget(i);
  return {
    equation: "scan-pair-budget",
    inputs: [
      { symbol: "σ_f", meaning: "film stress", value: budget.stress, unit: "Pa" },
      ...budget.lines.map(({ input, contribution, note }, n): WorkingLine => ({
        symbol: `u_${n + 1}`,
        meaning: `share of the ${input}`,
        value: contribution,
        unit: "Pa",
        source: note,
      })),
      { symbol: "u", meaning: "standard uncertainty", value: budget.standardUncertainty, unit: "Pa" },
      { symbol: "ν", meaning: "effective degrees of freedom", value: budget.degreesOfFreedom, unit: "1" },
      { symbol: "t", meaning: "coverage factor", value: budget.coverageFactor, unit: "1" },
    ],
    result: { symbol: "U", meaning: "expanded uncertainty, 95 %", value: budget.expandedUncertainty, unit: "Pa" },
  };
}
