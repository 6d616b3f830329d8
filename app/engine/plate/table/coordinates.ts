/**
 * Where a shape lies in the tables, by the area means of its two curvatures times R²/(4h), A their mean and B half their
 * difference: R = A² + B², q = (A² − B²)/R.
 *
 *   s = (1 + R/3)^(−1/4)  1 for a flat wafer, 0 for an endless roll; its square root law is that of the bent rim's width
 *   x = 2 s − 1           −1 to 1
 *   y                     −1 to 1 across the shapes that can be stable at a given s: from where a saddle or a roll snaps
 *                         through, q = −tanh((1.95 + ν/2) s), to beyond where equal loads hold a roll, q = s (0.45 + 0.75 s²)
 *
 * Flat wafers up to the onset of rolling reach over that range by some hundredths, which the tables cover. No plate rests farther
 * out: there a function of the tables keeps the value it has at the border, so that a search or a trial meets a sound one.
 */
export interface TablePlace {
  s: number;
  x: number;
  y: number;
  /** Derivatives of y by q and s. */
  yq: number;
  ys: number;
  yss: number;
  ysq: number;
}

const SCALE = 3;
/** How far out in y the tables are followed. */
const FARTHEST = 1.07;

/** s of a sum of squares. */
export function slenderness(squares: number): number {
  return 1 / Math.sqrt(Math.sqrt(1 + squares / SCALE));
}

/** The sum of squares at `s`. */
export function squaresAt(s: number): number {
  return SCALE * (1 / s ** 4 - 1);
}

/** Rate of the lower border: its dependence on Poisson's ratio is that of the limit of snapping. */
export function borderRate(poissonsRatio: number): number {
  return 1.95 + poissonsRatio / 2;
}

/** Lowest and highest q of the range at `s`. */
export function range(s: number, rate: number): [low: number, high: number] {
  return [-Math.tanh(rate * s), s * (0.45 + 0.75 * s * s)];
}

/** Fills `place` for a shape. */
export function locate(squares: number, q: number, rate: number, place: TablePlace): void {
  const s = slenderness(squares);
  const low = -Math.tanh(rate * s);
  const lowS = -rate * (1 - low * low);
  const lowSS = 2 * rate * low * lowS;
  const high = s * (0.45 + 0.75 * s * s);
  const highS = 0.45 + 2.25 * s * s;
  const highSS = 4.5 * s;
  const width = high - low;
  const slope = (highS - lowS) / width;
  const y = (2 * q - high - low) / width;
  if (Math.abs(y) > FARTHEST) {
    place.s = s;
    place.x = 2 * s - 1;
    place.y = y > 0 ? FARTHEST : -FARTHEST;
    place.yq = place.ys = place.yss = place.ysq = 0;
    return;
  }
  const middle = (highS + lowS) / width;
  place.s = s;
  place.x = 2 * s - 1;
  place.y = y;
  place.yq = 2 / width;
  place.ys = -middle - y * slope;
  place.ysq = (-2 * slope) / width;
  place.yss =
    -(highSS + lowSS) / width + middle * slope - place.ys * slope - y * ((highSS - lowSS) / width - slope * slope);
}
