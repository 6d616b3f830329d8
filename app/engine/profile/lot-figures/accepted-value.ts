import { EngineInputError } from "../../errors.ts";
import { requireFinite, requireWithin } from "../../inputs.ts";
import { studentFactor } from "../../uncertainty/student.ts";

/** One measured value that may be accepted. */
export interface AcceptedReading {
  value: number;
  /** its own standard uncertainty without the common part */
  standardUncertainty: number;
  /** why it does not count; it stays in the record */
  excluded?: string | null;
}

export interface AcceptedValue {
  mean: number;
  /** standard deviation of one film about the mean; of a single value its own uncertainty */
  spread: number;
  count: number;
  /** of the mean, with the common part */
  meanUncertainty: number;
  /** of the next film: spread, mean and common part together, widened for few values so that k = 2 holds 95 % */
  standardUncertainty: number;
  /** half-width of an interval with that standard uncertainty, as the library keeps it: √3 of it */
  tolerance: number;
  /** chi-square of the values about their mean with their own uncertainties, over its degrees of freedom; null for one value */
  agreement: number | null;
  remark: string | null;
}

/** Values from which on the factor for few is below 1.1. */
const ENOUGH = 14;
/** Ratio from which the films differ by more than their measurement. */
const MORE_THAN_MEASURED = 2;

/**
 * The value in use of a film from the measured ones that were accepted: their mean with the spread from film to film. What is common to
 * all (calibration, modulus, thickness of one tool), `common`, does not shrink with their number. A single value keeps its own
 * uncertainty. Excluded values take no part and stay where they are, so that this can be undone.
 * @throws EngineInputError when none counts or one is out of range
 * Source: JCGM 100:2008, 4.2 and annex G.3.
 */
export function acceptedValue(readings: readonly AcceptedReading[], common = 0): AcceptedValue {
  requireWithin("common", common, 0, Number.MAX_VALUE, "1");
  const counted = readings.filter(({ excluded }) => !excluded);
  const count = counted.length;
  if (count === 0) throw new EngineInputError("readings", "none counts", "at least one");
  counted.forEach(({ value, standardUncertainty }, n) => {
    requireFinite(`readings[${n}].value`, value);
    requireWithin(`readings[${n}].standardUncertainty`, standardUncertainty, 0, Number.MAX_VALUE, "1");
  });
  const mean = counted.reduce((sum, { value }) => sum + value, 0) / count;
  const squares = counted.reduce((sum, { value }) => sum + (value - mean) ** 2, 0);
  const own = counted.reduce((sum, { standardUncertainty }) => sum + standardUncertainty ** 2, 0) / count;
  const spread = count > 1 ? Math.sqrt(squares / (count - 1)) : Math.sqrt(own);
  const few = count > 1 ? studentFactor(count - 1) / 2 : 1;
  const next = count > 1 ? few * spread * Math.sqrt(1 + 1 / count) : spread;
  const standardUncertainty = Math.hypot(next, common);
  const agreement = count > 1 && own > 0 ? squares / (count - 1) / own : null;
  return {
    mean,
    spread,
    count,
    meanUncertainty: Math.hypot((few * spread) / Math.sqrt(count), common),
    standardUncertainty,
    tolerance: Math.sqrt(3) * standardUncertainty,
    agreement,
    remark: remarkOf(count, few, agreement),
  };
}

function remarkOf(count: number, few: number, agreement: number | null): string | null {
  if (count === 1) return "One value: how films differ from each other is not known.";
  if (count < ENOUGH) return `${count} values are few: their spread counts ${few.toFixed(2)} times.`;
  if (agreement !== null && agreement > MORE_THAN_MEASURED)
    return "The films differ by more than their measurement: the process moves.";
  return null;
}
