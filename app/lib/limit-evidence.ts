import type { LimitKey, SiteLimits } from "#app/engine/rules/limits.ts";
import type { SupportClass } from "#app/engine/vocabulary.ts";
import { rateRow, type RateRow, type StepPassed } from "./incident-rates.ts";

/** Limits of thickness that say how a wafer of one diameter may be held, which is what breakage can speak to. */
const THICKNESS_LIMITS: readonly { key: LimitKey; diameter: number; support: SupportClass }[] = [
  { key: "bareFrom150", diameter: 0.15, support: "bare" },
  { key: "bareFrom200", diameter: 0.2, support: "bare" },
  { key: "bareFrom300", diameter: 0.3, support: "bare" },
  { key: "gripperFrom150", diameter: 0.15, support: "thin-wafer gripper" },
  { key: "gripperFrom200", diameter: 0.2, support: "thin-wafer gripper" },
  { key: "gripperFrom300", diameter: 0.3, support: "thin-wafer gripper" },
];

/** What is known of wafers on both sides of a limit. */
export interface LimitEvidence {
  key: LimitKey;
  /** m */
  limit: number;
  /** held so, from the limit on and below it */
  from: RateRow;
  below: RateRow;
  speaks: "for it" | "against it" | "too low" | "too few to say";
}

/**
 * What breakage says of the site's limits of thickness, those alone of which anything is known. It speaks for a limit where below it more
 * wafers break than from it on, against it where fewer do; and a limit is too low where from it on more break than of all passes. More is
 * said only where the two intervals do not meet.
 * @param passed with the diameter of each wafer, m
 */
export function limitEvidence(
  passed: readonly (StepPassed & { diameter: number })[],
  limits: SiteLimits,
  all: Pick<RateRow, "rate">,
): LimitEvidence[] {
  return THICKNESS_LIMITS.flatMap(({ key, diameter, support }) => {
    const held = passed.filter((each) => each.support === support && Math.abs(each.diameter - diameter) < 1e-3);
    if (held.length === 0) return [];
    const limit = limits[key].value;
    const from = rateRow(
      "from it on",
      held.filter(({ silicon }) => silicon >= limit),
    );
    const below = rateRow(
      "below it",
      held.filter(({ silicon }) => silicon < limit),
    );
    return [{ key, limit, from, below, speaks: speaks(from, below, all) }];
  });
}

function speaks(from: RateRow, below: RateRow, all: Pick<RateRow, "rate">): LimitEvidence["speaks"] {
  if (from.rate && all.rate && from.rate.low > all.rate.high) return "too low";
  if (!from.rate || !below.rate) return "too few to say";
  if (below.rate.low > from.rate.high) return "for it";
  return below.rate.high < from.rate.low ? "against it" : "too few to say";
}
