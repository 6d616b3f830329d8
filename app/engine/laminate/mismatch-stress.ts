import { requireModulus, requirePoisson } from "../inputs.ts";
import type { Expansion } from "./layer.ts";
import { thermalStrain } from "./thermal-strain.ts";

/**
 * Thermal stress, Pa, that a film without other stress takes on a rigid thick substrate between two temperatures (K):
 * M_f times the integral of (α_substrate − α_film). Tension is positive: cooling a film that expands more than its substrate
 * puts it in tension. Elastic; a metal that yields or a polymer above its zero-stress temperature does not follow it.
 * The substrate is silicon unless another expansion is given. Source: Freund and Suresh 2003, chapter 2.
 */
export function mismatchStress(i: {
  youngsModulus: number;
  poissonsRatio: number;
  cte: Expansion;
  from: number;
  to: number;
  substrateCte?: Expansion;
}): number {
  const modulus =
    requireModulus("youngsModulus", i.youngsModulus) / (1 - requirePoisson("poissonsRatio", i.poissonsRatio));
  const substrate = thermalStrain(i.substrateCte ?? "silicon", i.from, i.to, "substrateCte");
  return modulus * (substrate - thermalStrain(i.cte, i.from, i.to, "cte"));
}
