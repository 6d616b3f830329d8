import { EngineInputError } from "../../errors.ts";
import { notHeights, radiusForDiameter, tiltRemoved, wrongDecade } from "./columns-of-the-file.ts";
import { cannotTell, type Found, type Mistake, type MistakeFinding } from "./mistake.ts";
import { azimuthOff, faceDown, swapped } from "./order-and-side.ts";
import { dayAndMonth, hiddenSaddle, notchInScan, otherFilmThickness, slotsReversed, soonAfterCure } from "./records.ts";
import type { ScanChecks } from "./scan-checks.ts";
import { mixedConstants, nominalThickness, otherDiametersThickness } from "./wafer-and-modulus.ts";

/** Every check for a mistake, by number. */
export const MISTAKES: readonly Mistake[] = [
  swapped,
  faceDown,
  azimuthOff,
  nominalThickness,
  otherDiametersThickness,
  mixedConstants,
  notHeights,
  tiltRemoved,
  radiusForDiameter,
  wrongDecade,
  hiddenSaddle,
  soonAfterCure,
  otherFilmThickness,
  dayAndMonth,
  slotsReversed,
  notchInScan,
];

/**
 * What each check finds in scans, their records and what was expected of them. Each says 'seen', 'not seen' or 'cannot tell' by
 * itself; on 1,000 honest scans none was seen more often than its stated rate (tested).
 * Scans that cannot be fitted make a check say 'cannot tell' with the reason.
 * Source: own derivation ('scan-mistakes').
 */
export function findMistakes(checks: ScanChecks): MistakeFinding[] {
  return MISTAKES.map((mistake) => judged(mistake, checks));
}

/** One check alone. */
export function judged(mistake: Mistake, checks: ScanChecks): MistakeFinding {
  const found = tried(mistake, checks);
  return {
    number: mistake.number,
    name: mistake.name,
    ...found,
    remedy: found.state === "seen" ? mistake.remedy : null,
  };
}

function tried(mistake: Mistake, checks: ScanChecks): Found {
  try {
    return mistake.judge(checks);
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return cannotTell("the scans", `The scans cannot be read so far: ${error.message}.`);
  }
}
