/** A step that is stopped: by which revision it has its number, and what it is called. */
export interface StoppedStep {
  revision: string;
  step: number;
  title: string;
}

/**
 * Whether a stop concerns a step of a revision. In the revision that it was made in it is that number; in another one of the same sheet
 * the step of the same title, since numbers move, or, where none is called so, that number.
 */
export function concernsStep(
  stop: StoppedStep,
  revision: string,
  step: { number: number; title: string },
  all: readonly { title: string }[],
): boolean {
  if (stop.revision === revision) return stop.step === step.number;
  if (all.some(({ title }) => title === stop.title)) return step.title === stop.title;
  return step.number === stop.step;
}
