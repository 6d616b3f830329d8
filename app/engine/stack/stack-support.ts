import { requiredSupport, type SupportQuestion } from "../rules/required-support.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { StackInput } from "./model.ts";
import type { StackEstimate } from "./estimate-stack.ts";
import { supportRank, type SupportClass } from "../vocabulary.ts";

/** What is needed to lift a wafer with this stack at room temperature, and why. */
export interface StackSupport {
  class: SupportClass;
  because: string;
}

const LIFTED: SupportQuestion = { kind: "move", planned: "bare", peakTemperature: ROOM_TEMPERATURE, exposures: [] };

/**
 * Support by thickness at nominal minus tolerance, raised to tape or ring where the free wafer would roll. Null when no limits
 * are set for the wafer's size.
 */
export function stackSupport({ wafer }: StackInput, { shape }: StackEstimate, limits: SiteLimits): StackSupport | null {
  const least = wafer.thickness - (wafer.thicknessTolerance ?? 0);
  const required = requiredSupport(least, wafer.diameter, LIFTED, null, limits);
  if (!required) return null;
  if (shape.regime === "curled" && supportRank(required.support) < supportRank("tape or ring"))
    return { class: "tape or ring", because: "free, it would roll about one axis" };
  return { class: required.support, because: required.because };
}
