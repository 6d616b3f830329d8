import { thicknessLimits } from "#app/engine/rules/required-support.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import {
  FLAT_WITHIN_UNCERTAINTY,
  flatWithinUncertainty,
  type Outcome,
  type SupportClass,
} from "#app/engine/vocabulary.ts";
import type { EstimateAnswer, EstimateRequest } from "#app/schemas/estimate.ts";
import type { WarpSpread } from "./warp-sampling.ts";

/** A request with what was answered to it. */
export interface Estimated {
  request: EstimateRequest;
  answer: EstimateAnswer;
}

type Shape = EstimateAnswer["shape"];

/** A bow, warp or lift: three digits in the unit that suits it. */
export const lengthWords = (metres: number, sign = false) =>
  formatQuantity(metres, "length", { significant: 3, trim: true, sign });

/** The warp with its expanded uncertainty, k = 2, where the tolerances given carry it: '343 ± 40 µm'. */
export function warpWords({ warp_m, warp_standard_uncertainty_m, warp_linear }: Shape): string {
  return warp_standard_uncertainty_m === null || warp_linear !== true
    ? lengthWords(warp_m)
    : formatWithUncertainty(warp_m, 2 * warp_standard_uncertainty_m, "length");
}

/** A thickness of silicon, in µm. */
export const thicknessWords = (metres: number) => formatQuantity(metres, "length", { unit: "µm" });

/** A limit in whole µm, up: it must not be undercut by its own rounding. */
const wholeMicrometres = (metres: number) => Math.ceil(metres * 1e6 - 1e-6);

/** A limit in words, rounded up. */
export const limitWords = (metres: number) => thicknessWords(wholeMicrometres(metres) * 1e-6);

/** A temperature, in °C. */
export const temperatureWords = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C" });

/** Radius of a roll: about, two digits. */
export const radiusWords = (metres: number) =>
  formatQuantity(metres, "length", { unit: metres >= 0.1 ? "m" : "mm", significant: 2 });

/**
 * How the free wafer lies with its device side up: 'flat', 'edges up 343 µm', or 'rolls up, radius about 0.44 m'. A curled wafer
 * never gets a bow.
 */
export function shapeWords(shape: Shape, flatWithin: number): string {
  const { regime, bow_m, across, warp_m, roll_radius_m, warp_standard_uncertainty_m } = shape;
  if (regime === "curled" && roll_radius_m !== null) return `rolls up, radius about ${radiusWords(roll_radius_m)}`;
  if (warp_m <= flatWithin) return "flat";
  if (flatWithinUncertainty(warp_m, warp_standard_uncertainty_m)) return FLAT_WITHIN_UNCERTAINTY;
  if (across && across.bow_m * bow_m < 0 && Math.abs(across.bow_m) > flatWithin)
    return `saddle, ${lengthWords(warp_m)}`;
  return `${bow_m < 0 ? "edges up" : "edges down"} ${lengthWords(warp_m)}`;
}

/** Level of an answer: that of its support class; what is clear by that is a caution when something calls for care. */
export function answerOutcome(estimated: Estimated, limits: SiteLimits): Outcome {
  const outcome = supportOutcome(estimated.answer.support.class);
  return outcome === "clear" && cautions(estimated, limits).length > 0 ? "caution" : outcome;
}

/** Level of a support class: what is not bare needs support, and a gripper only with caution. */
function supportOutcome(support: SupportClass | null): Outcome {
  switch (support) {
    case null:
      return "cannot judge";
    case "bare":
      return "clear";
    case "thin-wafer gripper":
      return "caution";
    case "tape or ring":
    case "carrier":
      return "needs support";
    case "none fits":
      return "do not run";
  }
}

/** At which thickness the support is judged and why it is what it is, in one sentence. */
export function becauseSentence({ request, answer }: Estimated): string {
  const { thickness_m, thickness_tolerance_m } = request.wafer;
  const because = answer.support.because;
  if (thickness_tolerance_m === undefined) return `Judged at nominal ${thicknessWords(thickness_m)}: ${because}.`;
  return `Judged at ${thicknessWords(thickness_m - thickness_tolerance_m)}, nominal minus tolerance: ${because}.`;
}

/** What calls for care although the wafer may be lifted so, one sentence each. */
export function cautions({ request, answer }: Estimated, limits: SiteLimits): string[] {
  const { regime, stability_ratio } = answer.shape;
  const from = limits.curlMargin.value;
  const found: string[] = [];
  if (request.wafer.thickness_tolerance_m === undefined)
    found.push("The silicon has no tolerance, so it is judged at nominal");
  if (regime !== "curled" && stability_ratio >= from)
    found.push(`At ${ratioWords(stability_ratio)} of the curling load; care is due from ${ratioWords(from)} on`);
  return found;
}

/** A ratio of loads, two digits. */
export const ratioWords = (ratio: number) => formatNumber(ratio, { significant: 2 });

/** Least silicon that may be lifted bare, m: the site's limit, or where it curls if that is thicker. Null without a limit. */
export function bareFrom({ request, answer }: Estimated, limits: SiteLimits): number | null {
  const keys = thicknessLimits(request.wafer.diameter_m);
  return keys && Math.max(limits[keys.bare].value, answer.curls_below_m ?? 0);
}

