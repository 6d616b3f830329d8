import { coordinate } from "./coordinate.ts";

/**
 * Path of 45-degree lines that cover a box of `width` by `height` px from its corner, `pitch` px apart measured
 * perpendicular to the lines (so pitch·√2 along an edge). `crossed` adds the other diagonal. Lines reach past the box:
 * the caller clips them.
 */
export function hatchPath(width: number, height: number, pitch: number, crossed: boolean): string {
  const step = pitch * Math.SQRT2;
  let path = "";
  for (let foot = -height; foot < width; foot += step) {
    const from = coordinate(foot);
    const to = coordinate(foot + height);
    path += `M${from} ${coordinate(height)}L${to} 0`;
    if (crossed) path += `M${from} 0L${to} ${coordinate(height)}`;
  }
  return path;
}
