import { shownWorking, type ShownWorking } from "./shown-working.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { celsius, figureText } from "./assessment-figure.ts";
import { STEP_SHAPES, type StepShape } from "./assessment-selected.ts";
import { sentenceCase } from "./assessment-steps.ts";
import { shapeText } from "./assessment-shape.ts";

/** A figure that somebody asks to see the calculation of. */
export interface FigureAsked {
  step: { number: number; title: string };
  label: string;
  value: string;
  working: ShownWorking;
}

/**
 * The figure that an address names: `finding` and `figure` by their places, or `step` and `shape`. Null when there is no such
 * figure, or none with a calculation behind it.
 */
export function figureAskedFor(result: AssessmentResult, search: URLSearchParams): FigureAsked | null {
  const finding = result.findings[placeOf(search.get("finding"))];
  if (!finding) return shapeAskedFor(result, search);
  const figure = finding.figures[placeOf(search.get("figure"))];
  const step = result.steps.find(({ number }) => number === finding.step);
  if (!figure?.working || !step) return null;
  return {
    step: { number: step.number, title: step.title },
    label: figure.label,
    value: figureText(figure),
    working: shownWorking(figure.working),
  };
}

function shapeAskedFor(result: AssessmentResult, search: URLSearchParams): FigureAsked | null {
  const step = result.steps.find(({ number }) => number === placeOf(search.get("step")));
  const shape = STEP_SHAPES.find((name) => name === search.get("shape"));
  if (!step || !shape) return null;
  const found = { loaded: step.atRoom, peak: step.atPeak, released: step.released }[shape];
  if (!found?.working) return null;
  return {
    step: { number: step.number, title: step.title },
    label: LABELS[shape](celsius(found.temperature)),
    value: sentenceCase(shapeText(found)),
    working: shownWorking(found.working),
  };
}

const LABELS: Record<StepShape, (temperature: string) => string> = {
  loaded: (temperature) => `Shape at ${temperature}, after the step`,
  peak: (temperature) => `Shape at ${temperature}`,
  released: (temperature) => `Shape at ${temperature} if nothing held it`,
};

/** A whole number of an address; −1, which is no place, for anything else. */
function placeOf(text: string | null): number {
  return text !== null && /^\d{1,6}$/.test(text) ? Number(text) : -1;
}
