import { fromTolerance } from "#app/engine/measured.ts";
import { fitAzimuths } from "#app/engine/profile/azimuths.ts";
import {
  stressBudget,
  type StressBudgetInput,
  type ToolUncertainty,
} from "#app/engine/profile/stress/stress-budget.ts";
import type { Budget } from "#app/schemas/film-analysis.ts";
import { meanOf } from "./directions.ts";
import type { FilmSubject, PlacedPair } from "./pair-points.ts";

/** Degrees of freedom from which on the coverage factor is 2.00. */
const MANY = 1000;

/**
 * Input of the engine's budget for the mean of some pairs, one on each line. What the pairs have each for themselves shrinks in their
 * mean; what they share does not.
 * @param change mean change of curvature, 1/m
 */
export function budgetInput(
  pairs: readonly PlacedPair[],
  { parameters }: FilmSubject,
  { before, change, biaxialModulus }: { before: number; change: number; biaxialModulus: number },
  modulusShare: number,
): StressBudgetInput {
  const tools = pairs.map(({ tool }) => tool);
  const offset = tools.find((tool) => tool?.offset)?.offset;
  const repeatability = isStudied(pairs)
    ? {
        standardUncertainty: meanUncertainty(pairs, ({ tool }) => tool?.repeatability?.standardUncertainty ?? 0),
        degreesOfFreedom: Math.min(...tools.map((tool) => tool?.repeatability?.degreesOfFreedom ?? Infinity)),
      }
    : null;
  const tool: ToolUncertainty = {
    ...(repeatability && { repeatability }),
    ...(offset && { offset }),
  };
  return {
    before,
    after: before + change,
    filmThickness: parameters.filmThickness,
    substrateThickness: parameters.siliconThickness,
    biaxialModulus,
    fit: { standardUncertainty: meanUncertainty(pairs, ({ result }) => result.curvatureUncertainty) },
    tool,
    sameTool: pairs.every(({ sameTool }) => sameTool),
    uncertainties: {
      substrateThickness: { standardUncertainty: fromTolerance(parameters.siliconThicknessTolerance) },
      biaxialModulus: { standardUncertainty: modulusShare * biaxialModulus },
      filmThickness: { standardUncertainty: fromTolerance(parameters.filmThicknessTolerance) },
    },
  };
}

const isStudied = (pairs: readonly PlacedPair[]) => pairs.every(({ tool }) => typeof tool?.forTwo === "number");

/**
 * Standard uncertainty, 1/m, that the instruments give the curvature of the wafer in one set of scans, and its change between two; null
 * where an instrument was never studied. Widened for few repeats.
 */
export function toolOfMean(pairs: readonly PlacedPair[]): { alone: number; change: number } | null {
  if (!isStudied(pairs)) return null;
  const repeats = meanUncertainty(pairs, ({ tool }) => tool?.forTwo ?? 0);
  const offset = Math.max(...pairs.map(({ tool }) => tool?.offset?.standardUncertainty ?? 0));
  const shared = pairs.every(({ sameTool }) => sameTool) ? 0 : offset;
  return { alone: Math.hypot(repeats, offset), change: Math.SQRT2 * Math.hypot(repeats, shared) };
}

/** Standard uncertainty of the mean over the lines when each has its own, 1/m. */
function meanUncertainty(pairs: readonly PlacedPair[], of: (pair: PlacedPair) => number): number {
  const readings = pairs.map((pair) => ({
    azimuth: pair.azimuth ?? 0,
    curvature: 0,
    standardUncertainty: Math.max(of(pair), 1e-12),
  }));
  return meanOf(fitAzimuths(readings)).standardUncertainty;
}

/** The budget of the page, largest share first. */
export function budgetView(
  input: StressBudgetInput,
  pairs: readonly PlacedPair[],
  { parameters }: FilmSubject,
): Budget {
  const budget = stressBudget(input);
  const missing = new Set([
    ...(parameters.siliconThicknessTolerance === null ? ["substrate thickness"] : []),
    ...(parameters.filmThicknessTolerance === null ? ["film thickness"] : []),
  ]);
  return {
    rows: budget.lines.map(({ input: name, contribution, shared, note }) => ({
      input: name,
      contribution,
      shared,
      note,
      given: !missing.has(name),
    })),
    expandedUncertainty: budget.expandedUncertainty,
    coverageFactor: budget.coverageFactor,
    degreesOfFreedom: budget.degreesOfFreedom > MANY ? null : budget.degreesOfFreedom,
    tools: input.tool?.repeatability ? [...new Set(pairs.flatMap(({ tool }) => tool?.name ?? []))] : [],
  };
}
