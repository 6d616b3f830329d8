import { EngineInputError } from "#app/engine/errors.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { answerValue, type SweepAnswer } from "./answers.ts";
import { sweptFigures, type SweptFigures } from "./figures.ts";

/** What a sweep finds at one place: the figures, or why the engine refuses it there. */
export type SweptPlace = { figures: SweptFigures; fault: null } | { figures: null; fault: string };

export function sweptPlace(stack: StackInput): SweptPlace {
  try {
    return { figures: sweptFigures(stack), fault: null };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    const { field, reason, allowed } = error;
    return { figures: null, fault: `${field} ${reason}${allowed ? ` (allowed: ${allowed})` : ""}` };
  }
}

/** How a place lies: '0' lies free, '1' is curled, '2' has no such answer, '3' is refused. */
export type PlaceState = "0" | "1" | "2" | "3";

export function stateOf({ figures }: SweptPlace, answer: SweepAnswer): PlaceState {
  if (!figures) return "3";
  if (answerValue(answer, figures) === null) return "2";
  return figures.load > 1 ? "1" : "0";
}
