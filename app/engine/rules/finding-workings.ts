import { chuckSurfaceStressWorking } from "../chuck/working.ts";
import { gravitySagWorking } from "../gravity/working.ts";
import { stoneyCurvatureWorking } from "../stoney/working.ts";
import { bendingStressWorking } from "../strength/working.ts";
import { bumpCoverWorking, thicknessBudgetWorking } from "../thickness-budget/working.ts";
import { warpWorking } from "./warp-working.ts";

/**
 * The derivations of the figures in findings. Rules are handed them by whoever wants them: a trial of thousands does without,
 * and so does a page that shows outcomes only and need not load them.
 */
export const FINDING_WORKINGS = {
  warp: warpWorking,
  bendingStress: bendingStressWorking,
  chuckStress: chuckSurfaceStressWorking,
  sag: gravitySagWorking,
  bumpCover: bumpCoverWorking,
  thicknessBudget: thicknessBudgetWorking,
  stoneyCurvature: stoneyCurvatureWorking,
};

export type FindingWorkings = typeof FINDING_WORKINGS;
