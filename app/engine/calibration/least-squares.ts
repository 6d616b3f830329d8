import { factorSymmetric, invertSymmetric } from "./symmetric.ts";

/** A least-squares problem whose residuals are already divided by their standard uncertainties. */
export interface LeastSquares {
  /** weighted residuals at a set of parameters; null where they cannot be computed */
  residuals: (parameters: readonly number[]) => number[] | null;
  start: readonly number[];
  /** step of each parameter for the derivatives, about the size over which the residuals bend */
  steps: readonly number[];
}

export interface Fit {
  parameters: number[];
  residuals: number[];
  /** sum of squares of the weighted residuals */
  chiSquare: number;
  /** inverse of JᵀJ; null when the measurements leave some combination of the parameters open */
  covariance: number[][] | null;
  /** derivatives of the weighted residuals, one row for each */
  jacobian: number[][];
  converged: boolean;
}

const MOST_ROUNDS = 100;
/** Change of χ² that nobody could see: far below the 1 of one standard uncertainty. */
const STILL = 1e-9;

/**
 * Least squares by the method of Levenberg and Marquardt, derivatives by central differences. Uncertainties are those of the
 * measurements as stated, not rescaled by the scatter: compare `chiSquare` with the degrees of freedom.
 * Source: Levenberg 1944, Marquardt 1963, from memory; covariance JCGM 102:2011, from memory.
 */
export function leastSquares(problem: LeastSquares, rounds = MOST_ROUNDS): Fit | null {
  let parameters = [...problem.start];
  let residuals = problem.residuals(parameters);
  if (!residuals) return null;
  let chiSquare = sumOfSquares(residuals);
  let damping = 1e-3;
  let converged = false;
  let jacobian = jacobianAt(problem, parameters);
  for (let round = 0; round < rounds && jacobian; round += 1) {
    const step = damped(jacobian, residuals, damping);
    const next = step && parameters.map((value, n) => value + (step[n] ?? 0));
    const found = next && problem.residuals(next);
    const better = found ? sumOfSquares(found) : Infinity;
    if (next && found && better <= chiSquare) {
      converged = chiSquare - better <= STILL * (1 + chiSquare);
      [parameters, residuals, chiSquare] = [next, found, better];
      damping = Math.max(damping / 10, 1e-12);
      jacobian = jacobianAt(problem, parameters);
      if (converged) break;
    } else {
      damping *= 10;
      if (damping > 1e12) {
        converged = true;
        break;
      }
    }
  }
  if (!jacobian) return null;
  return { parameters, residuals, chiSquare, covariance: invertSymmetric(normal(jacobian)), jacobian, converged };
}

/** Derivatives of the weighted residuals; null where one cannot be computed. */
export function jacobianAt({ residuals, steps }: LeastSquares, at: readonly number[]): number[][] | null {
  const columns = at.map((value, n) => {
    const step = steps[n] ?? 1e-3;
    const moved = (by: number) => residuals(at.map((other, m) => (m === n ? value + by : other)));
    const [up, down] = [moved(step), moved(-step)];
    return up && down ? up.map((high, k) => (high - (down[k] ?? 0)) / (2 * step)) : null;
  });
  const [first] = columns;
  if (!first || columns.some((column) => column === null)) return null;
  return first.map((_, k) => columns.map((column) => column?.[k] ?? 0));
}

/** JᵀJ. */
export function normal(jacobian: readonly number[][]): number[][] {
  const size = jacobian[0]?.length ?? 0;
  return Array.from({ length: size }, (_, i) =>
    Array.from({ length: size }, (__, j) => jacobian.reduce((sum, row) => sum + (row[i] ?? 0) * (row[j] ?? 0), 0)),
  );
}

function damped(jacobian: number[][], residuals: number[], damping: number): number[] | null {
  const matrix = normal(jacobian);
  matrix.forEach((row, n) => {
    row[n] = (row[n] ?? 0) * (1 + damping) + 1e-300;
  });
  const gradient = matrix.map(
    (_, n) => -jacobian.reduce((sum, row, k) => sum + (row[n] ?? 0) * (residuals[k] ?? 0), 0),
  );
  return factorSymmetric(matrix)?.(gradient) ?? null;
}

function sumOfSquares(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value * value, 0);
}
