import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import type { UncertainQuantity } from "./quantity.ts";

/** Two inputs whose common errors go together: modulus and expansion from one data sheet, two films from one tool. */
export interface Correlation {
  between: readonly [string, string];
  /** −1 to 1 */
  coefficient: number;
}

/**
 * Matrix of correlation coefficients in the order of the quantities, row after row; null when there are none.
 * Only normal inputs may be correlated: for others a coefficient does not say how they go together (JCGM 101:2008, 6.4.8 has
 * the Gaussian case alone).
 * @throws EngineInputError naming the pair
 */
export function correlationMatrix(
  quantities: readonly UncertainQuantity[],
  correlations: readonly Correlation[],
): Float64Array | null {
  const size = quantities.length;
  const matrix = new Float64Array(size * size);
  for (let n = 0; n < size; n += 1) matrix[n * size + n] = 1;
  let any = false;
  for (const { between, coefficient } of correlations) {
    const field = `correlation of ${between.join(" and ")}`;
    const [first, second] = between.map((name) => indexOfNormal(quantities, name, field));
    if (first === undefined || second === undefined || first === second)
      throw new EngineInputError(field, "needs two different inputs");
    const r = requireWithin(field, coefficient, -1, 1, "1");
    matrix[first * size + second] = r;
    matrix[second * size + first] = r;
    any ||= r !== 0;
  }
  return any ? matrix : null;
}

function indexOfNormal(quantities: readonly UncertainQuantity[], name: string, field: string): number {
  const index = quantities.findIndex((quantity) => quantity.name === name);
  if (index < 0) throw new EngineInputError(field, `names ${name}, which is not among the inputs`);
  if (quantities[index]?.distribution !== "normal")
    throw new EngineInputError(field, `is given for ${name}, whose distribution is not normal`, "normal inputs");
  return index;
}

/** How far below zero rounding may take a pivot of a matrix that is just singular, as of full correlation. */
const ROUNDING = 1e-12;

/**
 * Lower triangle L with L Lᵀ equal to the matrix, row after row, so that L z has these correlations when the z are independent.
 * @throws EngineInputError when no errors can be correlated so (the matrix has a negative eigenvalue)
 */
export function lowerTriangle(matrix: Float64Array, size: number): Float64Array {
  const lower = new Float64Array(size * size);
  const at = (row: number, column: number) => lower[row * size + column] ?? 0;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column <= row; column += 1) {
      let rest = matrix[row * size + column] ?? 0;
      for (let k = 0; k < column; k += 1) rest -= at(row, k) * at(column, k);
      if (row === column) {
        if (rest < -ROUNDING) refuse();
        lower[row * size + row] = rest > ROUNDING ? Math.sqrt(rest) : 0;
      } else {
        const pivot = at(column, column);
        if (pivot === 0 && Math.abs(rest) > Math.sqrt(ROUNDING)) refuse();
        lower[row * size + column] = pivot === 0 ? 0 : rest / pivot;
      }
    }
  }
  return lower;
}

function refuse(): never {
  throw new EngineInputError("correlations", "contradict each other: no errors can go together in this way");
}
