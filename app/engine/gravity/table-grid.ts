import { RAILS_RANGE } from "./support.ts";

/** Even steps at which a table was made. */
export interface Grid {
  first: number;
  step: number;
  count: number;
}

function grid(first: number, last: number, count: number): Grid {
  return { first, step: (last - first) / (count - 1), count };
}

/** Poisson's ratio, in all tables. */
export const RATIO_GRID = /* @__PURE__ */ grid(0, 0.45, 4);

/** Rails by the angle from the axis across them to their ends: half spacing over radius is its cosine. */
export const RAIL_GRID = /* @__PURE__ */ grid(Math.acos(RAILS_RANGE.high), Math.acos(RAILS_RANGE.low), 37);

/** Edge ring: decimal logarithm of the load Q. */
export const RING_GRID = /* @__PURE__ */ grid(-1, 7, 33);

/** Three points at the rim: natural logarithm of the load Q, 3 to 300. */
export const POINT_GRID = /* @__PURE__ */ grid(Math.log(3), Math.log(300), 13);

/** The places of a grid. */
export function places({ first, step, count }: Grid): number[] {
  return Array.from({ length: count }, (_, n) => first + n * step);
}
