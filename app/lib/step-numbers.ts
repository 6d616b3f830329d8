import { runsInWords } from "#app/engine/runs-in-words.ts";

/** Step numbers, ascending, with runs joined: '7', '1 to 12', '3 and 8', '3, 8 and 10 to 12'. */
export const stepNumbers = runsInWords;

/** 'step 7', 'steps 1 to 12'. */
export function stepsInWords(numbers: readonly number[]): string {
  return `${numbers.length === 1 ? "step" : "steps"} ${stepNumbers(numbers)}`;
}
