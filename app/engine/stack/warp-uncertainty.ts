import { firstOrderUncertainty, type FirstOrderUncertainty } from "../uncertainty/first-order.ts";
import type { ScalarModel } from "../uncertainty/model.ts";
import type { UncertainQuantity } from "../uncertainty/quantity.ts";
import { estimateStack } from "./estimate-stack.ts";
import type { StackFilm, StackInput } from "./model.ts";

/** What of a stack has a tolerance. Films are counted from 1 in the stack's own order; thickness in m, stress in Pa. */
interface Varied {
  input: UncertainQuantity;
  /** the stack with another value of it */
  into(stack: StackInput, value: number): StackInput;
}

function rectangular(name: string, value: number, halfWidth: number | undefined): UncertainQuantity | null {
  return halfWidth === undefined || halfWidth === 0 ? null : { name, value, distribution: "rectangular", halfWidth };
}

const withFilm = (stack: StackInput, index: number, change: Partial<StackFilm>): StackInput => ({
  ...stack,
  films: stack.films.map((film, at) => (at === index ? { ...film, ...change } : film)),
});

function varied({ wafer, films }: StackInput): Varied[] {
  const found: Varied[] = [];
  const add = (input: UncertainQuantity | null, into: Varied["into"]) => {
    if (input) found.push({ input, into });
  };
  add(rectangular("silicon thickness", wafer.thickness, wafer.thicknessTolerance), (stack, thickness) => ({
    ...stack,
    wafer: { ...stack.wafer, thickness },
  }));
  films.forEach((film, index) => {
    add(rectangular(`thickness of film ${index + 1}`, film.thickness, film.thicknessTolerance), (stack, thickness) =>
      withFilm(stack, index, { thickness }),
    );
    add(rectangular(`stress of film ${index + 1}`, film.stress, film.stressTolerance), (stack, stress) =>
      withFilm(stack, index, { stress }),
    );
  });
  return found;
}

/** The warp of the free wafer, m, as a function of everything in the stack that has a tolerance. */
export function warpModel(stack: StackInput): { inputs: UncertainQuantity[]; model: ScalarModel } {
  const parts = varied(stack);
  return {
    inputs: parts.map(({ input }) => input),
    model: (values) =>
      estimateStack(parts.reduce((moved, { into }, n) => into(moved, values[n] ?? 0), stack)).shape.warp,
  };
}

/**
 * Uncertainty of the warp of the free wafer from the tolerances of silicon and films, each the half-width of a rectangular
 * distribution (JCGM 100:2008, 4.3.7), to first order; what has no tolerance counts as exact. Null when nothing has one.
 * @throws EngineInputError naming the input
 */
export function warpUncertainty(stack: StackInput): FirstOrderUncertainty | null {
  const { inputs, model } = warpModel(stack);
  return inputs.length === 0 ? null : firstOrderUncertainty({ model, inputs });
}
