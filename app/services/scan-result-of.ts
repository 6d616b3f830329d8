import { fromTolerance } from "#app/engine/measured.ts";
import { filmStressFromScans, type FilmStressFromScans } from "#app/engine/profile/film-stress.ts";
import { fittedHeight, levelHeight } from "#app/engine/profile/fitted-height.ts";
import { smallDeflection } from "#app/engine/profile/small-deflection.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { bowFromCurvature, standardBow } from "#app/engine/stoney/bow.ts";
import { MODULUS_UNCERTAINTY } from "#app/lib/modulus-uncertainty.ts";
import type { ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import type { ScanContribution, ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanSubject } from "#app/schemas/scan.ts";

/** Points that a plot of this width can show. */
const DRAWN_POINTS = 400;
const SHOWN_POSITIONS = 12;

/**
 * Film stress of a pair of profiles, with its uncertainty and the curves to draw.
 * @throws EngineInputError when the scans do not fit each other
 */
export function scanResult(values: ScanSubject, before: ReadProfile, after: ReadProfile): ScanResult {
  const biaxialModulus = siliconBiaxialModulus(values.orientation);
  const film = filmStressFromScans({
    pre: before.points,
    post: after.points,
    edgeExclusion: values.edgeExclusion,
    robust: true,
    filmThickness: values.filmThickness,
    substrateThickness: values.siliconThickness,
    biaxialModulus,
    uncertainties: {
      filmThickness: fromTolerance(values.filmThicknessTolerance),
      substrateThickness: fromTolerance(values.siliconThicknessTolerance),
      biaxialModulus: MODULUS_UNCERTAINTY * biaxialModulus,
    },
  });
  const radius = values.diameter / 2;
  // With k = 2 this gives the 95 % interval, also where the scatter left few degrees of freedom.
  const curvatureUncertainty = film.difference.expandedUncertainty / 2;
  const { difference, curvatureChange, matched } = film;
  const { curled, understatedBy } = smallDeflection({
    before: film.before.curvature,
    after: film.after.curvature,
    radius,
    thickness: values.siliconThickness,
    orientation: values.orientation,
  });
  const [from, to] = [matched.x[0] ?? 0, matched.x.at(-1) ?? 0];
  const middle = (from + to) / 2;
  return {
    biaxialModulus,
    curvatureBefore: film.before.curvature,
    curvatureAfter: film.after.curvature,
    curvatureChange,
    curvatureUncertainty,
    bowChange: standardBow(bowFromCurvature({ curvature: curvatureChange, radius })),
    bowUncertainty: Math.abs(bowFromCurvature({ curvature: curvatureUncertainty, radius })),
    curled: curled ? rolled(film, radius) : null,
    understatedBy,
    stress: film.stress,
    stressUncertainty: film.standardUncertainty,
    budget: film.budget.map((share) => contribution(share, values)),
    rms: difference.rms,
    quartic: difference.quartic,
    steep: difference.steep || film.before.steep || film.after.steep,
    from,
    to,
    used: difference.used,
    rejected: difference.rejected.length,
    rejectedAt: difference.rejected
      .slice(0, SHOWN_POSITIONS)
      .flatMap((n) => matched.x[n] ?? [])
      .map((x) => x - middle),
    before: before.reading,
    after: after.reading,
    curve: drawnCurve(film, middle),
  };
}

/** A wafer that has rolled is told by the radius of its roll and by how far its edges lift, never by a bow. */
function rolled(film: FilmStressFromScans, radius: number): ScanResult["curled"] {
  const curvature = Math.max(Math.abs(film.before.curvature), Math.abs(film.after.curvature));
  return { rollRadius: 1 / curvature, edgeLift: bowFromCurvature({ curvature, radius, exact: true }) };
}

/** The engine's input with the words of this page, and whether its uncertainty was stated. */
function contribution(
  share: { input: string; contribution: number },
  { filmThicknessTolerance, siliconThicknessTolerance }: ScanSubject,
): ScanContribution {
  switch (share.input) {
    case "substrate thickness":
      return { ...share, input: "silicon thickness", given: siliconThicknessTolerance !== null };
    case "film thickness":
      return { ...share, given: filmThicknessTolerance !== null };
    default:
      return { ...share, given: true };
  }
}

/** Both scans, levelled, and their difference with its parabola, thinned for drawing. */
function drawnCurve({ matched, before, after, difference }: FilmStressFromScans, middle: number): ScanResult["curve"] {
  const stride = Math.max(1, Math.ceil(matched.x.length / DRAWN_POINTS));
  return Array.from({ length: Math.ceil(matched.x.length / stride) }, (_, shown) => {
    const n = shown * stride;
    const [x, pre, post] = [matched.x[n] ?? 0, matched.before[n] ?? 0, matched.after[n] ?? 0];
    return {
      x: x - middle,
      before: pre - levelHeight(before, x),
      after: post - levelHeight(after, x),
      difference: post - pre - levelHeight(difference, x),
      fitted: fittedHeight(difference, x) - levelHeight(difference, x),
    };
  });
}
