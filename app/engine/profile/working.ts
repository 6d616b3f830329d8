import type { Working, WorkingLine } from "../working.ts";
import { stoneyStressWorking } from "../stoney/working.ts";
import { fitAzimuths, type AzimuthReading } from "./azimuths.ts";
import type { ScanColumns } from "./columns.ts";
import { filmStressFromProfiles, type FilmStressFromProfilesInput } from "./film-stress.ts";
import { fitScan, type FitOptions } from "./fit-scan.ts";

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

/** The expanded uncertainty of `fitScan` as data, its curvature beneath it. */
export function fitScanWorking(scan: ScanColumns, o: FitOptions): Working {
  const fit = fitScan(scan, o);
  const { scatter } = fit;
  return {
    equation: "scan-scatter",
    inputs: [
      { symbol: "s", meaning: "standard deviation of the heights", value: scatter.standardDeviation, unit: "m" },
      { symbol: "r", meaning: "correlation of neighbours", value: scatter.neighbours, unit: "1" },
      { symbol: "I", meaning: "inflation", value: scatter.inflation, unit: "1" },
      { symbol: "u_κ", meaning: "standard uncertainty of the curvature", value: fit.standardUncertainty, unit: "1/m" },
      { symbol: "ν", meaning: "degrees of freedom", value: scatter.degreesOfFreedom, unit: "1" },
      { symbol: "t", meaning: "coverage factor", value: scatter.coverageFactor, unit: "1" },
    ],
    result: { symbol: "U_κ", meaning: "expanded uncertainty, 95 %", value: fit.expandedUncertainty, unit: "1/m" },
    note: scatter.correlated
      ? "Neighbouring heights go together, so the points say less than their number."
      : "The scatter is independent from point to point.",
    from: [
      {
        equation: "profile-fit",
        inputs: [
          { symbol: "n", meaning: "points used", value: fit.used, unit: "1" },
          { symbol: "L", meaning: "length of the fit", value: 2 * fit.halfWidth, unit: "m" },
          { symbol: "c_1", meaning: "tilt at the middle", value: Math.tan(fit.tilt), unit: "1" },
          { symbol: "q", meaning: "share of the fourth-order term", value: fit.quartic, unit: "1" },
        ],
        result: { symbol: "κ", meaning: "curvature, bowl positive", value: fit.curvature, unit: "1/m" },
      },
    ],
  };
}

/** The larger principal curvature of `fitAzimuths` as data; null where fewer than three lines are there. */
export function azimuthsWorking(readings: readonly AzimuthReading[]): Working | null {
  const fit = fitAzimuths(readings);
  if (fit.kind !== "all directions") return null;
  return {
    equation: "azimuth-curvatures",
    inputs: [
      ...readings.map(({ azimuth, curvature }, n): WorkingLine => ({
        symbol: `κ(θ_${n + 1})`,
        meaning: `curvature of the scan at ${((azimuth * 180) / Math.PI).toFixed(1)}°`,
        value: curvature,
        unit: "1/m",
      })),
      { symbol: "κ_x", meaning: "curvature along azimuth 0", value: fit.curvature.x, unit: "1/m" },
      { symbol: "κ_y", meaning: "curvature across it", value: fit.curvature.y, unit: "1/m" },
      { symbol: "t", meaning: "twist", value: fit.curvature.twist, unit: "1/m" },
      { symbol: "κ_2", meaning: "principal curvature across", value: fit.minor, unit: "1/m" },
      { symbol: "θ_1", meaning: "angle of the larger one", value: fit.majorAngle, unit: "rad" },
      { symbol: "u_1", meaning: "standard uncertainty of the larger one", value: fit.majorUncertainty, unit: "1/m" },
    ],
    result: { symbol: "κ_1", meaning: "principal curvature of the larger size", value: fit.major, unit: "1/m" },
    note: fit.sentence,
  };
}

function notSpherical(quartic: number): string | undefined {
  if (Math.abs(quartic) <= 0.05) return undefined;
  return "The change of shape is not spherical: the film varies over the wafer, or the deflection is large.";
}
