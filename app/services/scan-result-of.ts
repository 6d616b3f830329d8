import { filmStressFromProfiles } from "#app/engine/profile/film-stress.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { bowFromCurvature, standardBow } from "#app/engine/stoney/bow.ts";
import type { ReadProfile } from "#app/lib/profile-csv.ts";
import type { ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanValues } from "#app/schemas/scan.ts";

/** Relative standard uncertainty of silicon's biaxial modulus (common practice, no source: 0.5 to 1 %). */
const MODULUS_UNCERTAINTY = 0.01;
/** Points that a plot of this width can show. */
const DRAWN_POINTS = 400;

/** Standard uncertainty of a stated interval: rectangular, JCGM 100:2008 4.3.7. */
const fromTolerance = (tolerance: number | null) => (tolerance ?? 0) / Math.sqrt(3);

/**
 * Film stress of a pair of profiles, with its uncertainty and the curves to draw.
 * @throws EngineInputError when the scans do not fit each other
 */
export function scanResult(values: ScanValues, before: ReadProfile, after: ReadProfile): ScanResult {
  const biaxialModulus = siliconBiaxialModulus(values.orientation);
  const film = filmStressFromProfiles({
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
  const { difference, curvatureChange } = film;
  return {
    curvatureChange,
    curvatureUncertainty: difference.standardUncertainty,
    bowChange: standardBow(bowFromCurvature({ curvature: curvatureChange, radius })),
    bowUncertainty: Math.abs(bowFromCurvature({ curvature: difference.standardUncertainty, radius })),
    stress: film.stress,
    stressUncertainty: film.standardUncertainty,
    budget: film.budget.map(({ input, contribution }) => ({
      input,
      share: film.stress === 0 ? 0 : Math.abs(contribution / film.stress),
    })),
    rms: difference.rms,
    quartic: difference.quartic,
    steep: difference.steep,
    used: difference.used,
    rejected: difference.rejected.length,
    before: before.reading,
    after: after.reading,
    curve: drawnCurve(before.points, after.points, curvatureChange),
  };
}

/** Both scans and their difference on the positions of the first, levelled at the middle, thinned for drawing. */
function drawnCurve(
  before: ReadProfile["points"],
  after: ReadProfile["points"],
  curvature: number,
): ScanResult["curve"] {
  const second = after.toSorted((a, b) => a.x - b.x);
  const first = before.toSorted((a, b) => a.x - b.x);
  const [low, high] = [second[0]?.x ?? 0, second.at(-1)?.x ?? 0];
  const common = first.filter(({ x }) => x >= low && x <= high);
  const stride = Math.max(1, Math.ceil(common.length / DRAWN_POINTS));
  const drawn = common.filter((_, index) => index % stride === 0);
  const middle = ((drawn[0]?.x ?? 0) + (drawn.at(-1)?.x ?? 0)) / 2;
  let next = 0;
  const raw = drawn.map(({ x, z }) => {
    while (next < second.length - 1 && (second[next]?.x ?? x) < x) next += 1;
    const [a, b] = [second[Math.max(0, next - 1)], second[next]];
    const z2 = !a || !b || a.x === b.x ? (b?.z ?? 0) : a.z + ((b.z - a.z) * (x - a.x)) / (b.x - a.x);
    return { x: x - middle, before: z, after: z2, difference: z2 - z };
  });
  const level = levelOf(raw.map(({ x, difference }) => ({ x, z: difference - (curvature * x * x) / 2 })));
  return raw.map((point) => ({
    ...point,
    fitted: level.offset + level.slope * point.x + (curvature * point.x * point.x) / 2,
  }));
}

/** Straight line through what the parabola leaves, so that the fit lies on the difference. */
function levelOf(points: { x: number; z: number }[]): { offset: number; slope: number } {
  const n = points.length || 1;
  const meanX = points.reduce((sum, { x }) => sum + x, 0) / n;
  const meanZ = points.reduce((sum, { z }) => sum + z, 0) / n;
  const spread = points.reduce((sum, { x }) => sum + (x - meanX) ** 2, 0);
  const slope = spread === 0 ? 0 : points.reduce((sum, { x, z }) => sum + (x - meanX) * (z - meanZ), 0) / spread;
  return { offset: meanZ - slope * meanX, slope };
}
