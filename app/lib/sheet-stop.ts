import type { StepResult } from "#app/schemas/assessment-result.ts";
import { roundedLimit } from "./sheet-round.ts";
import { stepsInWords } from "./step-numbers.ts";

type Edge = "edgesUp" | "edgesDown";

/** A reading that means stop, m, and the steps at which it does. */
export interface StopReading {
  limit: number;
  steps: number[];
}

interface Judged {
  number: number;
  limit: number;
  /** largest warp that is expected there in this direction, m; 0 where that alone stops the step */
  expected: number;
}

/**
 * The readings at which to stop, tightest first. The tightest tool limit stands for the whole group as long as no step is
 * expected to lie beyond it; where one is, the tightest stands for its own steps and the next one for the rest.
 * @param before the step before the group, whose shape is the one that is loaded first
 */
export function stopReadings(steps: readonly StepResult[], edge: Edge, before: StepResult | null): StopReading[] {
  let rest = judged(steps, edge, before);
  const readings: StopReading[] = [];
  while (rest.length > 0) {
    const limit = Math.min(...rest.map((step) => step.limit));
    const expected = Math.max(...rest.map((step) => step.expected));
    const here = expected <= limit ? rest : rest.filter((step) => step.limit === limit);
    readings.push({ limit, steps: here.map(({ number }) => number) });
    rest = rest.filter((step) => !here.includes(step));
  }
  return readings;
}

function judged(steps: readonly StepResult[], edge: Edge, before: StepResult | null): Judged[] {
  return steps.flatMap((step, index) => {
    const limit = step.equipment?.[edge] ?? null;
    // Held flat, it has nothing to read.
    if (limit === null || !step.atRoom) return [];
    const previous = index === 0 ? before : (steps[index - 1] ?? null);
    const lying = [
      { shape: previous?.atRoom, turned: isTurned(previous, step) },
      { shape: step.atRoom, turned: false },
    ];
    const warps = lying.flatMap(({ shape, turned }) =>
      shape && (shape.edgesUp !== turned) === (edge === "edgesUp") ? [shape.warp] : [],
    );
    const expected = Math.max(0, ...warps);
    return [{ number: step.number, limit, expected: expected > limit ? 0 : expected }];
  });
}

/** Whether the wafer is turned over between two steps, so that what was edges up is loaded edges down. */
const isTurned = (previous: StepResult | null, { loadedFaceUp }: StepResult) =>
  previous !== null && loadedFaceUp !== undefined && loadedFaceUp !== previous.faceUp;

/** The readings in words: 'Over 400 µm edges up or down', or one line each with the steps where they differ. */
export function stopLines(steps: readonly StepResult[], before: StepResult | null): string[] {
  const up = stopReadings(steps, "edgesUp", before);
  const down = stopReadings(steps, "edgesDown", before);
  const [onlyUp, onlyDown] = [up[0], down[0]];
  if (up.length === 1 && down.length === 1 && onlyUp && onlyDown && onlyUp.limit === onlyDown.limit)
    return [`Over ${roundedLimit(onlyUp.limit)} edges up or down`];
  return [...lines(up, "edges up"), ...lines(down, "edges down")];
}

/** Where there are several, each names its steps but the last, which is for all others. */
function lines(readings: readonly StopReading[], direction: string): string[] {
  return readings.map(({ limit, steps }, index) => {
    const reading = `${roundedLimit(limit)} ${direction}`;
    if (readings.length === 1) return `Over ${reading}`;
    return index === readings.length - 1 ? `Else over ${reading}` : `Over ${reading}, ${stepsInWords(steps)}`;
  });
}
