import { factorSymmetric, invertSymmetric } from "../../calibration/symmetric.ts";
import { EngineInputError } from "../../errors.ts";
import { requireFinite, requireRadius, requireWithin } from "../../inputs.ts";
import { ascendingColumns, type ScanColumns } from "../columns.ts";
import { zernikeBasis, type ZernikeBasis } from "./zernike.ts";
import type { Surface } from "./surface.ts";

/** Heights or thicknesses at places on the wafer, m; x from the centre to the notch, device side up. */
export interface SiteColumns {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  z: ArrayLike<number>;
}

export interface SurfaceInput {
  /** scans through the centre; each may lie at its own height and tilt, which is taken out */
  scans?: readonly (ScanColumns & { azimuth: number })[];
  /** places in one common frame */
  sites?: SiteColumns;
  /** of the wafer, m */
  radius: number;
  /** left out at the rim, m */
  edgeExclusion: number;
  /** highest radial order wanted, default 4; a lower one is taken where the places do not tell more */
  order?: number;
}

/** Stretches to which a scan is condensed. */
const STRETCHES = 2000;
/** How much worse than by itself a term may be known because others look alike at the places. */
const LARGEST_INFLATION = 1e4;
/** Mean square over the places below which a term is not seen by them. */
const INVISIBLE = 1e-4;
const DEFAULT_ORDER = 4;

/** Places with one level: of all sites together, or of one scan. */
interface Group {
  x: Float64Array;
  y: Float64Array;
  z: Float64Array;
  /** position along the scan whose tilt is its own; null for places in the common frame */
  along: Float64Array | null;
}

/**
 * Surface over the wafer by least squares in Zernike's circle polynomials, on the disk that the edge exclusion leaves.
 *
 * From scans through the centre each scan's height and tilt are taken out of the scan and of the polynomials alike (Lovell 1963),
 * so scans that were levelled by the tool or by hand serve too; the surface's own tilt and height are then zero. An order n needs
 * n + 1 azimuths, or enough sites; a lower order is taken otherwise, and said. Long scans are condensed to 2,000 means each.
 * Linear in the number of points. Standard uncertainties take the scatter about the surface as independent.
 *
 * @throws EngineInputError for values that are not finite, or too few places for a second-order surface
 * Source: Born and Wolf 1999; Thibos and others 2002.
 */
export function fitSurface(i: SurfaceInput): Surface {
  const radius = requireRadius("radius", i.radius);
  const disk = radius - requireWithin("edgeExclusion", i.edgeExclusion, 0, radius / 2, "m");
  const wanted = requireWithin("order", i.order ?? DEFAULT_ORDER, 2, 6, "1");
  const groups = [
    ...(i.scans ?? []).map((scan, n) => scanGroup(scan, `scans[${n}]`, disk)),
    ...(i.sites ? [siteGroup(i.sites, disk)] : []),
  ].filter(({ z }) => z.length > 0);
  for (let order = Math.floor(wanted); order >= 2; order -= 1) {
    const surface = atOrder(groups, order, disk);
    if (!surface) continue;
    if (order < wanted) surface.remarks.unshift(`The places tell a surface of order ${order}, not ${wanted}.`);
    return surface;
  }
  throw new EngineInputError(
    i.scans ? "scans" : "sites",
    "do not tell a surface: it takes scans along three azimuths, or sites all over the wafer",
  );
}

function scanGroup(scan: ScanColumns & { azimuth: number }, field: string, disk: number): Group {
  const azimuth = requireFinite(`${field}.azimuth`, scan.azimuth);
  const { x, z } = ascendingColumns(field, scan);
  const inside: number[] = [];
  for (let n = 0; n < x.length; n += 1) if (Math.abs(x[n] ?? 0) <= disk) inside.push(n);
  const count = Math.min(STRETCHES, inside.length);
  const [along, height] = [new Float64Array(count), new Float64Array(count)];
  for (let k = 0; k < count; k += 1) {
    const [from, to] = [Math.floor((k * inside.length) / count), Math.floor(((k + 1) * inside.length) / count)];
    for (let n = from; n < to; n += 1) {
      along[k] = (along[k] ?? 0) + (x[inside[n] ?? 0] ?? 0) / (to - from);
      height[k] = (height[k] ?? 0) + (z[inside[n] ?? 0] ?? 0) / (to - from);
    }
  }
  const [c, s] = [Math.cos(azimuth), Math.sin(azimuth)];
  return { x: along.map((at) => at * c), y: along.map((at) => at * s), z: height, along };
}

