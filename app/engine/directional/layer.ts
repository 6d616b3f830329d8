import { EngineInputError } from "../errors.ts";
import { requireStress, requireWithin } from "../inputs.ts";
import { checkLayer, type CheckedLayer, type Layer } from "../laminate/layer.ts";
import { checkPattern, coverageOf, type FilmPattern } from "../patterned/pattern.ts";
import { patternStiffness } from "../patterned/pattern-stiffness.ts";
import { siliconDirectionalConstants } from "../silicon/plane-constants.ts";
import { factor } from "./factor.ts";
import {
  addTensor,
  isotropicStiffness,
  siliconPlaneStiffness,
  turnStiffness,
  type PlaneStiffness,
  type PlaneTensor,
  type SiliconDirection,
} from "./plane-stiffness.ts";

/** An isotropic layer, which may pull unequally along x and y and may be cut into a pattern. */
export interface DirectionalFilm extends Layer {
  silicon?: undefined;
  /** In place of `coverage`, never with it. */
  pattern?: FilmPattern;
  /** Free strain besides those of temperature, stress and yielding, where it differs by direction. */
  freeStrain?: PlaneTensor;
}

/** Silicon (001) with its cubic stiffness. Its expansion is silicon's unless another is given. */
export interface DirectionalSilicon extends Omit<Layer, "youngsModulus" | "poissonsRatio" | "coverage"> {
  silicon: {
    /** Crystal direction that lies at `angle` from x. */
    direction: SiliconDirection;
    /** rad, counter-clockwise from x seen from above. Default 0. */
    angle?: number;
  };
  pattern?: undefined;
}

/** One layer of a stack whose two directions differ. Every `Layer` is one. */
export type DirectionalLayer = DirectionalFilm | DirectionalSilicon;

export interface CheckedDirectionalLayer {
  /** As the laminate of equal directions checks it, its stress set aside: what the free strain by temperature needs. */
  base: CheckedLayer;
  /** Stress per strain in the layer itself, Pa, in the axes x, y. */
  stiffness: PlaneStiffness;
  /** Share of the area, 0 to 1. */
  coverage: number;
  /** Free strain that the stress stands for, −S σ with the compliance S of the unpatterned layer, and what is stated besides. */
  stressStrain: PlaneTensor;
}

/** Checks one layer and works out its stiffness. `field` is put before the names in errors, such as 'layers[2]'. */
export function checkDirectionalLayer(layer: DirectionalLayer, field: string): CheckedDirectionalLayer {
  const stress = checkStress(layer.stress, field);
  if (layer.silicon !== undefined) {
    const { direction, angle = 0 } = layer.silicon;
    const turned = requireWithin(`${field}.silicon.angle`, angle, -2 * Math.PI, 2 * Math.PI, "rad");
    if (direction !== "100" && direction !== "110") {
      throw new EngineInputError(`${field}.silicon.direction`, "is not a direction known here", "100 or 110");
    }
    const { silicon: _, ...rest } = layer;
    const plain: Layer = { cte: "silicon", ...rest, ...siliconDirectionalConstants(direction), stress: 0 };
    const stiffness = turnStiffness(siliconPlaneStiffness(direction), turned);
    return {
      base: checkLayer(plain, field),
      stiffness,
      coverage: 1,
      stressStrain: strainOfStress(stiffness, stress, field),
    };
  }
  const base = checkLayer({ ...layer, stress: 0 }, field);
  const { youngsModulus, poissonsRatio } = layer;
  const blanket = isotropicStiffness(youngsModulus, poissonsRatio);
  const stressStrain = addTensor(strainOfStress(blanket, stress, field), checkFreeStrain(layer.freeStrain, field));
  if (layer.pattern === undefined) return { base, stiffness: blanket, coverage: base.coverage, stressStrain };
  if (layer.coverage !== undefined) {
    throw new EngineInputError(`${field}.coverage`, "is given twice: the pattern has its own");
  }
  const pattern = checkPattern(layer.pattern, `${field}.pattern`);
  const stiffness = patternStiffness({ thickness: base.thickness, youngsModulus, poissonsRatio, pattern });
  return { base, stiffness, coverage: coverageOf(pattern), stressStrain };
}

function checkStress(stress: Layer["stress"], field: string): { x: number; y: number } {
  if (stress === undefined) return { x: 0, y: 0 };
  if (typeof stress === "number") {
    const both = requireStress(`${field}.stress`, stress);
    return { x: both, y: both };
  }
  return { x: requireStress(`${field}.stress.x`, stress.x), y: requireStress(`${field}.stress.y`, stress.y) };
}

function checkFreeStrain(strain: PlaneTensor | undefined, field: string): PlaneTensor {
  if (strain === undefined) return { x: 0, y: 0, xy: 0 };
  const part = (name: keyof PlaneTensor) => requireWithin(`${field}.freeStrain.${name}`, strain[name], -1, 1, "1");
  return { x: part("x"), y: part("y"), xy: part("xy") };
}

function strainOfStress(stiffness: PlaneStiffness, { x, y }: { x: number; y: number }, field: string): PlaneTensor {
  const split = factor(stiffness);
  if (split === null) throw new EngineInputError(field, "has a stiffness that cannot be inverted");
  return split.solve({ x: -x, y: -y, xy: 0 });
}
