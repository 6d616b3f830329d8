import { curveRange, curveStrain } from "../laminate/expansion-curve.ts";
import type { Expansion } from "../laminate/layer.ts";
import type { CarrierInput } from "./model.ts";

/** How a carrier expands: silicon's curve, a stated curve moved onto the stated mean, or the mean alone. */
export function carrierExpansion({ expansion, expansionCurve, meanExpansionOver, name }: CarrierInput): Expansion {
  if (!expansionCurve) return expansion === null ? "silicon" : expansion.value;
  if (expansion === null) return expansionCurve;
  const { from, to } = meanExpansionOver ?? curveRange(expansionCurve);
  const mean = curveStrain(expansionCurve, from, to, `${name}.expansionCurve`) / (to - from);
  return { ...expansionCurve, shift: (expansionCurve.shift ?? 0) + expansion.value - mean };
}

/** Temperatures, K, between which a carrier's expansion is known; null where silicon's curve stands or nobody said. */
export function knownBetween({ expansionCurve, meanExpansionOver }: CarrierInput): { from: number; to: number } | null {
  return expansionCurve ? curveRange(expansionCurve) : (meanExpansionOver ?? null);
}
