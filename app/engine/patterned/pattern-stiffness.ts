import {
  isotropicStiffness,
  scaleStiffness,
  turnStiffness,
  type PlaneStiffness,
} from "../directional/plane-stiffness.ts";
import { edgeRelief, transferLength } from "./edge-relief.ts";
import type { FilmPattern } from "./pattern.ts";

interface PatternedMaterial {
  /** m */
  thickness: number;
  /** Pa */
  youngsModulus: number;
  poissonsRatio: number;
  pattern: FilmPattern;
}

/** Share g of the blanket stress that a film keeps across its lines or in its islands, 0 to 1; 1 where nothing is relieved. */
export function edgeReliefOf({ thickness, youngsModulus, pattern }: Omit<PatternedMaterial, "poissonsRatio">): number {
  switch (pattern.kind) {
    case "full":
    case "random":
      return 1;
    case "lines":
      return edgeRelief(pattern.lineWidth, transferLength(thickness, youngsModulus, "line"));
    case "islands":
      return edgeRelief(pattern.size, transferLength(thickness, youngsModulus, "island"));
  }
}

/**
 * Stiffness of an isotropic film cut into a pattern: mean stress of the film itself, over its own cross-section, per strain
 * that the wafer imposes on it, Pa. Times the coverage it is what the wafer feels.
 *
 * Across a line only the share g of the blanket stress is kept, σ_y = g E/(1 − ν²) (ε_y + ν ε_x); along it the plane-stress law
 * σ_x = E ε_x + ν σ_y holds for the mean over the cross-section, whatever g is, because the mean stress through the thickness
 * is zero. Hence Q_xx = E (1 − ν² (1 − g))/(1 − ν²), Q_xy = ν g E/(1 − ν²), Q_yy = g E/(1 − ν²), and g G in shear. Stiffness and
 * force follow from one another: with the film's own free strain this gives N_x = f σ h_f (1 − ν (1 − g)), N_y = f g σ h_f.
 * Limits, exact: g = 1 is the blanket film times its coverage, g = 0 leaves E along the line and nothing across.
 * Islands keep g in both directions; a random pattern is a blanket film times its coverage.
 *
 * Source: limits Shen, Suresh and Blech 1996, Wikström, Gudmundson and Suresh 1999; between them practical, see `edgeRelief`.
 */
export function patternStiffness(material: PatternedMaterial): PlaneStiffness {
  const { youngsModulus, poissonsRatio, pattern } = material;
  const blanket = isotropicStiffness(youngsModulus, poissonsRatio);
  const g = edgeReliefOf(material);
  if (pattern.kind !== "lines") return scaleStiffness(blanket, g);
  const alongX: PlaneStiffness = {
    xx: youngsModulus + poissonsRatio * poissonsRatio * g * blanket.yy,
    xy: g * blanket.xy,
    yy: g * blanket.yy,
    xs: 0,
    ys: 0,
    ss: g * blanket.ss,
  };
  return turnStiffness(alongX, pattern.direction);
}
