import { zernikeBasis, type ZernikeIndex } from "./zernike.ts";

/** Height or thickness over the wafer as a sum of circle polynomials. x points from the centre to the notch, device side up. */
export interface Surface {
  /** m, of the disk on which it was fitted: the wafer's radius less the edge exclusion */
  radius: number;
  /** highest radial order */
  order: number;
  /** in the order of `zernikeIndices(order)`, m */
  terms: (ZernikeIndex & { value: number; standardUncertainty: number })[];
  /** of the terms, m²; zero for those that were not fitted */
  covariance: number[][];
  /** root mean square of measured less fitted, m */
  rms: number;
  /** points that it was fitted to */
  used: number;
  /** what a reader must know about it */
  remarks: string[];
}

/** Height of a surface at a place on the wafer, m; also a little outside its disk. */
export function surfaceHeight(surface: Surface, x: number, y: number): number {
  return surfaceEvaluator(surface)(x, y);
}

/** The same for many places. */
export function surfaceEvaluator({ radius, order, terms }: Surface): (x: number, y: number) => number {
  const basis = zernikeBasis(order);
  const values = new Float64Array(terms.length);
  const heights = Float64Array.from(terms, ({ value }) => value);
  return (x, y) => {
    basis.fill(x / radius, y / radius, values);
    let height = 0;
    for (let k = 0; k < values.length; k += 1) height += (values[k] ?? 0) * (heights[k] ?? 0);
    return height;
  };
}

/** Curvatures of the surface's second-order terms, 1/m: w = kx x²/2 + ky y²/2 + t x y. */
export function secondOrderCurvature({ radius, terms }: Surface): { x: number; y: number; twist: number } {
  const at = (n: number, m: number) => terms.find((term) => term.n === n && term.m === m)?.value ?? 0;
  const [defocus, saddle, twisted] = [at(2, 0), at(2, 2), at(2, -2)];
  const per = 1 / (radius * radius);
  return { x: (4 * defocus + 2 * saddle) * per, y: (4 * defocus - 2 * saddle) * per, twist: 2 * twisted * per };
}

/**
 * `a` plus `times` `b` on the same disk, such as a median surface from a front surface and a thickness. Their errors are taken as
 * independent.
 */
export function combinedSurface(a: Surface, b: Surface, times: number): Surface {
  const [longer, shorter] = a.order >= b.order ? [a, b] : [b, a];
  const factor = (surface: Surface) => (surface === a ? 1 : times);
  const covariance = longer.covariance.map((row, i) =>
    row.map((value, j) => factor(longer) ** 2 * value + factor(shorter) ** 2 * (shorter.covariance[i]?.[j] ?? 0)),
  );
  return {
    ...longer,
    terms: longer.terms.map((term, i) => ({
      ...term,
      value: factor(longer) * term.value + factor(shorter) * (shorter.terms[i]?.value ?? 0),
      standardUncertainty: Math.sqrt(Math.max(0, covariance[i]?.[i] ?? 0)),
    })),
    covariance,
    rms: Math.hypot(a.rms, times * b.rms),
    used: Math.min(a.used, b.used),
    remarks: [...new Set([...a.remarks, ...b.remarks])],
  };
}