function siteGroup({ x, y, z }: SiteColumns, disk: number): Group {
  if (x.length !== y.length || x.length !== z.length)
    throw new EngineInputError("sites", "have columns of unequal length");
  const inside: number[] = [];
  for (let n = 0; n < x.length; n += 1) {
    const [atX, atY] = [requireFinite(`sites[${n}].x`, x[n] ?? 0), requireFinite(`sites[${n}].y`, y[n] ?? 0)];
    requireFinite(`sites[${n}].z`, z[n] ?? 0);
    // A site stated on the edge of the exclusion counts, whatever the rounding of its coordinates.
    if (Math.hypot(atX, atY) <= disk * (1 + 1e-9)) inside.push(n);
  }
  const picked = (values: ArrayLike<number>) => Float64Array.from(inside, (n) => values[n] ?? 0);
  return { x: picked(x), y: picked(y), z: picked(z), along: null };
}

interface Equations {
  normal: number[][];
  right: number[];
}

/** The second order without a saddle that has no height at any of the places, as one at 45° to sites on a cross. */
function withoutUnseen(groups: readonly Group[], order: number, disk: number, unseen: readonly number[]) {
  const { indices } = zernikeBasis(order);
  if (unseen.length !== 1 || Math.abs(indices[unseen[0] ?? 0]?.m ?? 0) !== 2 || !groups.every(({ along }) => !along))
    return null;
  const surface = atOrder(groups, order, disk, unseen);
  surface?.remarks.push("The sites cannot show a saddle at 45° to the lines on which they lie: it is left out.");
  return surface;
}

function atOrder(
  groups: readonly Group[],
  order: number,
  disk: number,
  leftOut: readonly number[] = [],
): Surface | null {
  const basis = zernikeBasis(order);
  const own = groups.every(({ along }) => along !== null);
  // With levels of their own, scans say nothing about the height and tilt of the whole.
  const fitted = basis.indices.flatMap(({ n }, k) => ((own && n < 2) || leftOut.includes(k) ? [] : [k]));
  const levels = groups.reduce((sum, { along }) => sum + (along ? 2 : 0), 0);
  const used = groups.reduce((sum, { z }) => sum + z.length, 0);
  const free = used - fitted.length - levels;
  if (free < 1) return null;
  const equations: Equations = { normal: fitted.map(() => fitted.map(() => 0)), right: fitted.map(() => 0) };
  for (const group of groups) addGroup(equations, group, basis, fitted, disk);
  const unseen = fitted.filter((_, k) => (equations.normal[k]?.[k] ?? 0) < INVISIBLE * used);
  if (unseen.length > 0) return order > 2 ? null : withoutUnseen(groups, order, disk, unseen);
  const solve = factorSymmetric(equations.normal);
  const inverse = solve && invertSymmetric(equations.normal);
  if (!solve || !inverse) return null;
  const alike = inverse.some((row, k) => (row[k] ?? 0) * (equations.normal[k]?.[k] ?? 0) > LARGEST_INFLATION);
  if (alike) return null;
  const solved = solve(equations.right);
  const values = basis.indices.map(() => 0);
  fitted.forEach((k, n) => (values[k] = solved[n] ?? 0));
  const squares = groups.reduce((sum, group) => sum + leftOver(group, basis, values, disk), 0);
  const place = new Map(fitted.map((k, n) => [k, n]));
  const covariance = basis.indices.map((_, a) =>
    basis.indices.map((__, b) => {
      const [i, j] = [place.get(a), place.get(b)];
      return i === undefined || j === undefined ? 0 : ((inverse[i]?.[j] ?? 0) * squares) / free;
    }),
  );
  return {
    radius: disk,
    order,
    terms: basis.indices.map((index, k) => ({
      ...index,
      value: values[k] ?? 0,
      standardUncertainty: Math.sqrt(Math.max(0, covariance[k]?.[k] ?? 0)),
    })),
    covariance,
    rms: Math.sqrt(squares / used),
    used,
    remarks: own ? ["Scans through the centre: each one's own tilt is taken out, so the surface has none."] : [],
  };
}

