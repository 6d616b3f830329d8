import { thicknessLimits } from "#app/engine/rules/required-support.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ComparedTool } from "../comparison/limit-lines.ts";
import { readQuantity } from "../read-quantity.ts";
import { NO_LIMIT, type SweepAsked } from "./asked.ts";
import type { SweepAnswer } from "./answers.ts";
import { formatQuantity } from "#app/engine/units/format.ts";

/** A limit of the answer, SI, with its words: 'edges up 400 µm: Coat and develop track'. */
export interface SweepLimit {
  value: number;
  label: string;
  /** whose it is, in a sentence; blank for one's own */
  of: string;
}

/** A limit that may be chosen. */
export interface LimitChoice {
  key: string;
  label: string;
  limits: SweepLimit[];
}

const FLAT = "flat";
const CURL_MARGIN = "curl";

/** What limits an answer is offered: those of the tools that take the wafer, strictest first, and the site's own. */
export function limitChoices(
  answer: SweepAnswer,
  { tools, limits, diameter }: { tools: readonly ComparedTool[]; limits: SiteLimits; diameter: number },
): LimitChoice[] {
  if (answer.key === "load") {
    const { value } = limits.curlMargin;
    const label = `${answer.words(value)}: care is due from here on`;
    return [{ key: CURL_MARGIN, label, limits: [{ value, label, of: "care is due" }] }];
  }
  if (answer.rule.dimension !== "length" || answer.key === "radius") return [];
  const flat = `called flat up to ${micrometres(limits.flatWithin.value)}`;
  return [
    ...tools
      .filter(({ largestDiameter }) => largestDiameter >= diameter * (1 - 1e-9))
      .map((tool) => ({
        key: tool.id,
        label: tool.name,
        limits: toolLimits(tool, answer.signed),
        least: leastOf(tool),
      }))
      .toSorted((a, b) => a.least - b.least)
      .map(({ key, label, limits: found }) => ({ key, label, limits: found })),
    {
      key: FLAT,
      label: flat,
      limits: bothWays({ value: limits.flatWithin.value, label: flat, of: "called flat" }, answer.signed),
    },
  ];
}

const leastOf = ({ edgesUp, edgesDown }: ComparedTool) => Math.min(edgesUp ?? Infinity, edgesDown ?? Infinity);
const micrometres = (metres: number) => formatQuantity(metres, "length", { unit: "µm" });

/** Edges up with the device side up is a negative bow. */
function toolLimits({ name, edgesUp, edgesDown }: ComparedTool, signed: boolean): SweepLimit[] {
  const line = (value: number | null, lies: string, sign: 1 | -1) =>
    value === null
      ? []
      : [
          {
            value: signed ? sign * value : value,
            label: `${lies === "" ? "" : `${lies} `}${micrometres(value)}: ${name}`,
            of: lies === "" ? name : `${lies}, ${name}`,
          },
        ];
  if (!signed && edgesUp === edgesDown) return line(edgesUp, "", 1);
  return [...line(edgesUp, "edges up", -1), ...line(edgesDown, "edges down", 1)];
}

const bothWays = (limit: SweepLimit, signed: boolean): SweepLimit[] =>
  signed && limit.value !== 0 ? [{ ...limit, value: -limit.value }, limit] : [limit];

/** The limits that count: the one that was typed, else the one that was chosen, else the first that is offered. */
export function limitsAsked(
  { limit, own }: Pick<SweepAsked, "limit" | "own">,
  answer: SweepAnswer,
  choices: readonly LimitChoice[],
): { limits: SweepLimit[]; faults: { own?: string; limit?: string } } {
  if (own !== "") {
    const read = readQuantity(own, answer.rule);
    if (!read.ok) return { limits: [], faults: { own: read.message } };
    const label = `limit ${answer.words(read.value).replace(/^\+/, "")}`;
    return { limits: bothWays({ value: read.value, label, of: "" }, answer.signed), faults: {} };
  }
  if (limit === NO_LIMIT) return { limits: [], faults: {} };
  const chosen = choices.find(({ key }) => key === limit);
  // Another answer has other limits: only a tool that has gone is missed.
  if (!chosen && isUuidLike(limit) && choices.some(({ key }) => isUuidLike(key)))
    return {
      limits: [],
      faults: { limit: "No such tool takes this wafer any more. Choose another limit." },
    };
  return { limits: (chosen ?? choices[0])?.limits ?? [], faults: {} };
}

const isUuidLike = (key: string) => key.length === 36;

/** The site's thresholds of silicon for a wafer of a diameter (m), with what is due below each. */
export function supportThresholds(diameter: number, limits: SiteLimits): Pick<SweepLimit, "value" | "label">[] {
  const keys = thicknessLimits(diameter);
  if (!keys) return [];
  return [
    { value: limits.carrierBelow.value, label: "carrier below" },
    { value: limits[keys.gripper].value, label: "tape or ring below" },
    { value: limits[keys.bare].value, label: "gripper below" },
  ];
}
