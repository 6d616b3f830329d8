import { requireModulus, requireThickness, requireWithin } from "../inputs.ts";
import { stoneyStress } from "../stoney/stoney.ts";
import { combineUncertainty, type CombinedUncertainty } from "../uncertainty/combine.ts";
import { columnsOf, kept, type ScanColumns } from "./columns.ts";
import { fitScan, type ProfileFit } from "./fit-scan.ts";
import { interpolationError, matchScans, type MatchedScans } from "./match-scans.ts";
import type { ProfilePoint } from "./points.ts";

/** Standard uncertainties of the inputs that are not scanned, in their own units. Default 0 each. */
export interface FilmStressUncertainties {
  /** m */
  filmThickness?: number;
  /** m */
  substrateThickness?: number;
  /** Pa */
  biaxialModulus?: number;
}

export interface MonitorWafer {
  /** m */
  filmThickness: number;
  /** m */
  substrateThickness: number;
  /** Pa */
  biaxialModulus: number;
  uncertainties?: FilmStressUncertainties;
}

/**
 * Film stress, Pa, from a change of curvature (1/m) with its standard uncertainty, and the share of each input.
 * (u_σ/σ)² = (u_Δκ/Δκ)² + (u_M/M)² + 4 (u_h/h)² + (u_hf/h_f)², the inputs being independent.
 * Source: Stoney's relation; JCGM 100:2008, 5.1.2, equation (10).
 */
export function filmStressFromCurvature(
  i: MonitorWafer & { curvatureChange: number; curvatureUncertainty: number },
): { stress: number } & CombinedUncertainty {
  const stress = stoneyStress(i);
  const { filmThickness = 0, substrateThickness = 0, biaxialModulus = 0 } = i.uncertainties ?? {};
  const combined = combineUncertainty([
    {
      input: "curvature change",
      sensitivity: stoneyStress({ ...i, curvatureChange: 1 }),
      standardUncertainty: i.curvatureUncertainty,
    },
    { input: "biaxial modulus", sensitivity: stress / i.biaxialModulus, standardUncertainty: biaxialModulus },
    {
      input: "substrate thickness",
      sensitivity: (2 * stress) / i.substrateThickness,
      standardUncertainty: substrateThickness,
    },
    { input: "film thickness", sensitivity: -stress / i.filmThickness, standardUncertainty: filmThickness },
  ]);
  return { stress, ...combined };
}

export interface FilmStressFromScansInput extends MonitorWafer {
  /** Scan before the film, on the same azimuth and supports as the one after it. */
  pre: ScanColumns;
  post: ScanColumns;
  /** m, from either end of the range that both scans cover. */
  edgeExclusion: number;
  robust?: boolean;
}

/** The same with the scans as lists of points. */
export interface FilmStressFromProfilesInput extends Omit<FilmStressFromScansInput, "pre" | "post"> {
  pre: readonly ProfilePoint[];
  post: readonly ProfilePoint[];
}

export interface FilmStressFromScans extends CombinedUncertainty {
  /** 1/m, positive towards a bowl seen from the film's side. */
  curvatureChange: number;
  /** Pa, tension positive. */
  stress: number;
  /** Both scans at the positions of the first one, within the range that both cover. */
  matched: MatchedScans;
  /** Most that the interpolation may be off in height, m. */
  interpolationError: number;
  /** Fit of the difference of the two scans. Its `rejected` counts along `matched`. */
  difference: ProfileFit;
  /** Fit of each scan on the points that the difference kept. */
  before: ProfileFit;
  after: ProfileFit;
}

/**
 * Stress of a film from a scan before and one after it: post less pre. The scan before is taken from the one after point by point,
 * the latter interpolated to the positions of the former within the range that both cover (`matchScans`), so the wafer's own shape
 * and most of gravity drop out. Both are given device side up, x along the same azimuth, z upwards (`faceUpScan` turns others).
 * Stoney's relation then gives the stress. The uncertainty has half of the fit's expanded uncertainty in it.
 *
 * @throws EngineInputError for scans that do not overlap, fewer than 7 positions left, values that are not finite
 */
export function filmStressFromScans(i: FilmStressFromScansInput): FilmStressFromScans {
  checkMonitor(i);
  const matched = matchScans(i.pre, i.post);
  const change = new Float64Array(matched.x.length);
  for (let n = 0; n < change.length; n += 1) change[n] = (matched.after[n] ?? 0) - (matched.before[n] ?? 0);
  const difference = fitScan({ x: matched.x, z: change }, i);
  const kept = without(matched, difference.rejected);
  const alone = { edgeExclusion: i.edgeExclusion };
  const before = fitScan({ x: kept.x, z: kept.before }, alone);
  const after = fitScan({ x: kept.x, z: kept.after }, alone);
  // On steep scans curvatures do not subtract like heights, so each scan's own fit counts.
  const steep = before.steep || after.steep;
  const curvatureChange = steep ? after.curvature - before.curvature : difference.curvature;
  const film = filmStressFromCurvature({
    ...i,
    curvatureChange,
    curvatureUncertainty: difference.expandedUncertainty / 2,
  });
  const missed = interpolationError(matched.widestSpacing, after.curvature);
  return { curvatureChange, matched, interpolationError: missed, difference, before, after, ...film };
}

/** `filmStressFromScans` of two lists of points. */
export function filmStressFromProfiles(i: FilmStressFromProfilesInput): FilmStressFromScans {
  return filmStressFromScans({ ...i, pre: columnsOf(i.pre), post: columnsOf(i.post) });
}

function without(matched: MatchedScans, rejected: readonly number[]): MatchedScans {
  if (rejected.length === 0) return matched;
  const keep = new Uint8Array(matched.x.length).fill(1);
  for (const n of rejected) keep[n] = 0;
  return { ...matched, x: kept(matched.x, keep), before: kept(matched.before, keep), after: kept(matched.after, keep) };
}

function checkMonitor(i: MonitorWafer): void {
  requireThickness("filmThickness", i.filmThickness);
  requireThickness("substrateThickness", i.substrateThickness);
  requireModulus("biaxialModulus", i.biaxialModulus);
  for (const [name, value] of Object.entries(i.uncertainties ?? {})) {
    if (value !== undefined) requireWithin(`uncertainties.${name}`, value, 0, 1e13, "1");
  }
}
