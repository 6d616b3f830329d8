import type { Working, WorkingLine } from "../working.ts";
import { stoneyStressWorking } from "../stoney/working.ts";
import { filmStressFromProfiles, type FilmStressFromProfilesInput } from "./film-stress.ts";

/** The calculation of `filmStressFromProfiles` as data, with its uncertainty budget underneath. */
export function filmStressFromProfilesWorking(i: FilmStressFromProfilesInput): Working {
  const film = filmStressFromProfiles(i);
  const { difference } = film;
  const budget: WorkingLine[] = film.budget.map(({ input, contribution }, n) => ({
    symbol: `u_${n + 1}`,
    meaning: `share of the ${input}`,
    value: contribution,
    unit: "Pa",
  }));
  return {
    equation: "film-stress-from-profiles",
    inputs: [
      { symbol: "κ − κ_0", meaning: "change of curvature, post less pre", value: film.curvatureChange, unit: "1/m" },
      {
        symbol: "u_κ",
        meaning: "its standard uncertainty from the scatter",
        value: difference.expandedUncertainty / 2,
        unit: "1/m",
      },
      { symbol: "n", meaning: "points used", value: difference.used, unit: "1" },
      { symbol: "q", meaning: "share of the fourth-order term", value: difference.quartic, unit: "1" },
    ],
    result: { symbol: "σ_f", meaning: "film stress, tension positive", value: film.stress, unit: "Pa" },
    note: notSpherical(difference.quartic),
    from: [
      stoneyStressWorking({ ...i, curvatureChange: film.curvatureChange }),
      {
        equation: "first-order-uncertainty",
        inputs: budget,
        result: {
          symbol: "u",
          meaning: "standard uncertainty of the film stress",
          value: film.standardUncertainty,
          unit: "Pa",
        },
      },
    ],
  };
}

function notSpherical(quartic: number): string | undefined {
  if (Math.abs(quartic) <= 0.05) return undefined;
  return "The change of shape is not spherical: the film varies over the wafer, or the deflection is large.";
}
