import { EngineInputError } from "../errors.ts";
import { requireTemperature } from "../inputs.ts";
import { freeStrain, type NamedLayer } from "../laminate/free-strain.ts";
import {
  bendingStiffnessOf,
  bendStacks,
  curvatureOf,
  LAYER_VALUES,
  MODULUS_FACTORS,
  MOST_STACKS,
  stacksThatFit,
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
 * It runs the sums of `solveLaminate` (`bendStacks`) about the neutral plane and mean strain of the layers as given, which loses
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
  const free = named.map(({ layer, field }) =>
    freeStrain({ layer: { ...layer, stress: 0 }, field }, base, temperature),
  );
  /** free strain without the stress's part, over the mean strain; one that all layers share bends nothing */
  const alike = free.every((value) => value === free[0]);
  const strain = Float64Array.from(free, (value) => (alike ? 0 : value - meanStrain));
  const asStated = alike && coverage.every((share) => share === 1);
  const thickness = layersBottomToTop.reduce((total, layer) => total + layer.thickness, 0);
  const bottom = -thickness / 2 - solved.neutralPlane;
  const width = 3 * count;
  const most = stacksThatFit(count);

  /** Puts what the layers would carry at the mean strain behind the rows in `LAYER_VALUES`. */
  const holdStresses = (rows: number) => {
    for (let row = 0; row < rows; row += 1) {
      for (let n = 0; n < count; n += 1) {
        const from = row * width + n;
        const modulus = (stiffening[n] ?? 0) * (LAYER_VALUES[from + count] ?? 0);
        const stress = (coverage[n] ?? 0) * (LAYER_VALUES[from + 2 * count] ?? 0);
        LAYER_VALUES[rows * width + row * count + n] = stress - modulus * (strain[n] ?? 0);
      }
    }
  };
  /** Bends the sets of inputs from the one at `first` on, and returns how many fitted. */
  const bendRows = (inputs: Float64Array, first: number, rows: number): number => {
    const some = Math.min(most, rows - first);
    if (inputs !== LAYER_VALUES) LAYER_VALUES.set(inputs.subarray(first * width, (first + some) * width));
    for (let n = 0; n < count; n += 1) MODULUS_FACTORS[n] = stiffening[n] ?? 0;
    if (asStated) {
      bendStacks(some, count, bottom);
    } else {
      holdStresses(some);
      bendStacks(some, count, bottom, some * width, count);
    }
    return some;
  };
  const block = most === MOST_STACKS ? { block: LAYER_VALUES } : {};
  return {
    curvature: {
      inputs: width,
      ...block,
      evaluate(inputs, rows, out) {
        for (let first = 0; first < rows;) {
          const some = bendRows(inputs, first, rows);
          for (let n = 0; n < some; n += 1) out[first + n] = curvatureOf(n);
          first += some;
        }
      },
    },
    shape: (curve, figure) => {
      const of = figure === "warp" ? curve.warp : curve.sagitta;
      const thicknesses = new Float64Array(most);
      return {
        inputs: width,
        ...block,
        evaluate(inputs, rows, out) {
          for (let first = 0; first < rows;) {
            const some = bendRows(inputs, first, rows);
            for (let n = 0; n < some; n += 1) {
              thicknesses[n] = Math.sqrt((12 * bendingStiffnessOf(n)) / stretchingOf(n));
              out[first + n] = curvatureOf(n);
            }
            // The curve may be anybody's, so it is asked when nothing of what was bent is needed any more.
            for (let n = 0; n < some; n += 1) out[first + n] = of(out[first + n] ?? 0, thicknesses[n] ?? 0);
            first += some;
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