/** Adds a group's sums, its own level and tilt taken out of both sides. */
function addGroup(equations: Equations, group: Group, basis: ZernikeBasis, fitted: number[], disk: number): void {
  const size = fitted.length;
  const all = new Float64Array(basis.indices.length);
  const row = new Float64Array(size);
  const products = new Float64Array(size * size);
  const right = new Float64Array(size);
  // Sums with 1 and with the position along the scan: of the polynomials and, last, of the height.
  const [ones, along] = [new Float64Array(size + 1), new Float64Array(size + 1)];
  let [first, second] = [0, 0];
  const { x, y, z } = group;
  for (let n = 0; n < z.length; n += 1) {
    basis.fill((x[n] ?? 0) / disk, (y[n] ?? 0) / disk, all);
    for (let k = 0; k < size; k += 1) row[k] = all[fitted[k] ?? 0] ?? 0;
    const height = z[n] ?? 0;
    const at = (group.along?.[n] ?? 0) / disk;
    first += at;
    second += at * at;
    for (let k = 0; k < size; k += 1) {
      const value = row[k] ?? 0;
      for (let j = 0; j <= k; j += 1) products[k * size + j] = (products[k * size + j] ?? 0) + value * (row[j] ?? 0);
      right[k] = (right[k] ?? 0) + value * height;
      ones[k] = (ones[k] ?? 0) + value;
      along[k] = (along[k] ?? 0) + value * at;
    }
    ones[size] = (ones[size] ?? 0) + height;
    along[size] = (along[size] ?? 0) + height * at;
  }
  const count = z.length;
  const spread = second - (first * first) / count;
  const level = (a: number, b: number): number => {
    if (!group.along) return 0;
    const [slopeA, slopeB] = [a, b].map((k) => (along[k] ?? 0) - ((ones[k] ?? 0) * first) / count);
    const tilt = spread > 0 ? ((slopeA ?? 0) * (slopeB ?? 0)) / spread : 0;
    return ((ones[a] ?? 0) * (ones[b] ?? 0)) / count + tilt;
  };
  for (let k = 0; k < size; k += 1) {
    const line = equations.normal[k];
    if (!line) continue;
    for (let j = 0; j < size; j += 1)
      line[j] = (line[j] ?? 0) + (products[Math.max(k, j) * size + Math.min(k, j)] ?? 0) - level(k, j);
    equations.right[k] = (equations.right[k] ?? 0) + (right[k] ?? 0) - level(k, size);
  }
}

/** Sum of squares of measured less fitted in a group, its own level and tilt taken out. */
function leftOver({ x, y, z, along }: Group, basis: ZernikeBasis, values: readonly number[], disk: number): number {
  const all = new Float64Array(basis.indices.length);
  let [count, sum, sumAt, sumAtAt, sumR, sumAtR] = [0, 0, 0, 0, 0, 0];
  for (let n = 0; n < z.length; n += 1) {
    basis.fill((x[n] ?? 0) / disk, (y[n] ?? 0) / disk, all);
    let rest = z[n] ?? 0;
    for (let k = 0; k < all.length; k += 1) rest -= (all[k] ?? 0) * (values[k] ?? 0);
    const at = (along?.[n] ?? 0) / disk;
    count += 1;
    sum += rest * rest;
    sumAt += at;
    sumAtAt += at * at;
    sumR += rest;
    sumAtR += rest * at;
  }
  if (!along) return sum;
  const spread = sumAtAt - (sumAt * sumAt) / count;
  const slope = sumAtR - (sumR * sumAt) / count;
  return Math.max(0, sum - (sumR * sumR) / count - (spread > 0 ? (slope * slope) / spread : 0));
}
