/** An entry as far as it moves a lot: a step begun or done, in the order in which they came in. */
export interface Move {
  kind: "started" | "done";
  step: number;
}

/** Where a lot is in its flow. Steps by their number. */
export interface LotProgress {
  /** begun and not done */
  underWay: number | null;
  /** what is next, or under way; null when the last step is done */
  here: number | null;
  done: number[];
  /** steps before `here` that nobody said were done */
  missing: number[];
}

/**
 * Where a lot is, by what was said on the floor. A step that was done may be begun again, for rework; then the lot is there until it is
 * done again.
 * @param steps numbers of the steps of the lot's part of the flow, in their order
 * @param fromStep the step at which the lot came onto this sheet; what lies before it was done elsewhere
 */
export function lotProgress(steps: readonly number[], fromStep: number, moves: readonly Move[]): LotProgress {
  const done = new Set<number>();
  let underWay: number | null = null;
  for (const { kind, step } of moves) {
    if (kind === "started") {
      underWay = step;
      done.delete(step);
    } else {
      done.add(step);
      if (underWay === step) underWay = null;
    }
  }
  const furthest = Math.max(fromStep - 1, ...done);
  const here = underWay ?? steps.find((step) => step > furthest) ?? null;
  return {
    underWay,
    here,
    done: steps.filter((step) => done.has(step)),
    missing: steps.filter((step) => step >= fromStep && step < (here ?? Infinity) && !done.has(step)),
  };
}
