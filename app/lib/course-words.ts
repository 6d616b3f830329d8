import { micrometres } from "./assessment-figure.ts";

/** 'edges up 228 µm', 'edges down 40 µm': a warp as it lies, edges up positive. */
export function lyingText(warp: number): string {
  return `${warp < 0 ? "edges down" : "edges up"} ${micrometres(Math.abs(warp))}`;
}
