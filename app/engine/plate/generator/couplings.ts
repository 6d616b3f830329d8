import { at } from "../table/elements.ts";
import type { Profile } from "./disc-functions.ts";

/** A complex number as its two parts. */
type Complex = readonly [re: number, im: number];

const phaseOf = ({ phase }: Profile): Complex => (phase === "cos" ? [1, 0] : [0, -1]);
const times = ([a, b]: Complex, [c, d]: Complex): Complex => [a * c - b * d, a * d + b * c];
const conjugate = ([a, b]: Complex): Complex => [a, -b];

/** Integral over the circle of Re(μ e^(iMθ)) Re(ε e^(imθ)), m not negative. */
function overAngle(mu: Complex, frequency: number, epsilon: Complex, order: number): number {
  if (Math.abs(frequency) !== order) return 0;
  if (order === 0) return 2 * Math.PI * mu[0] * epsilon[0];
  return Math.PI * times(epsilon, frequency < 0 ? mu : conjugate(mu))[0];
}

/** Integrals ∫ Z_k (H_i H_j − D_i D_j − T_i T_j) that do not vanish: the Gaussian curvature of a pair against a stress function. */
export interface Couplings {
  k: Int32Array;
  i: Int32Array;
  j: Int32Array;
  value: Float64Array;
}

/**
 * Couplings of stress functions with pairs of deflections; with `second` left out, pairs of `first` with itself, j up to i, the
 * value of i ≠ j counting for both orders. `weights` are those of the radii for ∫ … r dr.
 */
export function couplings(
  stress: readonly Profile[],
  first: readonly Profile[],
  second: readonly Profile[] | null,
  weights: Float64Array,
): Couplings {
  const found: { k: number[]; i: number[]; j: number[]; value: number[] } = { k: [], i: [], j: [], value: [] };
  const byOrder = new Map<number, { index: number; profile: Profile }[]>();
  stress.forEach((profile, index) => {
    byOrder.set(profile.order, [...(byOrder.get(profile.order) ?? []), { index, profile }]);
  });
  const product = new Float64Array(weights.length);
  first.forEach((left, i) => {
    (second ?? first.slice(0, i + 1)).forEach((right, j) => {
      for (const sign of [-1, 1] as const) {
        const frequency = left.order + sign * right.order;
        const mu = times(phaseOf(left), sign < 0 ? conjugate(phaseOf(right)) : phaseOf(right));
        const partners = byOrder.get(Math.abs(frequency)) ?? [];
        if (partners.length === 0) continue;
        fillProduct(product, left, right, sign, weights);
        for (const { index, profile } of partners) {
          const angular = overAngle(mu, frequency, phaseOf(profile), profile.order);
          if (angular === 0) continue;
          let sum = 0;
          for (let n = 0; n < product.length; n += 1) sum += at(profile.value, n) * at(product, n);
          found.k.push(index);
          found.i.push(i);
          found.j.push(j);
          found.value.push(angular * sum);
        }
      }
    });
  });
  return {
    k: Int32Array.from(found.k),
    i: Int32Array.from(found.i),
    j: Int32Array.from(found.j),
    value: Float64Array.from(found.value),
  };
}

/** Radial part, with the weights, of the Gaussian curvature of a pair at the difference or the sum of the two orders. */
function fillProduct(product: Float64Array, left: Profile, right: Profile, sign: -1 | 1, weights: Float64Array): void {
  const [a, b] = sign < 0 ? [right.a, right.b] : [right.b, right.a];
  for (let n = 0; n < product.length; n += 1) {
    const value = (at(left.h, n) * at(right.h, n)) / 2 - at(left.a, n) * at(a, n) - at(left.b, n) * at(b, n);
    product[n] = value * at(weights, n);
  }
}

/** Matrices of ∫ H_i H_j, ∫ (D_i D_j + T_i T_j) and ∫ (D_i D_j − T_i T_j) over the disc. */
export interface Grams {
  bulk: Float64Array;
  shear: Float64Array;
  cubic: Float64Array;
}

export function grams(profiles: readonly Profile[], weights: Float64Array): Grams {
  const size = profiles.length;
  const [bulk, shear, cubic] = [0, 0, 0].map(() => new Float64Array(size * size));
  if (!bulk || !shear || !cubic) throw new RangeError("three matrices");
  profiles.forEach((left, i) => {
    profiles.slice(0, i + 1).forEach((right, j) => {
      const [el, er] = [phaseOf(left), phaseOf(right)];
      const [m, n] = [left.order, right.order];
      const radial = (x: Float64Array, y: Float64Array) => {
        let sum = 0;
        for (let p = 0; p < weights.length; p += 1) sum += at(x, p) * at(y, p) * at(weights, p);
        return sum;
      };
      const set = (matrix: Float64Array, value: number) => {
        matrix[i * size + j] = value;
        matrix[j * size + i] = value;
      };
      // H_i H_j = h_i h_j/2 Re[ε_i ε_j* e^(i(m−n)θ) + ε_i ε_j e^(i(m+n)θ)].
      const [difference, sum] = [times(el, conjugate(er)), times(el, er)];
      const both = atRest(difference, m - n) + atRest(sum, m + n);
      if (both !== 0) set(bulk, (both / 2) * radial(left.h, right.h));
      // (D − iT)_i times the conjugate, and times (D − iT)_j itself.
      const same = atRest(difference, m - n);
      const mirrored = atRest(sum, m + n);
      let shearSum = 0;
      if (same !== 0) shearSum += same * (radial(left.a, right.a) + radial(left.b, right.b));
      if (mirrored !== 0) shearSum += mirrored * (radial(left.a, right.b) + radial(left.b, right.a));
      if (shearSum !== 0) set(shear, shearSum);
      const cubicSum =
        weighted(atRest(sum, m + n - 4), left.a, right.a, radial) +
        weighted(atRest(difference, m - n - 4), left.a, right.b, radial) +
        weighted(atRest(difference, m - n + 4), left.b, right.a, radial) +
        weighted(atRest(sum, m + n + 4), left.b, right.b, radial);
      if (cubicSum !== 0) set(cubic, cubicSum);
    });
  });
  return { bulk, shear, cubic };
}

/** Integral over the circle of Re(μ e^(iMθ)). */
function atRest(mu: Complex, frequency: number): number {
  return frequency === 0 ? 2 * Math.PI * mu[0] : 0;
}

function weighted(
  angular: number,
  x: Float64Array,
  y: Float64Array,
  radial: (x: Float64Array, y: Float64Array) => number,
): number {
  return angular === 0 ? 0 : angular * radial(x, y);
}
