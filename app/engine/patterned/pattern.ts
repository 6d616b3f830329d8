import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";

/**
 * How a film covers the wafer.
 *
 * - `full`: everywhere.
 * - `lines`: parallel lines of `lineWidth` (m) covering the share `coverage` of the area, running at `direction` (rad,
 *   counter-clockwise from x seen from above).
 * - `islands`: separate pads, square or round, of edge or diameter `size` (m).
 * - `random`: a pattern without direction whose parts are joined or wide, such as wiring that meanders.
 */
export type FilmPattern =
  | { kind: "full" }
  | { kind: "lines"; coverage: number; lineWidth: number; direction: number }
  | { kind: "islands"; coverage: number; size: number }
  | { kind: "random"; coverage: number };

/** Lines as a stack or a step names them, beside the area that they cover: width, m, and direction, rad, as in `FilmPattern`. */
export interface FilmLines {
  width: number;
  direction: number;
}

/** The pattern of a film cut in lines that cover the share `coverage` of the area. */
export function linesPattern({ width, direction }: FilmLines, coverage: number): FilmPattern & { kind: "lines" } {
  return { kind: "lines", coverage, lineWidth: width, direction };
}

/** Returns the pattern when all of it is legal, else throws `EngineInputError` naming the part. */
export function checkPattern(pattern: FilmPattern, field: string): FilmPattern {
  switch (pattern.kind) {
    case "full":
      return pattern;
    case "lines":
      requireCoverage(pattern.coverage, field);
      requireWithin(`${field}.lineWidth`, pattern.lineWidth, 1e-10, 10, "m");
      requireWithin(`${field}.direction`, pattern.direction, -2 * Math.PI, 2 * Math.PI, "rad");
      return pattern;
    case "islands":
      requireCoverage(pattern.coverage, field);
      requireWithin(`${field}.size`, pattern.size, 1e-10, 10, "m");
      return pattern;
    case "random":
      requireCoverage(pattern.coverage, field);
      return pattern;
    default:
      throw new EngineInputError(`${field}.kind`, "is not a pattern known here", "full, lines, islands or random");
  }
}

/** Share of the area that a pattern covers. */
export function coverageOf(pattern: FilmPattern): number {
  return pattern.kind === "full" ? 1 : pattern.coverage;
}

function requireCoverage(coverage: number, field: string): number {
  return requireWithin(`${field}.coverage`, coverage, 0, 1, "1");
}
