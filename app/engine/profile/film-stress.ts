import { requireModulus, requireThickness, requireWithin } from "../inputs.ts";
import { stoneyStress } from "../stoney/stoney.ts";
import { combineUncertainty, type CombinedUncertainty } from "../uncertainty/combine.ts";
import { commonPoints, type ScanPair } from "./common-points.ts";
import { fitProfile, type ProfileFit } from "./fit-profile.ts";
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

export interface FilmStressFromProfilesInput extends MonitorWafer {
  /** Scan before the film, on the same azimuth and supports as the one after it. */
  pre: readonly ProfilePoint[];
  post: readonly ProfilePoint[];
  /** m, from either end of the range that both scans cover. */
  edgeExclusion: number;
  robust?: boolean;
}

export interface FilmStressFromProfiles extends CombinedUncertainty {
  /** 1/m, positive towards a bowl seen from the film's side. */
  curvatureChange: number;
  /** Pa, tension positive. */
  stress: number;
  /** Both scans at the positions of the first one, within the range that both cover. */
  pairs: ScanPair[];
  /** Fit of the difference of the two scans. Its `rejected` counts along `pairs`. */
  difference: ProfileFit;
  /** Fit of each scan on the points that the difference kept. */
  before: ProfileFit;
  after: ProfileFit;
}

/**
 * Stress of a film from a scan before and one after it. The scan before is taken from the one after point by point, the latter
 * interpolated to the positions of the former within the range that both cover, so the wafer's own shape and most of gravity
 * drop out. Stoney's relation then gives the stress.
 *
 * Refuses, with `EngineInputError`: scans that do not overlap, fewer than 7 positions left, values that are not finite.
 */
export function filmStressFromProfiles(i: FilmStressFromProfilesInput): FilmStressFromProfiles {
  checkMonitor(i);
  const pairs = commonPoints(i.pre, i.post);
  const difference = fitProfile(
    pairs.map(({ x, before, after }) => ({ x, z: after - before })),
    { edgeExclusion: i.edgeExclusion, robust: i.robust },
  );
  const rejected = new Set(difference.rejected);
  const kept = pairs.filter((_, n) => !rejected.has(n));
  const before = fitProfile(
    kept.map(({ x, before: z }) => ({ x, z })),
    { edgeExclusion: i.edgeExclusion },
  );
  const after = fitProfile(
    kept.map(({ x, after: z }) => ({ x, z })),
    { edgeExclusion: i.edgeExclusion },
  );
  // On steep scans curvatures do not subtract like heights, so each scan's own fit counts.
  const steep = before.steep || after.steep;
  const curvatureChange = steep ? after.curvature - before.curvature : difference.curvature;
  const film = filmStressFromCurvature({
    ...i,
    curvatureChange,
    curvatureUncertainty: difference.expandedUncertainty / 2,
  });
  return { curvatureChange, pairs, difference, before, after, ...film };
}

function checkMonitor(i: MonitorWafer): void {
  requireThickness("filmThickness", i.filmThickness);
  requireThickness("substrateThickness", i.substrateThickness);
  requireModulus("biaxialModulus", i.biaxialModulus);
  for (const [name, value] of Object.entries(i.uncertainties ?? {})) {
    if (value !== undefined) requireWithin(`uncertainties.${name}`, value, 0, 1e13, "1");
  }
}
