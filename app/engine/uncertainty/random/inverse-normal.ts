import { EngineInputError } from "../../errors.ts";
import { portableExp, portableLog } from "./elementary.ts";

const CENTRAL: readonly [number, number][] = [
  [3.387132872796366608, 1],
  [1.3314166789178437745e2, 4.2313330701600911252e1],
  [1.9715909503065514427e3, 6.871870074920579083e2],
  [1.3731693765509461125e4, 5.3941960214247511077e3],
  [4.5921953931549871457e4, 2.1213794301586595867e4],
  [6.7265770927008700853e4, 3.930789580009271061e4],
  [3.3430575583588128105e4, 2.8729085735721942674e4],
  [2.5090809287301226727e3, 5.226495278852854561e3],
];
const SHOULDER: readonly [number, number][] = [
  [1.42343711074968357734, 1],
  [4.6303378461565452959, 2.05319162663775882187],
  [5.7694972214606914055, 1.6763848301838038494],
  [3.64784832476320460504, 6.8976733498510000455e-1],
  [1.27045825245236838258, 1.4810397642748007459e-1],
  [2.4178072517745061177e-1, 1.51986665636164571966e-2],
  [2.27238449892691845833e-2, 5.475938084995344946e-4],
  [7.7454501427834140764e-4, 1.05075007164441684324e-9],
];
const TAIL: readonly [number, number][] = [
  [6.6579046435011037772, 1],
  [5.4637849111641143699, 5.9983220655588793769e-1],
  [1.7848265399172913358, 1.3692988092273580531e-1],
  [2.9656057182850489123e-1, 1.48753612908506148525e-2],
  [2.6532189526576123093e-2, 7.868691311456132591e-4],
  [1.2426609473880784386e-3, 1.8463183175100546818e-5],
  [2.71155556874348757815e-5, 1.4215117583164458887e-7],
  [2.01033439929228813265e-7, 2.04426310338993978564e-15],
];

/** Coefficients highest power first, numerator and denominator in turn, flat for speed. */
function flat(pairs: readonly [number, number][]): Float64Array {
  return Float64Array.from(pairs.toReversed().flat());
}

const central = /* @__PURE__ */ flat(CENTRAL);
const shoulder = /* @__PURE__ */ flat(SHOULDER);
const tails = /* @__PURE__ */ flat(TAIL);

function ratio(coefficients: Float64Array, r: number): number {
  let above = 0;
  let below = 0;
  for (let n = 0; n < 16; n += 2) {
    above = above * r + (coefficients[n] ?? 0);
    below = below * r + (coefficients[n + 1] ?? 0);
  }
  return above / below;
}

/**
 * The standard normal number below which lies the share `p`, 0 < p < 1. Relative error about 1e-16 times the condition of the
 * problem. Only correctly rounded operations, so the same on every machine.
 * Source: Wichura 1988, algorithm AS 241, from memory; checked against another implementation of it.
 */
export function inverseNormal(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) return q * ratio(central, 0.180625 - q * q);
  const share = q < 0 ? p : 1 - p;
  if (!(share > 0)) throw new EngineInputError("p", "is not a share of a distribution", "above 0 and below 1");
  const r = Math.sqrt(-portableLog(share));
  const size = r <= 5 ? ratio(shoulder, r - 1.6) : ratio(tails, r - 5);
  return q < 0 ? -size : size;
}

/**
 * Share of the standard normal distribution below `z`, absolute error below 1e-15 (measured), small tails to 1e-13 of their size.
 * A series near the middle, a continued fraction in the tails. Source: Abramowitz and Stegun 1964, 26.2.11 and 26.2.14, from
 * memory.
 */
export function normalShareBelow(z: number): number {
  const size = Math.abs(z);
  if (size > 38) return z < 0 ? 0 : 1;
  const height = portableExp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
  if (size < 3) {
    let term = z;
    let sum = z;
    for (let n = 3; Math.abs(term) > 1e-18 * Math.abs(sum); n += 2) {
      term *= (z * z) / n;
      sum += term;
    }
    return 0.5 + height * sum;
  }
  let fraction = size;
  for (let n = 120; n >= 1; n -= 1) fraction = size + n / fraction;
  const beyond = height / fraction;
  return z < 0 ? beyond : 1 - beyond;
}
