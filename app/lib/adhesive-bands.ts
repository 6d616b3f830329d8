import { againstUpperLimit } from "#app/engine/rules/against-limit.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";

/** What the temperatures of a bonding material mean for a step between bond and debond. Kelvin. */
export interface AdhesiveTemperatures {
  softening: number | null;
  flows: boolean;
  limit: number;
  /** margin asked below the limit */
  margin: number;
}

/**
 * Temperature, K, from which a bonding material is soft for the rule on bonding materials: of a thermoplastic its flow point where
 * that is known, else the glass transition or the softening point; null when it has none in the range used.
 */
export function softensAt(
  material: Record<"softening" | "glassTransition" | "flowPoint", Measured | null>,
): number | null {
  const { softening, glassTransition, flowPoint } = material;
  return (flowPoint ?? glassTransition ?? softening)?.value ?? null;
}

/** A stretch of temperature with one outcome of the rule on bonding materials; `to` belongs to the next one but for the limit. */
export interface Band {
  from: number;
  to: number;
  outcome: Outcome;
}

/** Outcome at a peak temperature: of the limit with its margin, and of flowing, whichever is worse. */
function outcomeAt(peak: number, { softening, flows, limit, margin }: AdhesiveTemperatures, vacuum: boolean): Outcome {
  const ofLimit = againstUpperLimit(peak, limit, margin, "do not run");
  const soft = flows && softening !== null && peak >= softening;
  if (ofLimit === "do not run" || (soft && vacuum)) return "do not run";
  return soft ? "caution" : ofLimit;
}

/** The outcomes from one temperature to another, in order and joined; empty stretches are left out. */
export function adhesiveBands(
  material: AdhesiveTemperatures,
  { from, to, vacuum }: { from: number; to: number; vacuum: boolean },
): Band[] {
  const { softening, limit, margin } = material;
  const inside = [softening ?? from, limit - margin, limit].filter((point) => point > from && point < to);
  const points = [...new Set([from, ...inside, to])].toSorted((a, b) => a - b);
  const bands: Band[] = [];
  points.slice(0, -1).forEach((start, index) => {
    const end = points[index + 1] ?? to;
    const outcome = outcomeAt((start + end) / 2, material, vacuum);
    const last = bands.at(-1);
    if (last?.outcome === outcome) last.to = end;
    else bands.push({ from: start, to: end, outcome });
  });
  return bands;
}
