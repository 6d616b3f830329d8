import { EngineInputError } from "../../errors.ts";
import { requireFinite, requireWithin } from "../../inputs.ts";
import { studentFactor } from "../../uncertainty/student.ts";
import { straightLine } from "./straight-line.ts";

export interface RepeatabilityStudy {
  /** of one reading, in its unit: the pooled standard deviation */
  standardUncertainty: number;
  degreesOfFreedom: number;
  /** half of Student's factor at 95.45 %: 1 for many repeats, 1.32 for 5 degrees of freedom */
  fewRepeats: number;
  /** standard uncertainty to put into a budget that is expanded with k = 2: widened where the repeats are few */
  forTwo: number;
  wafers: { mean: number; standardDeviation: number; count: number }[];
  remark: string | null;
}

/** Degrees of freedom from which on the factor is below 1.1. */
const ENOUGH = 13;

/**
 * Standard uncertainty of a tool from repeats: each list is one wafer, taken off and put back between readings, of any one
 * quantity (curvature, bow, thickness). s² pooled with the degrees of freedom n − 1 of each; what differs between the wafers drops out.
 * Source: JCGM 100:2008, 4.2.4 and annex G.3.
 * @throws EngineInputError when no wafer was read twice
 */
export function repeatabilityStudy(wafers: readonly (readonly number[])[]): RepeatabilityStudy {
  const read = wafers.map((readings, n) => {
    readings.forEach((value, k) => requireFinite(`wafers[${n}][${k}]`, value));
    const count = readings.length;
    const mean = count === 0 ? 0 : readings.reduce((sum, value) => sum + value, 0) / count;
    const squares = readings.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    return { mean, count, squares, standardDeviation: count > 1 ? Math.sqrt(squares / (count - 1)) : 0 };
  });
  const degreesOfFreedom = read.reduce((sum, { count }) => sum + Math.max(0, count - 1), 0);
  if (degreesOfFreedom === 0) throw new EngineInputError("wafers", "no wafer was read twice", "two readings or more");
  const standardUncertainty = Math.sqrt(read.reduce((sum, { squares }) => sum + squares, 0) / degreesOfFreedom);
  const fewRepeats = studentFactor(degreesOfFreedom) / 2;
  return {
    standardUncertainty,
    degreesOfFreedom,
    fewRepeats,
    forTwo: fewRepeats * standardUncertainty,
    wafers: read.map(({ mean, standardDeviation, count }) => ({ mean, standardDeviation, count })),
    remark:
      degreesOfFreedom < ENOUGH
        ? `With ${degreesOfFreedom} degrees of freedom the repeats are few: budgets take ${fewRepeats.toFixed(2)} times their scatter.`
        : null,
  };
}

export interface ReferenceCheck {
  /** mean of read less known, in the unit of the readings */
  bias: number;
  biasUncertainty: number;
  /** the bias is more than its expanded uncertainty */
  biased: boolean;
  /** change of the bias per second; null with fewer than three readings */
  drift: { perSecond: number; standardUncertainty: number; told: boolean } | null;
  /** each reading: read less known over the root sum of squares of the expanded uncertainties; beyond 1 it fails */
  readings: { at: number; error: number; ratio: number; passes: boolean }[];
}

/**
 * A tool against a wafer of known figure, over time (s). The known value's uncertainty is common to all readings.
 * Source: JCGM 100:2008; the ratio is the normalised error of interlaboratory comparisons, ISO 13528, from memory.
 * @throws EngineInputError for no reading or one out of range
 */
export function referenceCheck(i: {
  known: { value: number; standardUncertainty: number };
  readings: readonly { at: number; value: number }[];
  /** of one reading, from a repeatability study */
  toolUncertainty: number;
}): ReferenceCheck {
  const count = i.readings.length;
  if (count === 0) throw new EngineInputError("readings", "are none", "at least one");
  const tool = requireWithin("toolUncertainty", i.toolUncertainty, Number.MIN_VALUE, Number.MAX_VALUE, "1");
  const known = requireWithin("known.standardUncertainty", i.known.standardUncertainty, 0, Number.MAX_VALUE, "1");
  requireFinite("known.value", i.known.value);
  const expanded = 2 * Math.hypot(tool, known);
  const readings = i.readings.map(({ at, value }, n) => {
    const error = requireFinite(`readings[${n}].value`, value) - i.known.value;
    const ratio = Math.abs(error) / expanded;
    return { at: requireFinite(`readings[${n}].at`, at), error, ratio, passes: ratio <= 1 };
  });
  const bias = readings.reduce((sum, { error }) => sum + error, 0) / count;
  const biasUncertainty = Math.hypot(tool / Math.sqrt(count), known);
  const line = count < 3 ? null : straightLine(readings.map(({ at, error }) => ({ x: at, y: error, u: tool })));
  return {
    bias,
    biasUncertainty,
    biased: Math.abs(bias) > 2 * biasUncertainty,
    drift: line && {
      perSecond: line.slope,
      standardUncertainty: line.slopeUncertainty,
      told: Math.abs(line.slope) > 2 * line.slopeUncertainty,
    },
    readings,
  };
}
