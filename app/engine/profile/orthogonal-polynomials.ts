/**
 * Polynomials that are orthogonal over a given set of positions, each with leading coefficient 1:
 * p_0 = 1, p_{j+1} = (t − α_j) p_j − β_j p_{j−1}. Least squares with them needs no system of equations and loses no digits.
 * Source: Forsythe 1957, from memory.
 */
export interface PolynomialBasis {
  degree: number;
  alpha: Float64Array;
  beta: Float64Array;
  /** sum of the squares of each polynomial over the positions */
  squares: Float64Array;
}

/**
 * Basis up to `degree` over the positions `t`, best scaled to −1 to 1. Linear time, two columns of room. Holds for degrees up to
 * twice the square root of the number of positions when those are equally spaced: beyond, discrete polynomials run away at the ends.
 */
export function polynomialBasis(t: Float64Array, degree: number): PolynomialBasis {
  const basis: PolynomialBasis = {
    degree,
    alpha: new Float64Array(degree + 1),
    beta: new Float64Array(degree + 1),
    squares: new Float64Array(degree + 1),
  };
  let before = new Float64Array(t.length);
  let current = new Float64Array(t.length);
  let [alpha, beta] = [0, 0];
  for (let j = 0; j <= degree; j += 1) {
    let square = 0;
    let moment = 0;
    for (let n = 0; n < t.length; n += 1) {
      const at = t[n] ?? 0;
      const p = j === 0 ? 1 : (at - alpha) * (current[n] ?? 0) - beta * (before[n] ?? 0);
      before[n] = p;
      square += p * p;
      moment += p * p * at;
    }
    [before, current] = [current, before];
    alpha = moment / square;
    beta = j === 0 ? 0 : square / (basis.squares[j - 1] ?? 1);
    basis.squares[j] = square;
    basis.alpha[j] = alpha;
    basis.beta[j] = beta;
  }
  return basis;
}

/**
 * Takes the polynomials `from` to `to` of a basis out of `heights`, in place, and returns how much of each there was. Each is
 * measured on what the ones before have left, so that large offsets cost no digits.
 */
export function takeOut(
  basis: PolynomialBasis,
  t: Float64Array,
  heights: Float64Array,
  from: number,
  to: number,
): Float64Array {
  const shares = new Float64Array(to - from + 1);
  const { alpha, beta } = basis;
  let share = 0;
  for (let j = from; j <= to + 1; j += 1) {
    let sum = 0;
    for (let n = 0; n < t.length; n += 1) {
      const position = t[n] ?? 0;
      // Values of the polynomials j − 1 and j here, by their recurrence.
      let before = 0;
      let current = 1;
      for (let k = 0; k < j; k += 1) {
        const next = (position - (alpha[k] ?? 0)) * current - (beta[k] ?? 0) * before;
        before = current;
        current = next;
      }
      const left = j > from ? (heights[n] ?? 0) - share * before : (heights[n] ?? 0);
      heights[n] = left;
      sum += left * current;
    }
    if (j > to) break;
    share = sum / (basis.squares[j] ?? 1);
    shares[j - from] = share;
  }
  return shares;
}

/** Coefficients of 1, t and t² of the first three polynomials in these shares. */
export function plainParabola({ alpha, beta }: PolynomialBasis, shares: Float64Array): [number, number, number] {
  const [b0 = 0, b1 = 0, b2 = 0] = shares;
  const [a0 = 0, a1 = 0] = alpha;
  return [b0 - b1 * a0 + b2 * (a0 * a1 - (beta[1] ?? 0)), b1 - b2 * (a0 + a1), b2];
}
