import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { runsOf } from "./runs-of.ts";
import { OUTCOME_SIGNS, SUPPORT_SIGNS, type HatchLevel } from "./severity.ts";
import { textWidth } from "./text-width.ts";

/** One hatched stretch of a support bar with its word. Indices of steps; `to` is the one after the last. */
export interface SupportSegment {
  word: string;
  level: HatchLevel;
  from: number;
  to: number;
  /** where the word may stand; null when every column is taken by a blocked step */
  wordAt: { from: number; to: number } | null;
  /** a single step that must not run or cannot be judged, drawn over the others */
  blocked: boolean;
}

/** Stretches of steps with the same need, then the steps that must not run or cannot be judged. */
export function supportSegments(required: readonly SupportClass[], outcomes: readonly Outcome[]): SupportSegment[] {
  const blocked = outcomes.flatMap((outcome, index) =>
    outcome === "do not run" || outcome === "cannot judge" ? [{ outcome, index }] : [],
  );
  const taken = new Set(blocked.map(({ index }) => index));
  return [
    ...runsOf(required).map(({ value, from, to }) => ({
      ...SUPPORT_SIGNS[value],
      from,
      to,
      wordAt: firstFreeStretch(from, to, taken),
      blocked: false,
    })),
    ...blocked.map(({ outcome, index }) => {
      const own = { from: index, to: index + 1 };
      return { ...OUTCOME_SIGNS[outcome], ...own, wordAt: own, blocked: true };
    }),
  ];
}

/** The word stands at the segment's start, or after the first blocked columns that would cover it. */
function firstFreeStretch(start: number, end: number, taken: ReadonlySet<number>): SupportSegment["wordAt"] {
  let from = start;
  while (from < end && taken.has(from)) from += 1;
  let to = from;
  while (to < end && !taken.has(to)) to += 1;
  return to > from ? { from, to } : null;
}

/** How a word may be broken or shortened when its segment is narrow, widest first. */
const SHORTER_WORDS: Readonly<Record<string, readonly (readonly string[])[]>> = {
  "Thin-wafer gripper": [["Thin-wafer gripper"], ["Thin-wafer", "gripper"], ["Gripper"]],
  "Tape or ring": [["Tape or ring"], ["Tape or", "ring"]],
  "None fits": [["None fits"], ["None", "fits"]],
  "Cannot judge": [["Cannot judge"], ["Cannot", "judge"]],
  "Do not run": [["Do not run"], ["Do not", "run"]],
};

/** Width of the longest of some semibold lines, px. */
export function linesWidth(lines: readonly string[], size: number): number {
  return Math.max(...lines.map((line) => textWidth(line, size, true)));
}

/** The lines in which a word stands on a segment: the widest way that fits, or the narrowest, which then does not. */
export function wordLines(word: string, width: number, size: number): { lines: readonly string[]; fits: boolean } {
  const choices = SHORTER_WORDS[word] ?? [[word]];
  const fitting = choices.find((lines) => linesWidth(lines, size) + 8 <= width);
  return { lines: fitting ?? choices.at(-1) ?? [word], fits: fitting !== undefined };
}
