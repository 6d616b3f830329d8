import { EngineInputError } from "../errors.ts";

/** Any figure as a function of its inputs, in the order in which they are listed. The array is reused: read it, do not keep it. */
export type ScalarModel = (inputs: Float64Array) => number;

/** A model that evaluates many sets of inputs at once, without allocating: row after row in `inputs`, one figure per row in `out`. */
export interface BlockModel {
  /** number of inputs, the length of a row */
  inputs: number;
  /**
   * Where the model likes to find its rows, `BLOCK` of them at most: filled and evaluated in one go they need not be copied. Other
   * models may use the same.
   */
  block?: Float64Array;
  evaluate(inputs: Float64Array, rows: number, out: Float64Array): void;
}

/** Either kind as a block model. A scalar one costs what its function costs. */
export function blockModel(model: ScalarModel | BlockModel, inputs: number): BlockModel {
  if (typeof model !== "function") {
    if (model.inputs !== inputs)
      throw new EngineInputError("inputs", `${inputs} are given`, `${model.inputs}, as the model has`);
    return model;
  }
  const row = new Float64Array(inputs);
  return {
    inputs,
    evaluate(block, rows, out) {
      for (let n = 0; n < rows; n += 1) {
        for (let k = 0; k < inputs; k += 1) row[k] = block[n * inputs + k] ?? 0;
        out[n] = model(row);
      }
    },
  };
}

/** A block model for one set of inputs at a time. */
export function scalarModel(model: ScalarModel | BlockModel): ScalarModel {
  if (typeof model === "function") return model;
  const out = new Float64Array(1);
  return (inputs) => {
    model.evaluate(inputs, 1, out);
    return out[0] ?? 0;
  };
}

/** Throws when a model has given something that is no number: nothing passes on NaN. */
export function requireFigures(out: Float64Array, count: number): void {
  for (let n = 0; n < count; n += 1) {
    const value = out[n] ?? 0;
    if (value - value !== 0) throw new EngineInputError("model", "gives no finite number for inputs that were drawn");
  }
}
