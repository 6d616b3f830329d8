import type { StepKind } from "#app/engine/flow/model.ts";
import type { LimitKey } from "#app/engine/rules/limits.ts";
import { againstUpperLimit } from "#app/engine/rules/against-limit.ts";
import type { Holding } from "#app/engine/vocabulary.ts";

/** A step that was begun or done, as far as clocks follow it. */
export interface ClockMove {
  kind: "started" | "done";
  stepKind: StepKind;
  planned: Holding;
  /** ISO */
  at: string;
}

/** A clock that runs: since when, and the time that it has. */
export interface Clock {
  name: string;
  /** ISO */
  since: string;
  /** red line, s after its beginning */
  limit: number;
  /** a caution comes so long before it, s */
  margin: number;
}

/** What keeps the red lines: the site's limits, by their keys. */
export type ClockLimits = Record<LimitKey, { value: number }>;

const RELIEVES: StepKind[] = ["stress relief", "polish", "via reveal"];
const onTape = (holding: Holding) => holding === "grinding tape" || holding === "film frame";
const PUTS_ON: StepKind[] = ["laminate tape", "mount on frame"];

/** From the end of one step to the beginning of another, as rule 17 counts them. */
const SPANS: { name: string; from: StepKind; ends: StepKind[]; limit: LimitKey }[] = [
  { name: "Since grind, until stress relief", from: "grind", ends: RELIEVES, limit: "reliefWithin" },
  { name: "Since bond, until grind", from: "bond", ends: ["grind", "debond"], limit: "grindWithin" },
  { name: "Since debond, until clean", from: "debond", ends: ["clean"], limit: "cleanWithin" },
];

/**
 * The clocks of a lot that run now, by what was said of its steps, earliest first.
 * @param ahead kinds of step that the lot still has to go through: a span without its end in the flow has no clock
 * @param tape red line of the tape in use, s, where it has one of its own
 */
export function runningClocks(
  moves: readonly ClockMove[],
  ahead: readonly StepKind[],
  limits: ClockLimits,
  tape: number | null,
): Clock[] {
  const share = limits.clockMargin.value;
  const clocks: Clock[] = [];
  for (const { name, from, ends, limit } of SPANS) {
    if (!ends.some((kind) => ahead.includes(kind))) continue;
    const begun = moves.findLastIndex((move) => move.kind === "done" && move.stepKind === from);
    const since = moves[begun];
    if (!since || moves.slice(begun + 1).some(({ stepKind }) => ends.includes(stepKind))) continue;
    const { value } = limits[limit];
    clocks.push({ name, since: since.at, limit: value, margin: value * share });
  }
  const put = moves.findLastIndex((move) => move.kind === "done" && PUTS_ON.includes(move.stepKind));
  const since = moves[put];
  const off = moves.slice(put + 1).some((move) => move.kind === "done" && !onTape(move.planned));
  if (since && onTape(since.planned) && !off) {
    const limit = tape === null ? limits.tapeWithin.value : Math.min(tape, limits.tapeWithin.value);
    clocks.push({ name: "On tape", since: since.at, limit, margin: limit * share });
  }
  return clocks.toSorted((a, b) => a.since.localeCompare(b.since));
}

/** A clock as it stands. Times in s. */
export interface ClockState {
  passed: number;
  /** to its red line; below zero beyond it */
  left: number;
  level: "clear" | "caution" | "do not run";
}

/** How a clock stands at a time. At its red line it passes with a caution, beyond it does not. */
export function clockState({ since, limit, margin }: Clock, now: Date): ClockState {
  const passed = Math.max(0, (now.getTime() - Date.parse(since)) / 1000);
  const outcome = againstUpperLimit(passed, limit, margin, "do not run");
  return { passed, left: limit - passed, level: outcome === "clear" || outcome === "caution" ? outcome : "do not run" };
}
