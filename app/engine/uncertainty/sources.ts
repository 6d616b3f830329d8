import { correlationMatrix, lowerTriangle, type Correlation } from "./correlation.ts";
import { checkQuantities, spreadUncertainty, type Spread, type UncertainQuantity } from "./quantity.ts";

/**
 * What is drawn for the inputs of a model, flat: each source is one independent random number that is scaled and added to the
 * best estimate of one input. An input with spread between wafers has two sources.
 */
export interface Sources {
  best: Float64Array;
  /** `everyInput` when each input has exactly one, in their order */
  normal: { input: Int32Array; scale: Float64Array; everyInput: boolean };
  /** lower triangle that correlates the normal sources, or null */
  lower: Float64Array | null;
  bounded: { input: Int32Array; halfWidth: Float64Array; triangular: Uint8Array };
}

/** Which part of the inputs' spread is drawn. */
export type Part = "common" | "between wafers";

interface Source {
  input: number;
  part: Part;
  spread: Spread;
}

/** The sources of the parts asked for; checks quantities and correlations. */
export function sourcesOf(
  quantities: readonly UncertainQuantity[],
  correlations: readonly Correlation[],
  parts: readonly Part[] = ["common", "between wafers"],
): Sources {
  checkQuantities(quantities);
  const matrix = correlationMatrix(quantities, correlations);
  const all = quantities
    .flatMap((quantity, input): Source[] => [
      { input, part: "common", spread: quantity },
      { input, part: "between wafers", spread: quantity.betweenWafers ?? { distribution: "exact" } },
    ])
    .filter(({ part, spread }) => parts.includes(part) && spreadUncertainty(spread) > 0);
  const normal = all.filter(({ spread }) => spread.distribution === "normal");
  const bounded = all.filter(({ spread }) => spread.distribution !== "normal");
  return {
    best: Float64Array.from(quantities, ({ value }) => value),
    normal: {
      input: Int32Array.from(normal, ({ input }) => input),
      scale: Float64Array.from(normal, ({ spread }) => spreadUncertainty(spread)),
      everyInput: normal.length === quantities.length && normal.every(({ input }, n) => input === n),
    },
    lower: matrix && lowerTriangle(matrixOf(normal, matrix, quantities.length), normal.length),
    bounded: {
      input: Int32Array.from(bounded, ({ input }) => input),
      halfWidth: Float64Array.from(bounded, ({ spread }) => halfWidthOf(spread)),
      triangular: Uint8Array.from(bounded, ({ spread }) => (spread.distribution === "triangular" ? 1 : 0)),
    },
  };
}

/** Only common parts are correlated; what differs between wafers is independent of everything. */
function matrixOf(sources: readonly Source[], matrix: Float64Array, size: number): Float64Array {
  return Float64Array.from({ length: sources.length ** 2 }, (_, place) => {
    const [a, b] = [sources[Math.floor(place / sources.length)], sources[place % sources.length]];
    if (!a || !b || a === b) return 1;
    return a.part === "common" && b.part === "common" ? (matrix[a.input * size + b.input] ?? 0) : 0;
  });
}

function halfWidthOf(spread: Spread): number {
  return spread.distribution === "rectangular" || spread.distribution === "triangular" ? spread.halfWidth : 0;
}

/** Deviation over the half-width of a bounded source, −1 to 1, for a uniform number: the inverse of its distribution. */
export function boundedDeviation(uniform: number, triangular: boolean): number {
  if (!triangular) return 2 * uniform - 1;
  return uniform < 0.5 ? Math.sqrt(2 * uniform) - 1 : 1 - Math.sqrt(2 - 2 * uniform);
}

/** Slopes of a figure with its inputs as slopes with the independent normal numbers behind them. */
export function normalSlopes({ normal, lower }: Sources, slopes: Float64Array): Float64Array {
  const count = normal.input.length;
  const own = Float64Array.from(normal.input, (input, n) => (slopes[input] ?? 0) * (normal.scale[n] ?? 0));
  if (!lower) return own;
  return own.map((_, column) => own.reduce((sum, value, row) => sum + value * (lower[row * count + column] ?? 0), 0));
}
