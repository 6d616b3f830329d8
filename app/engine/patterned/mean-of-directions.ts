import { isotropicStiffness, type PlaneStiffness } from "../directional/plane-stiffness.ts";
import type { Layer } from "../laminate/layer.ts";
import { coverageOf, type FilmPattern } from "./pattern.ts";
import { patternStiffness } from "./pattern-stiffness.ts";

/**
 * A patterned film as a layer of a laminate of equal directions: the mean of both, less stiff and with as much less force than
 * the blanket film. Its stress is then the mean over the film's own cross-section.
 */
export function meanOfDirections(
  blanket: Layer & { stress: number },
  pattern: FilmPattern,
): Layer & { stress: number } {
  const { youngsModulus, poissonsRatio } = blanket;
  const cut = patternStiffness({ ...blanket, pattern });
  const share = biaxial(cut) / biaxial(isotropicStiffness(youngsModulus, poissonsRatio));
  return {
    ...blanket,
    youngsModulus: youngsModulus * share,
    stress: blanket.stress * share,
    coverage: coverageOf(pattern),
  };
}

const biaxial = (q: PlaneStiffness) => (q.xx + 2 * q.xy + q.yy) / 2;
