import type { Working, WorkingLine } from "../working.ts";
import { directionalStoneyCurvature } from "./directional-stoney.ts";
import { transferLength } from "./edge-relief.ts";
import { patternedFilm, type PatternedFilmInput } from "./patterned-film.ts";

/** The force of `patternedFilm` along one axis as data. */
export function patternedFilmWorking(i: PatternedFilmInput, axis: "x" | "y"): Working {
  const film = patternedFilm(i);
  const { pattern } = i;
  const stress: WorkingLine[] =
    typeof i.stress === "number"
      ? [{ symbol: "σ", meaning: "stress of the blanket film", value: i.stress, unit: "Pa" }]
      : [
          { symbol: "σ_x", meaning: "stress of the blanket film along x", value: i.stress.x, unit: "Pa" },
          { symbol: "σ_y", meaning: "stress of the blanket film along y", value: i.stress.y, unit: "Pa" },
        ];
  const direction: WorkingLine[] =
    pattern.kind === "lines"
      ? [{ symbol: "φ", meaning: "angle of the lines from x", value: pattern.direction, unit: "rad" }]
      : [];
  const relieved = edgeReliefWorking(i);
  return {
    equation: "patterned-film",
    inputs: [
      ...stress,
      { symbol: "h_f", meaning: "film thickness", value: i.thickness, unit: "m" },
      { symbol: "f", meaning: "area fraction covered", value: film.coverage, unit: "1" },
      { symbol: "ν", meaning: "Poisson's ratio of the film", value: i.poissonsRatio, unit: "1" },
      { symbol: "g", meaning: "share of the blanket stress kept", value: film.edgeRelief, unit: "1" },
      ...direction,
    ],
    result: {
      symbol: `N_${axis}`,
      meaning: `film force along ${axis}, tension positive`,
      value: film.force[axis],
      unit: "N/m",
    },
    note: pattern.kind === "lines" ? "The formula is that of the lines' own axes, turned into x and y." : undefined,
    from: relieved === null ? undefined : [relieved],
  };
}

/** The share that edges leave, as data; null for patterns without edges that relieve. */
export function edgeReliefWorking(i: PatternedFilmInput): Working | null {
  const { pattern, thickness, youngsModulus } = i;
  if (pattern.kind === "full" || pattern.kind === "random") return null;
  const [kind, width] =
    pattern.kind === "lines" ? (["line", pattern.lineWidth] as const) : (["island", pattern.size] as const);
  return {
    equation: "edge-relief",
    inputs: [
      { symbol: "w", meaning: `width of a ${kind}`, value: width, unit: "m" },
      { symbol: "h_f", meaning: "film thickness", value: thickness, unit: "m" },
      { symbol: "E_f", meaning: "Young's modulus of the film", value: youngsModulus, unit: "Pa" },
      { symbol: "l", meaning: "transfer length", value: transferLength(thickness, youngsModulus, kind), unit: "m" },
    ],
    result: {
      symbol: "g",
      meaning: "share of the blanket stress kept",
      value: patternedFilm(i).edgeRelief,
      unit: "1",
    },
    note: "Practical interpolation between exact limits.",
  };
}

/** One curvature of `directionalStoneyCurvature` as data. */
export function directionalStoneyWorking(
  i: Parameters<typeof directionalStoneyCurvature>[0],
  axis: "x" | "y",
): Working {
  return {
    equation: "directional-stoney",
    inputs: [
      { symbol: "N_x", meaning: "film force along x", value: i.force.x, unit: "N/m" },
      { symbol: "N_y", meaning: "film force along y", value: i.force.y, unit: "N/m" },
      { symbol: "E", meaning: "Young's modulus of the wafer", value: i.youngsModulus, unit: "Pa" },
      { symbol: "ν", meaning: "Poisson's ratio of the wafer", value: i.poissonsRatio, unit: "1" },
      { symbol: "h", meaning: "wafer thickness", value: i.substrateThickness, unit: "m" },
    ],
    result: {
      symbol: `κ_${axis}`,
      meaning: `curvature along ${axis}, bowl positive`,
      value: directionalStoneyCurvature(i)[axis],
      unit: "1/m",
    },
  };
}
