import { fitAzimuths, type AzimuthFit, type AzimuthReading } from "#app/engine/profile/azimuths.ts";
import { criticalLinearCurvature } from "#app/engine/plate/critical-load.ts";
import { siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";
import type { Directions } from "#app/schemas/film-analysis.ts";
import type { ScanParameters } from "#app/schemas/scan-result.ts";
import type { PlacedPair } from "./pair-points.ts";

const K = 2;

/** Mean curvature over the directions that a fit has, 1/m, with its standard uncertainty. */
export function meanOf(fit: AzimuthFit): { value: number; standardUncertainty: number } {
  return fit.kind === "one line"
    ? { value: fit.curvature, standardUncertainty: fit.standardUncertainty }
    : { value: fit.mean, standardUncertainty: fit.meanUncertainty };
}

/** Which curvature of a pair is meant. */
export type CurvatureOf = "change" | "before" | "after";

const CURVATURE = { change: "curvatureChange", before: "curvatureBefore", after: "curvatureAfter" } as const;

/** A scan that was exact to the last digit still has an uncertainty, 1/m. */
const LEAST = 1e-12;

/**
 * Standard uncertainty of a pair's change of curvature, 1/m: its scatter, or root two of what its instrument repeats within where that
 * is larger, which holds the scatter already.
 */
export function changeUncertainty({ result, tool }: PlacedPair): number {
  return Math.max(result.curvatureUncertainty, Math.SQRT2 * (tool?.forTwo ?? 0), LEAST);
}

/** Readings for the fit in all directions; pairs whose azimuth is not known lie on one line. */
export function readingsOf(pairs: readonly PlacedPair[], of: CurvatureOf): AzimuthReading[] {
  return pairs.map((pair) => ({
    azimuth: pair.azimuth ?? 0,
    curvature: pair.result[CURVATURE[of]],
    standardUncertainty: changeUncertainty(pair),
  }));
}

/** Curvature from which the free wafer rolls about one axis, 1/m. */
export function rollsFrom({ diameter, siliconThickness, orientation }: ScanParameters): number {
  return criticalLinearCurvature({
    radius: diameter / 2,
    thickness: siliconThickness,
    ...siliconPlateConstants(orientation),
    crystal: orientation,
  });
}

/** The fit of the pairs' curvatures over their azimuths. */
export function directionsFit(pairs: readonly PlacedPair[], of: CurvatureOf, parameters: ScanParameters): AzimuthFit {
  return fitAzimuths(readingsOf(pairs, of), rollsFrom(parameters));
}

/** The same in the words and figures of the page. */
export function directionsView(fit: AzimuthFit): Directions {
  const { value, standardUncertainty } = meanOf(fit);
  const mean = { value, uncertainty: K * standardUncertainty };
  if (fit.kind !== "all directions") return { sentence: fit.sentence, mean, all: null };
  const { curvature, word, major, minor, majorAngle, majorUncertainty, minorUncertainty, angleUncertainty } = fit;
  const own = (n: number) => K * Math.sqrt(Math.max(0, curvature.covariance[n]?.[n] ?? 0));
  return {
    sentence: fit.sentence,
    mean,
    all: {
      word,
      x: { value: curvature.x, uncertainty: own(0) },
      y: { value: curvature.y, uncertainty: own(1) },
      twist: { value: curvature.twist, uncertainty: own(2) },
      major: { value: major, uncertainty: K * majorUncertainty },
      minor: { value: minor, uncertainty: K * minorUncertainty },
      angle: { value: majorAngle, uncertainty: K * angleUncertainty },
      angleTold: angleUncertainty < Math.PI / 2,
    },
  };
}
