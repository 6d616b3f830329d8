import { at } from "../table/elements.ts";
import { backward, factorise, forward } from "./dense.ts";

/** Weighted least squares, gathered row by row. */
export interface Gathered {
  add: (row: Float64Array, target: number, weight: number) => void;
  solve: () => Float64Array;
}

/** Solves for `count` unknowns; a trace of regularity settles what no row determines. */
export function leastSquares(count: number): Gathered {
  const normal = new Float64Array(count * count);
  const right = new Float64Array(count);
  return {
    add: (row, target, weight) => {
      const w = weight * weight;
      for (let i = 0; i < count; i += 1) {
        const share = w * at(row, i);
        if (share === 0) continue;
        right[i] = at(right, i) + share * target;
        const start = i * count;
        for (let j = 0; j <= i; j += 1) normal[start + j] = at(normal, start + j) + share * at(row, j);
      }
    },
    solve: () => {
      let trace = 0;
      for (let i = 0; i < count; i += 1) trace += at(normal, i * count + i);
      for (let i = 0; i < count; i += 1) normal[i * count + i] = at(normal, i * count + i) + (1e-11 * trace) / count;
      if (!factorise(normal, count)) throw new RangeError("the least squares have no solution");
      const solution = right.slice();
      forward(normal, count, solution);
      backward(normal, count, solution);
      return solution;
    },
  };
}
