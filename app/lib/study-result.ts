import { repeatabilityStudy } from "#app/engine/profile/tool/repeatability.ts";
import type { StudyReading, StudyResult } from "#app/schemas/instrument.ts";

/** Fewest repeats of a study: the widening for so few is then 2.3, and a study says so. */
export const FEWEST_REPEATS = 3;

/** What stands against a study of these repeats, in a sentence; null when nothing does. */
export function studyFault(readings: readonly StudyReading[]): string | null {
  if (readings.length < FEWEST_REPEATS)
    return `${readings.length === 0 ? "No repeat is" : readings.length === 1 ? "One repeat is" : `${readings.length} repeats are`} too few: measure the wafer ${FEWEST_REPEATS} times or more, taken off and put back between.`;
  const [first] = readings;
  if (readings.every(({ curvature }) => curvature === first?.curvature))
    return "All repeats are equal to the last digit: give them with more digits, or the scans themselves.";
  return null;
}

/** What the repeats of one wafer say of their instrument, 1/m. */
export function studyResult(readings: readonly StudyReading[]): StudyResult {
  const study = repeatabilityStudy([readings.map(({ curvature }) => curvature)]);
  const [wafer] = study.wafers;
  return {
    mean: wafer?.mean ?? 0,
    standardUncertainty: study.standardUncertainty,
    degreesOfFreedom: study.degreesOfFreedom,
    forTwo: study.forTwo,
    remark: study.remark,
  };
}
