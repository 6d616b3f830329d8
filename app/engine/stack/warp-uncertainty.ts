import { reachedWaferShape, type ReachedWaferShape } from "../plate/free-wafer-shape.ts";
import { firstOrderSpread, type FirstOrderSpread } from "../uncertainty/first-order-spread.ts";
import type { ScalarModel } from "../uncertainty/model.ts";
import type { UncertainQuantity } from "../uncertainty/quantity.ts";
import { freeDisc } from "./estimate-stack.ts";
import type { StackInput } from "./model.ts";

/** What of a stack has a tolerance. Films are counted from 1 in the stack's own order; thickness in m, stress in Pa. */
interface Varied {
  input: UncertainQuantity;
  /** writes another value of it into a copy of the stack */
  put(copy: StackInput, value: number): void;
}

function rectangular(name: string, value: number, halfWidth: number | undefined): UncertainQuantity | null {
  return halfWidth === undefined || halfWidth === 0 ? null : { name, value, distribution: "rectangular", halfWidth };
}

function varied({ wafer, films }: StackInput): Varied[] {
  const found: Varied[] = [];
  const add = (input: UncertainQuantity | null, put: Varied["put"]) => {
    if (input) found.push({ input, put });
  };
  add(rectangular("silicon thickness", wafer.thickness, wafer.thicknessTolerance), (copy, thickness) => {
    copy.wafer.thickness = thickness;
  });
  films.forEach((film, index) => {
    const setIn = (property: "thickness" | "stress") => (copy: StackInput, value: number) => {
      const copied = copy.films[index];
      if (copied) copied[property] = value;
    };
    add(rectangular(`thickness of film ${index + 1}`, film.thickness, film.thicknessTolerance), setIn("thickness"));
    add(rectangular(`stress of film ${index + 1}`, film.stress, film.stressTolerance), setIn("stress"));
  });
  return found;
}

/** A figure of the free wafer as a function of everything in the stack that has a tolerance; the warp, m, unless another is asked. */
export function warpModel(
  stack: StackInput,
  figure: (shape: ReachedWaferShape) => number = ({ warp }) => warp,
): { inputs: UncertainQuantity[]; model: ScalarModel } {
  const parts = varied(stack);
  return {
    inputs: parts.map(({ input }) => input),
    model: (values) => {
      const copy = { ...stack, wafer: { ...stack.wafer }, films: stack.films.map((film) => ({ ...film })) };
      parts.forEach(({ put }, n) => put(copy, values[n] ?? 0));
      return figure(reachedWaferShape(freeDisc(copy).disc));
    },
  };
}

/**
 * Uncertainty of the warp of the free wafer from the tolerances of silicon and films, each the half-width of a rectangular
 * distribution (JCGM 100:2008, 4.3.7), to first order; what has no tolerance counts as exact. Null when nothing has one.
 * @throws EngineInputError naming the input
 */
export function warpUncertainty(stack: StackInput): FirstOrderSpread | null {
  const { inputs, model } = warpModel(stack);
  return inputs.length === 0 ? null : firstOrderSpread(model, inputs);
}

/** The same of its bow along the axis that bends most, m. */
export function bowUncertainty(stack: StackInput): FirstOrderSpread | null {
  const { inputs, model } = warpModel(stack, ({ bowMajor }) => bowMajor);
  return inputs.length === 0 ? null : firstOrderSpread(model, inputs);
}
