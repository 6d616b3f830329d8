import type { JudgedFlow } from "../flow/judge.ts";
import { failureProbability, type WeibullStrength } from "../strength/weibull.ts";

export interface RankedStep {
  step: number;
  /** largest bending stress that the holding rule found there, Pa */
  stress: number;
  /** ranks steps against each other; it predicts no losses */
  probability: number;
}

/**
 * The steps at which rule 4 found a bending stress, the likeliest to break a wafer first. For engineers; never on a sheet.
 * Range and errors as `failureProbability`: far below the tested stresses it is an extrapolation.
 */
export function rankBendingSteps({ findings }: Pick<JudgedFlow, "findings">, strength: WeibullStrength): RankedStep[] {
  const stresses = new Map<number, number>();
  for (const { rule, step, figures } of findings) {
    if (rule !== 4) continue;
    for (const { unit, value } of figures)
      if (unit === "Pa") stresses.set(step, Math.max(value, stresses.get(step) ?? 0));
  }
  return [...stresses]
    .map(([step, stress]) => ({ step, stress, probability: failureProbability({ ...strength, stress }) }))
    .sort((a, b) => b.probability - a.probability || a.step - b.step);
}
