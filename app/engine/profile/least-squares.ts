/** A polynomial fitted to points, in the scaled variable t = (x − centre)/halfWidth. */
export interface PolynomialFit {
  /** c_0, c_1, … of t, in m. */
  coefficients: number[];
  /** Standard deviation of each coefficient for residuals of standard deviation 1. */
  spread: number[];
  /** Measured less fitted, m, in the order of the points. */
  residuals: number[];
}

/**
 * Least-squares polynomial of the given degree through scaled points, by orthogonal columns (modified Gram-Schmidt, done twice),
 * which loses no digits to the normal equations. The points must hold more distinct positions than the degree.
 */
export function fitPolynomial(points: readonly { t: number; z: number }[], degree: number): PolynomialFit {
  const basis: number[][] = [];
  const triangle: number[][] = [];
  for (let power = 0; power <= degree; power += 1) {
    const column = points.map(({ t }) => t ** power);
    const row = new Array<number>(degree + 1).fill(0);
    for (let pass = 0; pass < 2; pass += 1) {
      basis.forEach((unit, n) => {
        const share = dot(unit, column);
        row[n] = (row[n] ?? 0) + share;
        unit.forEach((value, k) => (column[k] = (column[k] ?? 0) - share * value));
      });
    }
    const length = Math.sqrt(dot(column, column));
    row[power] = length;
    triangle.push(row);
    basis.push(column.map((value) => value / length));
  }
  const heights = points.map(({ z }) => z);
  const projections = basis.map((unit) => dot(unit, heights));
  const residuals = heights.slice();
  basis.forEach((unit, n) => {
    const share = projections[n] ?? 0;
    unit.forEach((value, k) => (residuals[k] = (residuals[k] ?? 0) - share * value));
  });
  const inverse = invertTriangle(triangle);
  return {
    coefficients: inverse.map((row) => dot(row, projections)),
    spread: inverse.map((row) => Math.sqrt(dot(row, row))),
    residuals,
  };
}

/** Column `power` of the polynomial basis is the sum of triangle[power][n] times basis n: invert that, row by row. */
function invertTriangle(columns: number[][]): number[][] {
  const size = columns.length;
  const entry = (row: number, column: number) => columns[column]?.[row] ?? 0;
  const inverse = columns.map(() => new Array<number>(size).fill(0));
  for (let column = 0; column < size; column += 1) {
    for (let row = column; row >= 0; row -= 1) {
      let rest = row === column ? 1 : 0;
      for (let k = row + 1; k <= column; k += 1) rest -= entry(row, k) * (inverse[k]?.[column] ?? 0);
      const target = inverse[row];
      if (target) target[column] = rest / entry(row, row);
    }
  }
  return inverse;
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((total, value, n) => total + value * (b[n] ?? 0), 0);
}
