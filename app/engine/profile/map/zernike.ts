import { EngineInputError } from "../../errors.ts";

/** One circle polynomial: radial order n, and m waves around; m < 0 is the sine. */
export interface ZernikeIndex {
  n: number;
  m: number;
}

/** Highest radial order that is fitted. */
export const HIGHEST_ORDER = 6;

/**
 * Zernike's circle polynomials up to a radial order, by order and then by m from −n to n. They stand without a norm, 1 at the rim:
 * R_n^|m|(ρ) cos mθ, for m < 0 with sin |m|θ; 2 ρ² − 1 is defocus, ρ² cos 2θ a saddle along x.
 * Source: Born and Wolf 1999, section 9.2.1; order of Thibos and others 2002.
 */
export function zernikeIndices(order: number): ZernikeIndex[] {
  if (!Number.isInteger(order) || order < 0 || order > HIGHEST_ORDER)
    throw new EngineInputError("order", "is no order of a surface", `0 to ${HIGHEST_ORDER}`);
  const indices: ZernikeIndex[] = [];
  for (let n = 0; n <= order; n += 1) for (let m = -n; m <= n; m += 2) indices.push({ n, m });
  return indices;
}

/** Coefficients of ρ^n, ρ^(n−2), … of the radial polynomial: (−1)^k (n − k)! / (k! ((n + m)/2 − k)! ((n − m)/2 − k)!). */
function radialCoefficients(n: number, m: number): number[] {
  const waves = Math.abs(m);
  return Array.from({ length: (n - waves) / 2 + 1 }, (_, k) => {
    const sign = k % 2 === 0 ? 1 : -1;
    return (sign * factorial(n - k)) / (factorial(k) * factorial((n + waves) / 2 - k) * factorial((n - waves) / 2 - k));
  });
}

function factorial(n: number): number {
  return n < 2 ? 1 : n * factorial(n - 1);
}

/** A polynomial made ready: radial coefficients in ρ² from the highest down, after ρ^|m| has been taken out. */
interface Prepared {
  waves: number;
  sine: boolean;
  radial: Float64Array;
}

export interface ZernikeBasis {
  indices: ZernikeIndex[];
  /** Writes the value of every polynomial at (x, y), in shares of the radius, into `out`. */
  fill(x: number, y: number, out: Float64Array): void;
}

/** The polynomials up to an order, ready to be evaluated many times without new objects. */
export function zernikeBasis(order: number): ZernikeBasis {
  const indices = zernikeIndices(order);
  const prepared = indices.map(({ n, m }): Prepared => ({
    waves: Math.abs(m),
    sine: m < 0,
    radial: Float64Array.from(radialCoefficients(n, m)),
  }));
  const cosines = new Float64Array(order + 1);
  const sines = new Float64Array(order + 1);
  return {
    indices,
    fill(x, y, out) {
      const square = x * x + y * y;
      // ρ^m cos mθ and ρ^m sin mθ are the parts of (x + i y)^m.
      cosines[0] = 1;
      sines[0] = 0;
      for (let m = 1; m <= order; m += 1) {
        cosines[m] = x * (cosines[m - 1] ?? 0) - y * (sines[m - 1] ?? 0);
        sines[m] = x * (sines[m - 1] ?? 0) + y * (cosines[m - 1] ?? 0);
      }
      for (let k = 0; k < prepared.length; k += 1) {
        const term = prepared[k];
        if (!term) continue;
        let radial = 0;
        for (let c = 0; c < term.radial.length; c += 1) radial = radial * square + (term.radial[c] ?? 0);
        out[k] = radial * ((term.sine ? sines[term.waves] : cosines[term.waves]) ?? 0);
      }
    },
  };
}
