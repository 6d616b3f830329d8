import { controlChart } from "#app/engine/profile/lot-figures/control-chart.ts";
import { referenceCheck, type ReferenceCheck } from "#app/engine/profile/tool/repeatability.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";

/** A wafer of known bow: standard bow and its standard uncertainty, m. */
export interface KnownBow {
  bow: number;
  bowUncertainty: number;
}

/** A reading of it: ISO date, standard bow, m, and why it does not count. */
export interface ReadBow {
  measuredOn: string;
  bow: number;
  setAside: string | null;
}

export interface ReferenceSentence {
  level: "clear" | "caution" | "note";
  text: string;
}

/** What readings of a wafer of known bow say of an instrument, m; every uncertainty is expanded, k = 2. */
export interface ReferenceSummary {
  /** each reading, in the order given: read less known, and whether it passes against both uncertainties */
  errors: { error: number; passes: boolean | null }[];
  /** half-width within which a reading agrees with the known bow; null without a repeatability study */
  within: number | null;
  bias: { value: number; uncertainty: number } | null;
  /** control limits of read less known; null below five readings */
  limits: { centre: number; lower: number; upper: number } | null;
  sentences: ReferenceSentence[];
}

/** Fewest readings with control limits, as `controlChart` has it. */
const FEWEST_FOR_LIMITS = 5;
const MONTH = 30 * 86_400;

const um = (value: number, uncertainty: number) =>
  formatWithUncertainty(value, uncertainty, "length", { unit: "µm", sign: true });

/** Input of the engine's check: the readings that count, or null when there is none or nothing is known of the scatter. */
export function checkInput(known: KnownBow, readings: readonly ReadBow[], toolUncertainty: number | null) {
  const counted = readings.filter(({ setAside }) => setAside === null);
  if (counted.length === 0 || toolUncertainty === null) return null;
  return {
    known: { value: known.bow, standardUncertainty: known.bowUncertainty },
    readings: counted.map(({ measuredOn, bow }) => ({ at: Date.parse(measuredOn) / 1000, value: bow })),
    toolUncertainty,
  };
}

/** Input of the control chart: read less known, oldest first. */
export function chartValues(known: KnownBow, readings: readonly ReadBow[]) {
  return readings.map(({ bow, setAside }) => ({ value: bow - known.bow, excluded: setAside }));
}

/**
 * Holds readings (oldest first) against the known bow.
 * @param toolUncertainty standard uncertainty of one reading of the bow, m; null without a repeatability study
 */
export function referenceSummary(
  known: KnownBow,
  readings: readonly ReadBow[],
  toolUncertainty: number | null,
): ReferenceSummary {
  const input = checkInput(known, readings, toolUncertainty);
  const check = input && referenceCheck(input);
  const within = toolUncertainty === null ? null : 2 * Math.hypot(toolUncertainty, known.bowUncertainty);
  const values = chartValues(known, readings);
  const counted = values.filter(({ excluded }) => excluded === null).length;
  const chart = counted < FEWEST_FOR_LIMITS ? null : controlChart(values);
  return {
    errors: values.map(({ value }) => ({ error: value, passes: within === null ? null : Math.abs(value) <= within })),
    within,
    bias: check && { value: check.bias, uncertainty: 2 * check.biasUncertainty },
    limits: chart && { centre: chart.limits.centre, lower: chart.limits.lower, upper: chart.limits.upper },
    sentences: [
      ...(check ? [biasSentence(check), driftSentence(check)] : [withoutCheck(counted)]),
      ...(chart ? signalSentences(chart.signals) : [tooFew(counted)]),
    ],
  };
}

function withoutCheck(counted: number): ReferenceSentence {
  return {
    level: "note",
    text:
      counted === 0
        ? "No reading counts yet."
        : "Without a repeatability study it cannot be said whether a difference is more than chance: measure one wafer again and again first.",
  };
}

function biasSentence({ bias, biasUncertainty, biased }: ReferenceCheck): ReferenceSentence {
  const size = `${um(bias, 2 * biasUncertainty)} (k = 2)`;
  return biased
    ? {
        level: "caution",
        text: `The instrument reads ${size} beside the known bow, further towards a ${bias > 0 ? "dome" : "bowl"}. Have it calibrated. In a difference of two scans on it the error cancels, in a single bow it does not.`,
      }
    : { level: "clear", text: `The instrument reads the known bow within its uncertainty: ${size} beside it.` };
}

function driftSentence({ drift }: ReferenceCheck): ReferenceSentence {
  if (drift === null)
    return { level: "note", text: "Three readings on different days or more show whether it drifts." };
  const rate = um(drift.perSecond * MONTH, 2 * drift.standardUncertainty * MONTH);
  return drift.told
    ? {
        level: "caution",
        text: `It drifts by ${rate} in 30 days (k = 2). Scan before and after a film close together.`,
      }
    : { level: "clear", text: `No drift can be told: ${rate} in 30 days (k = 2).` };
}

function signalSentences(signals: readonly { sentence: string }[]): ReferenceSentence[] {
  if (signals.length === 0) return [{ level: "clear", text: "Nothing on the control chart is out of the ordinary." }];
  return signals.map(({ sentence }) => ({ level: "caution", text: sentence }));
}

function tooFew(counted: number): ReferenceSentence {
  const more = FEWEST_FOR_LIMITS - counted;
  return {
    level: "note",
    text: `Control limits come with ${more === 1 ? "one more reading" : `${more} more readings`}.`,
  };
}

/** A height in micrometres with its sign. */
export const signedMicrometres = (metres: number) =>
  formatQuantity(metres, "length", { unit: "µm", decimals: 2, sign: true });
