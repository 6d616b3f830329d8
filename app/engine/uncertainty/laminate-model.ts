import { EngineInputError } from "../errors.ts";
import { requireTemperature } from "../inputs.ts";
import { freeStrain, type NamedLayer } from "../laminate/free-strain.ts";
import {
  bendingStiffnessOf,
  LAMINATE_SUMS,
  laminateSums,
  strainPerHeightOf,
  stretchingOf,
} from "../laminate/laminate-sums.ts";
import { checkLayer, ROOM_TEMPERATURE, type Layer } from "../laminate/layer.ts";
import { findBase, solveLaminate } from "../laminate/solve-laminate.ts";
import type { BlockModel } from "./model.ts";
import type { ShapeCurve } from "./shape-curve.ts";

/** A laminate compiled for sampling: what `solveLaminate` gives, for many sets of inputs without allocation. */
export interface LaminateModel {
  /** curvature, 1/m, positive for a bowl */
  curvature: BlockModel;
  /** what the free wafer does with it, m: centre to rim along the axis that bends most (sign of the curvature), or peak to valley */
  shape(curve: ShapeCurve, figure: "sagitta" | "warp"): BlockModel;
}

/**
 * A laminate at a temperature (K, default 298.15) as a function of the thickness (m), Young's modulus (Pa) and stress (Pa) of its
 * layers: the inputs are all thicknesses from the bottom up, then all moduli, then all stresses (`laminateInputNames`). What else
 * the layers state, Poisson's ratio, coverage, expansion, temperatures and plastic strain, stays as it is.
 *
 * It runs the sums of `solveLaminate` (`laminateSums`) about the neutral plane and mean strain of the layers as given, which loses
 * no digits while the draws stay near them: curvatures agree with `solveLaminate` to 1e-14 for draws some 10 % off.
 * Inputs are not checked one by one. A draw without stiffness gives no finite curvature, which sampling refuses.
 * @throws EngineInputError as `solveLaminate` does, for the layers as given
 */
export function laminateModel(layersBottomToTop: readonly Layer[], o: { temperature?: number } = {}): LaminateModel {
  const temperature = requireTemperature("temperature", o.temperature ?? ROOM_TEMPERATURE);
  const solved = solveLaminate(layersBottomToTop, { temperature });
  const count = layersBottomToTop.length;
  const named = layersBottomToTop.map((layer, n): NamedLayer => {
    const field = `layers[${n}]`;
    return { layer: checkLayer(layer, field), field };
  });
  const base = findBase(named);
  const coverage = Float64Array.from(named, ({ layer }) => layer.coverage);
  /** biaxial modulus times coverage per unit of Young's modulus */
  const stiffening = Float64Array.from(layersBottomToTop, ({ poissonsRatio }, n) => {
    return (coverage[n] ?? 0) / (1 - poissonsRatio);
  });
  const meanStrain = solved.midplaneStrain - solved.curvature * solved.neutralPlane;
  /** free strain without the stress's part, over the mean strain */
  const strain = Float64Array.from(
    named,
    ({ layer, field }) => freeStrain({ layer: { ...layer, stress: 0 }, field }, base, temperature) - meanStrain,
  );
  const thickness = layersBottomToTop.reduce((total, layer) => total + layer.thickness, 0);
  const bottom = -thickness / 2 - solved.neutralPlane;
  const modulus = new Float64Array(count);
  const pressure = new Float64Array(count);
  const sums = new Float64Array(LAMINATE_SUMS);

  /** The sums for the set of inputs that starts at `at`. */
  const sumRow = (inputs: Float64Array, at: number) => {
    for (let n = 0; n < count; n += 1) {
      const covered = (stiffening[n] ?? 0) * (inputs[at + count + n] ?? 0);
      modulus[n] = covered;
      pressure[n] = covered * (strain[n] ?? 0) - (coverage[n] ?? 0) * (inputs[at + 2 * count + n] ?? 0);
    }
    laminateSums(count, inputs, at, modulus, pressure, bottom, sums);
  };
  return {
    curvature: {
      inputs: 3 * count,
      evaluate(inputs, rows, out) {
        for (let row = 0; row < rows; row += 1) {
          sumRow(inputs, row * 3 * count);
          out[row] = -strainPerHeightOf(sums);
        }
      },
    },
    shape: (curve, figure) => {
      const of = figure === "warp" ? curve.warp : curve.sagitta;
      return {
        inputs: 3 * count,
        evaluate(inputs, rows, out) {
          for (let row = 0; row < rows; row += 1) {
            sumRow(inputs, row * 3 * count);
            out[row] = of(-strainPerHeightOf(sums), Math.sqrt((12 * bendingStiffnessOf(sums)) / stretchingOf(sums)));
          }
        },
      };
    },
  };
}

const PROPERTIES = ["thickness", "modulus", "stress"] as const;

/** Names of the inputs of a laminate's model, in their order. Without names, layers are counted from the bottom. */
export function laminateInputNames(layers: number | readonly string[]): string[] {
  const names = typeof layers === "number" ? Array.from({ length: layers }, (_, n) => `layer ${n + 1}`) : layers;
  if (names.length === 0) throw new EngineInputError("layers", "the stack is empty", "at least one layer");
  return PROPERTIES.flatMap((property) => names.map((name) => `${name}, ${property}`));
}

/** Best estimates of the inputs of a laminate's model, in their order. */
export function laminateInputValues(layersBottomToTop: readonly Layer[]): number[] {
  const checked = layersBottomToTop.map((layer, n) => checkLayer(layer, `layers[${n}]`));
  return [
    ...layersBottomToTop.map(({ thickness }) => thickness),
    ...layersBottomToTop.map(({ youngsModulus }) => youngsModulus),
    ...checked.map(({ stress }) => stress),
  ];
}
