import type { Working } from "../working.ts";
import { bowFromCurvature } from "./bow.ts";
import { filmForce } from "./film-force.ts";
import { stoneyCurvature, stoneyStress, type StoneyFilm } from "./stoney.ts";

function filmAndWafer(i: StoneyFilm): Working["inputs"] {
  return [
    { symbol: "h_f", meaning: "film thickness", value: i.filmThickness, unit: "m" },
    { symbol: "h", meaning: "wafer thickness", value: i.substrateThickness, unit: "m" },
    { symbol: "M", meaning: "biaxial modulus of the wafer", value: i.biaxialModulus, unit: "Pa" },
  ];
}

/** The calculation of `stoneyCurvature` as data. */
export function stoneyCurvatureWorking(i: Parameters<typeof stoneyCurvature>[0]): Working {
  return {
    equation: "stoney-curvature",
    inputs: [{ symbol: "σ_f", meaning: "film stress", value: i.filmStress, unit: "Pa" }, ...filmAndWafer(i)],
    result: { symbol: "κ", meaning: "curvature, bowl positive", value: stoneyCurvature(i), unit: "1/m" },
    note: thinFilmNote(i),
  };
}

/** The calculation of `stoneyStress` as data. */
export function stoneyStressWorking(i: Parameters<typeof stoneyStress>[0]): Working {
  return {
    equation: "stoney-stress",
    inputs: [
      { symbol: "κ − κ_0", meaning: "change of curvature", value: i.curvatureChange, unit: "1/m" },
      ...filmAndWafer(i),
    ],
    result: { symbol: "σ_f", meaning: "film stress, tension positive", value: stoneyStress(i), unit: "Pa" },
    note: thinFilmNote(i),
  };
}

function thinFilmNote(i: StoneyFilm): string {
  const percent = (300 * i.filmThickness) / i.substrateThickness;
  return `For a film as stiff as the wafer the thin-film formula is about ${percent.toPrecision(2)} % off at this thickness.`;
}

/** The calculation of `bowFromCurvature` as data; the result has the sign of the curvature. */
export function bowFromCurvatureWorking(i: Parameters<typeof bowFromCurvature>[0]): Working {
  return {
    equation: i.exact ? "bow-arc" : "bow-parabola",
    inputs: [
      { symbol: "κ", meaning: "curvature, bowl positive", value: i.curvature, unit: "1/m" },
      { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
    ],
    result: { symbol: "s", meaning: "rim over centre", value: bowFromCurvature(i), unit: "m" },
  };
}

/** The calculation of `filmForce` as data. */
export function filmForceWorking(i: Parameters<typeof filmForce>[0]): Working {
  return {
    equation: "film-force",
    inputs: [
      { symbol: "σ", meaning: "film stress", value: i.stress, unit: "Pa" },
      { symbol: "h_f", meaning: "film thickness", value: i.thickness, unit: "m" },
      { symbol: "f", meaning: "area fraction covered", value: i.coverage ?? 1, unit: "1" },
    ],
    result: { symbol: "N", meaning: "film force, tension positive", value: filmForce(i), unit: "N/m" },
  };
}
