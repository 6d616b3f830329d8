import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";
import type { Finding } from "../rules/finding.ts";
import { LIMIT_DEFINITIONS } from "../rules/limits.ts";

/** Whether a finding keeps a flow from being run and released. */
export function blocks(outcome: Outcome): boolean {
  return outcomeRank(outcome) > outcomeRank("caution");
}

/** Limits that a figure must not fall below. Of all others a figure must not be more. */
const LOWER = new Set<string>(
  (
    [
      "coverLeft",
      "trimReserve",
      "trimBelow",
      "trimAdvisedBelow",
      "reliefBelow",
      "reliefAdvisedBelow",
      "printThroughBelow",
      "carrierBelow",
      "processCarrierBelow",
      "tapeInLineFrom",
      "edgeRingFrom",
      "edgeRingLeast",
      "bareFrom150",
      "bareFrom200",
      "bareFrom300",
      "gripperFrom150",
      "gripperFrom200",
      "gripperFrom300",
    ] as const
  ).map((key) => LIMIT_DEFINITIONS[key].title),
);

/**
 * How far a finding's figure stays within its limit, as a share of the limit: 0.2 is a fifth of it to spare, below zero is beyond it.
 * Temperatures are counted from 25 °C. The figure is the last of the finding's figures of the limit's own kind whose size the
 * limit is about: the first, unless the limit is one that a later figure must not fall below. Null without a limit, and for what
 * is only said beside a clear finding.
 */
export function relativeMargin({ figures, limit, outcome }: Finding): number | null {
  if (!limit) return null;
  const lower = LOWER.has(limit.label);
  const alike = figures.filter(
    ({ unit, temperaturePoint = false }) =>
      unit === limit.unit && temperaturePoint === (limit.temperaturePoint ?? false),
  );
  const figure = lower ? alike.at(-1) : alike[0];
  if (!figure) return null;
  const zero = limit.temperaturePoint ? ROOM_TEMPERATURE : 0;
  const size = Math.abs(limit.value - zero);
  if (size === 0) return null;
  const margin = (lower ? figure.value - limit.value : limit.value - figure.value) / size;
  return outcome === "clear" && margin < 0 ? null : margin;
}
