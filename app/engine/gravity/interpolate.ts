import type { SmoothTable } from "./smooth-table.ts";
import { RATIO_GRID, type Grid } from "./table-grid.ts";

/**
 * Value at (x, ν) of a table of rows on `grid` and columns on the grid of Poisson's ratios, by cubics through four neighbours in
 * both directions. Beyond the ends the last cubic goes on.
 */
export function tableValue(table: SmoothTable, grid: Grid, x: number, nu: number): number {
  const across = neighbours(RATIO_GRID, nu);
  let total = 0;
  for (const [row, share] of neighbours(grid, x)) {
    for (const [column, part] of across) total += share * part * (table[row]?.[column] ?? 0);
  }
  return total;
}

/** Four neighbours of a place, with the weights of Lagrange's cubic. */
function neighbours({ first, step, count }: Grid, x: number): [number, number][] {
  const place = (x - first) / step;
  const start = Math.min(Math.max(Math.floor(place) - 1, 0), count - 4);
  const nodes = [0, 1, 2, 3].map((n) => start + n);
  return nodes.map((node) => [
    node,
    nodes.reduce((product, other) => (other === node ? product : (product * (place - other)) / (node - other)), 1),
  ]);
}
