/**
 * How the shape of a free plate departs from uniform curvature as the load passes the onset of rolling, as factors on the
 * coefficients of `shape-model.ts`. From von Karman's energy minimised in polynomials (own computation, source
 * 'plate-von-karman') for equal moments and ν = 0.28.
 */
export interface ShapeFactors {
  /** 0 at the onset's coefficients, 1 at those of uniform curvature, which a long roll tends to. */
  uniformity: number;
  /** Factors on the first-order difference between bow and centre curvature: mean and half difference. */
  centreMean: number;
  centreDifference: number;
  /** The same for the least-squares parabola. */
  parabolaMean: number;
  parabolaDifference: number;
}

type Row = readonly [
  load: number,
  uniformity: number,
  centreMean: number,
  centreDifference: number,
  parabolaMean: number,
  parabolaDifference: number,
];

/** Load over the critical load, then the factors. At zero load the first-order theory is exact. */
const ROWS: readonly Row[] = [
  [0, 0, 1, 1, 1, 1],
  [1, 0, 1.04, 0.53, 0.89, 0.18],
  [1.02, -0.035, 1.02, 0.528, 0.839, 0.183],
  [1.05, -0.075, 0.99, 0.517, 0.783, 0.182],
  [1.1, -0.119, 0.946, 0.499, 0.727, 0.195],
  [1.2, -0.172, 0.866, 0.465, 0.672, 0.245],
  [1.35, -0.212, 0.76, 0.417, 0.644, 0.324],
  [1.5, -0.228, 0.666, 0.371, 0.639, 0.391],
  [1.75, -0.231, 0.535, 0.303, 0.645, 0.479],
  [2, -0.216, 0.431, 0.249, 0.652, 0.541],
  [2.5, -0.164, 0.282, 0.177, 0.649, 0.609],
  [3, -0.102, 0.187, 0.139, 0.624, 0.628],
  [4, 0.019, 0.081, 0.115, 0.54, 0.592],
  [5, 0.126, 0.028, 0.114, 0.446, 0.52],
  [7, 0.296, -0.021, 0.117, 0.285, 0.373],
  [10, 0.458, -0.048, 0.111, 0.136, 0.224],
  [14, 0.578, -0.059, 0.1, 0.041, 0.127],
  [20, 0.671, -0.057, 0.084, -0.014, 0.072],
  [30, 0.748, -0.043, 0.061, -0.035, 0.052],
  [50, 0.816, -0.023, 0.032, -0.035, 0.052],
  [100, 0.878, -0.012, 0.017, -0.029, 0.041],
  [200, 0.919, -0.01, 0.014, -0.021, 0.029],
];

/**
 * The factors at `load`, load over critical load. Interpolated linearly in the load up to the onset and in its logarithm
 * beyond it. Beyond the last row the departure from uniform curvature shrinks as 1/sqrt(load), the width of the bent rim.
 */
export function shapeFactors(load: number): ShapeFactors {
  const position = scale(load);
  let [below] = ROWS;
  for (const row of ROWS) {
    if (below && position <= scale(row[0])) return between(below, row, position);
    below = row;
  }
  const shrink = below ? Math.sqrt(below[0] / load) : 0;
  const [, uniformity, ...rest] = below ?? [0, 1, 0, 0, 0, 0];
  return named([1 - (1 - uniformity) * shrink, ...rest.map((factor) => factor * shrink)]);
}

function scale(load: number): number {
  return load <= 1 ? load : 1 + Math.log(load);
}

function between(low: Row, high: Row, position: number): ShapeFactors {
  const span = scale(high[0]) - scale(low[0]);
  const part = span === 0 ? 0 : (position - scale(low[0])) / span;
  return named(low.slice(1).map((value, n) => value + part * ((high[n + 1] ?? value) - value)));
}

function named(values: number[]): ShapeFactors {
  const [uniformity = 1, centreMean = 0, centreDifference = 0, parabolaMean = 0, parabolaDifference = 0] = values;
  return { uniformity, centreMean, centreDifference, parabolaMean, parabolaDifference };
}