/** The answer in one or two plain sentences, and a third for another temperature. */
export function answerSentences(room: Estimated, hot: Estimated | null, limits: SiteLimits): string[] {
  const sentences = [bareSentence(room, limits), hereSentence(room, limits)];
  if (hot?.request.temperature_K !== undefined) {
    const at = temperatureWords(hot.request.temperature_K);
    sentences.push(`At ${at}, free, it ${liesWords(hot.answer.shape, limits.flatWithin.value)}.`);
  }
  return sentences;
}

function bareSentence(room: Estimated, limits: SiteLimits): string {
  const least = bareFrom(room, limits);
  const curls = room.answer.curls_below_m;
  if (least === null) {
    const size = formatQuantity(room.request.wafer.diameter_m, "length", { unit: "mm" });
    return `No thickness limits are set for a ${size} wafer, so its support cannot be judged.`;
  }
  const safe = `Safe to lift bare down to ${limitWords(least)}`;
  if (curls === null) return `${safe}; it does not curl.`;
  if (curls >= least) return `${safe}; free, it curls below that.`;
  return `${safe}; free, it curls below ${limitWords(curls)}.`;
}

function hereSentence({ request, answer }: Estimated, limits: SiteLimits): string {
  const lies = liesWords(answer.shape, limits.flatWithin.value);
  const here = `At ${thicknessWords(request.wafer.thickness_m)} it`;
  const support = answer.support.class;
  if (support === null || support === "bare") return `${here} ${lies}.`;
  const needs = support === "tape or ring" ? support : `a ${support}`;
  return `${here} needs ${needs}; let go, it ${lies}.`;
}

/** The shape as the end of 'it …'. */
function liesWords(shape: Shape, flatWithin: number): string {
  const words = shapeWords(shape, flatWithin);
  if (shape.regime === "curled") return words;
  return `lies ${words}`;
}

/** How far one bow is from another, in percent of the other; null where the other is as good as none. */
export function differencePercent(value: number, reference: number): number | null {
  const NONE = 1e-9;
  if (Math.abs(reference) < NONE) return null;
  return ((value - reference) / Math.abs(reference)) * 100;
}

/** How a small-bow formula compares with the free wafer: '24 % less than the edge lift'. */
export function againstFreeWafer(bow: number, shape: Shape): string {
  const what = shape.regime === "curled" ? "the edge lift" : "the free wafer";
  if (bow * shape.bow_m < 0) return `the other way than ${what}`;
  const percent = differencePercent(Math.abs(bow), Math.abs(shape.bow_m));
  if (percent === null || Math.abs(percent) < 0.05) return `as ${what}`;
  return `${percentWords(Math.abs(percent))} ${percent > 0 ? "more" : "less"} than ${what}`;
}

/** A percentage: one decimal below ten. */
export const percentWords = (percent: number) =>
  `${formatNumber(percent, { decimals: Math.abs(percent) < 10 ? 1 : 0 })}\u00A0%`;

/** What differs between this stack and another one, in one or two sentences. */
export function comparisonSentences(own: Estimated, other: Estimated & { name: string }, limits: SiteLimits): string[] {
  const flat = limits.flatWithin.value;
  const there = `At ${thicknessWords(other.request.wafer.thickness_m)} ${other.name} ${liesWords(other.answer.shape, flat)}`;
  const here = `this stack, at ${thicknessWords(own.request.wafer.thickness_m)}, ${liesWords(own.answer.shape, flat)}`;
  return [`${there}; ${here}.`, curlingComparison(own.answer.curls_below_m, other.answer.curls_below_m, other.name)];
}

function curlingComparison(own: number | null, other: number | null, name: string): string {
  if (own === null && other === null) return "Neither curls at any thickness.";
  if (own === null) return `${name} curls below ${limitWords(other ?? 0)}, this stack at no thickness.`;
  if (other === null) return `${name} does not curl, this stack does below ${limitWords(own)}.`;
  const difference = wholeMicrometres(other) - wholeMicrometres(own);
  if (difference === 0) return `Both curl below ${limitWords(own)}.`;
  const word = difference > 0 ? "thicker" : "thinner";
  const by = thicknessWords(Math.abs(difference) * 1e-6);
  return `${name} curls below ${limitWords(other)}, this stack below ${limitWords(own)}: the other limit is ${by} ${word}.`;
}

/** How the warp is spread over wafers, in sentences: mean and spread, the middle 95 %, the share beyond the limit. */
export function spreadSentences({
  draws,
  inputs,
  mean,
  standardUncertainty,
  interval,
  limit,
  beyond,
}: WarpSpread): string[] {
  const [low, high] = interval;
  const drawn = formatNumber(draws, { decimals: 0 });
  const of = inputs === 1 ? "one input that has a tolerance" : `${inputs} inputs that have a tolerance`;
  return [
    `${shareWords(beyond)} of the wafers warp by more than ${lengthWords(limit)}.`,
    `Mean ${lengthWords(mean)}, standard uncertainty ${lengthWords(standardUncertainty)}; 95 % lie between ${lengthWords(low)} and ${lengthWords(high)}.`,
    `From ${drawn} wafers drawn within ${of}; everything else counts as exact.`,
  ];
}

/** A share with the standard error that drawing leaves it: '12.3 % (± 0.2 % of drawing)'. */
function shareWords({ probability, standardError }: WarpSpread["beyond"]): string {
  if (probability === 0) return "None";
  if (probability === 1) return "All";
  const decimals = standardError >= 0.0005 ? 1 : 2;
  const percent = (share: number) => formatNumber(100 * share, { decimals });
  return `${percent(probability)} % (± ${percent(standardError)} % of drawing)`;
}
