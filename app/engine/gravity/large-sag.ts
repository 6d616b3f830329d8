import { tableValue } from "./interpolate.ts";
import { POINT_GRID, RING_GRID } from "./table-grid.ts";
import { POINT_RATIOS, RING_LOGARITHMS } from "./table/large-sag.ts";

/**
 * Sag on a ring under the rim over that of small deflections, by von Karman's theory of full symmetry, rim free to slide and
 * turn, at the load `q` = q a⁴/(D h). 1 for small loads, 0.95 at Q of some 6 (a sag of 0.4 thicknesses), 0.35 at Q = 100.
 *
 * From a table by cubics in the logarithms (`generator/edge-ring-curve.ts`) up to Q = 10⁷, within 0.05 % between its rows;
 * beyond, a membrane's, with the sag as the cube root of the load. A real rim, compressed, may wrinkle, and a bowed wafer
 * starts from another shape. Source: own computation ('plate-gravity-large').
 */
export function edgeRingRatio(q: number, nu: number): number {
  if (q < 0.1) return 1;
  const power = Math.log10(q);
  const last = RING_GRID.first + RING_GRID.step * (RING_GRID.count - 1);
  const ratio = Math.exp(tableValue(RING_LOGARITHMS, RING_GRID, Math.min(power, last), nu));
  return power > last ? ratio * 10 ** ((-2 / 3) * (power - last)) : ratio;
}

/**
 * Peak to valley on three points at the rim over that of small deflections, by von Karman's theory of threefold symmetry, at the
 * load `q` = q a⁴/(D h); null beyond Q = 300, where the shape may fold about a diameter and the sag keeps at some 0.6 to 1.0 of
 * the linear one. Within 0.01. Source: own computation (`generator/points-ritz.ts`, 'plate-gravity-large').
 */
export function threePointRatio(q: number, nu: number): number | null {
  const log = Math.log(q);
  if (log > POINT_GRID.first + POINT_GRID.step * (POINT_GRID.count - 1)) return null;
  const ratio = (x: number) => tableValue(POINT_RATIOS, POINT_GRID, x, nu);
  // The ratio leaves 1 with the square of the load.
  if (log < POINT_GRID.first) return 1 - (1 - ratio(POINT_GRID.first)) * Math.exp(2 * (log - POINT_GRID.first));
  return ratio(log);
}
