import { EngineInputError } from "../errors.ts";
import {
  requireModulus,
  requirePoisson,
  requireStress,
  requireTemperature,
  requireThickness,
  requireWithin,
} from "../inputs.ts";
import { checkExpansionCurve, type ExpansionCurve } from "./expansion-curve.ts";

/** Linear expansion: a constant in 1/K, silicon's own curve, a stated curve, or a function of temperature (K) giving 1/K. */
export type Expansion = number | "silicon" | ExpansionCurve | ((temperature: number) => number);

/** One layer of a stack, isotropic in its plane. */
export interface Layer {
  /** m */
  thickness: number;
  /** Pa */
  youngsModulus: number;
  poissonsRatio: number;
  /**
   * Stress in Pa, tension positive, while held flat on a rigid thick substrate at the layer's reference temperature. Default
   * 0. Two unequal values make the layer directional.
   */
  stress?: number | { x: number; y: number };
  /** Needed as soon as a temperature differs from the layer's reference temperature. */
  cte?: Expansion;
  /** Temperature at which `stress` holds, K. Default 298.15. */
  referenceTemperature?: number;
  /** Area fraction covered, 0 to 1. Default 1. Scales stiffness and force alike; stresses are those in the film itself. */
  coverage?: number;
  /** Plastic strain, added to the free strain. Default 0. Positive for a film that has been stretched and is now longer. */
  plasticStrain?: number;
}

/** Temperature at which stresses and shapes are quoted when nothing else is said, K. */
export const ROOM_TEMPERATURE = 298.15;

/** A layer whose inputs have been checked and whose defaults are filled in. */
export interface CheckedLayer {
  thickness: number;
  /** Biaxial modulus E/(1 − ν), Pa. */
  biaxialModulus: number;
  /** Pa */
  stress: number;
  cte: Expansion | null;
  /** K */
  referenceTemperature: number;
  coverage: number;
  plasticStrain: number;
}

/**
 * Checks one layer and fills in its defaults. `field` is put before the names in errors, such as 'layers[2]'. Unequal stresses
 * along x and y are refused here: they bend the two axes differently and need the directional laminate.
 */
export function checkLayer(layer: Layer, field: string): CheckedLayer {
  const youngsModulus = requireModulus(`${field}.youngsModulus`, layer.youngsModulus);
  const poissonsRatio = requirePoisson(`${field}.poissonsRatio`, layer.poissonsRatio);
  return {
    thickness: requireThickness(`${field}.thickness`, layer.thickness),
    biaxialModulus: youngsModulus / (1 - poissonsRatio),
    stress: biaxialStress(layer.stress, field),
    cte: checkExpansion(layer.cte, field),
    referenceTemperature: requireTemperature(
      `${field}.referenceTemperature`,
      layer.referenceTemperature ?? ROOM_TEMPERATURE,
    ),
    coverage: requireWithin(`${field}.coverage`, layer.coverage ?? 1, 0, 1, "1"),
    plasticStrain: requireWithin(`${field}.plasticStrain`, layer.plasticStrain ?? 0, -1, 1, "1"),
  };
}

function biaxialStress(stress: Layer["stress"], field: string): number {
  if (stress === undefined) return 0;
  if (typeof stress === "number") return requireStress(`${field}.stress`, stress);
  const x = requireStress(`${field}.stress.x`, stress.x);
  const y = requireStress(`${field}.stress.y`, stress.y);
  if (x !== y) {
    throw new EngineInputError(
      `${field}.stress`,
      "differs along x and y, which a laminate of equal curvature cannot carry",
      "one value, or equal x and y",
    );
  }
  return x;
}

function checkExpansion(cte: Layer["cte"], field: string): Expansion | null {
  if (cte === undefined) return null;
  if (typeof cte === "number") return requireWithin(`${field}.cte`, cte, -1e-3, 1e-2, "1/K");
  if (cte === "silicon" || typeof cte === "function") return cte;
  if (typeof cte === "object" && cte !== null) return checkExpansionCurve(cte, `${field}.cte`);
  throw new EngineInputError(
    `${field}.cte`,
    "is not an expansion",
    "a number in 1/K, 'silicon', a curve or a function of K",
  );
}
