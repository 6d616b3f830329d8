import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";

export interface WeibullStrength {
  /** Stress at which 63.2 % of the pieces tested have broken, Pa. */
  characteristicStrength: number;
  /** Weibull modulus m: the smaller, the wider the scatter. */
  weibullModulus: number;
  /** Effective area under tension, m², of the part judged and of the pieces tested. Both or neither. */
  area?: number;
  referenceArea?: number;
}

/**
 * Probability of failure, 0 to 1, under a uniform tension of `stress` (Pa): 1 − exp(−(A/A_0) (σ/σ_0)^m). Compression never
 * breaks it. Without areas the part is as large as the pieces tested.
 *
 * Holds for flaws of one kind, spread evenly: the strength of dies says nothing of a wafer's edge. Far below the tested
 * stresses it is an extrapolation: it ranks steps, it does not predict losses. Bad input throws `EngineInputError`.
 * Source: Weibull 1951.
 */
export function failureProbability(i: WeibullStrength & { stress: number }): number {
  const stress = requireWithin("stress", i.stress, -1e11, 1e11, "Pa");
  const { strength, modulus, areaRatio } = check(i);
  if (stress <= 0) return 0;
  return -Math.expm1(-areaRatio * (stress / strength) ** modulus);
}

/** Characteristic strength, Pa, of a part of another size: σ_0 (A_0/A)^(1/m). Larger parts are weaker. Source: Weibull 1951. */
export function scaledStrength(i: WeibullStrength): number {
  const { strength, modulus, areaRatio } = check(i);
  return strength * areaRatio ** (-1 / modulus);
}

function check(i: WeibullStrength): { strength: number; modulus: number; areaRatio: number } {
  const strength = requireWithin("characteristicStrength", i.characteristicStrength, 1e5, 1e11, "Pa");
  const modulus = requireWithin("weibullModulus", i.weibullModulus, 0.5, 200, "1");
  if (i.area === undefined && i.referenceArea === undefined) return { strength, modulus, areaRatio: 1 };
  if (i.area === undefined) throw new EngineInputError("area", "is needed with a reference area");
  if (i.referenceArea === undefined) throw new EngineInputError("referenceArea", "is needed with an area");
  const area = requireWithin("area", i.area, 1e-14, 1, "m2");
  return { strength, modulus, areaRatio: area / requireWithin("referenceArea", i.referenceArea, 1e-14, 1, "m2") };
}
