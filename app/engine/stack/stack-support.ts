import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { requiredSupport, type SupportQuestion } from "../rules/required-support.ts";
import { formatQuantity } from "../units/format.ts";
import { supportRank, type SupportClass } from "../vocabulary.ts";
import { estimateStack } from "./estimate-stack.ts";
import { withThickness, type StackInput } from "./model.ts";

/** What is needed to lift a wafer with this stack, and why. */
export interface StackSupport {
  class: SupportClass;
  because: string;
}

const LIFTED: SupportQuestion = { kind: "move", planned: "bare", peakTemperature: ROOM_TEMPERATURE, exposures: [] };

/**
 * Support for lifting the wafer at 25 °C, judged at nominal minus tolerance; raised to tape or ring where the free wafer would
 * roll at that thickness, at 25 °C or at the stack's own temperature. Null when no limits are set for the wafer's size.
 * @throws EngineInputError when the tolerance leaves no silicon
 */
export function stackSupport(stack: StackInput, limits: SiteLimits): StackSupport | null {
  const { thickness, thicknessTolerance = 0, diameter } = stack.wafer;
  const least = withoutRounding(thickness - thicknessTolerance);
  if (!(least > 0))
    throw new EngineInputError("wafer.thicknessTolerance", "is as large as the silicon itself", `below ${thickness} m`);
  const required = requiredSupport(least, diameter, LIFTED, null, limits);
  if (!required) return null;
  if (supportRank(required.support) < supportRank("tape or ring")) {
    const rolls = temperatureOfRolling(withThickness(stack, least));
    if (rolls !== null) return { class: "tape or ring", because: becauseItRolls(rolls) };
  }
  return { class: required.support, because: required.because };
}

/** 252 µm minus 2 µm is 250 µm and not a hair less: 'at' a limit must not hang on the last digit of a subtraction. */
function withoutRounding(thickness: number): number {
  return Number(thickness.toPrecision(12));
}

/** The temperature at which the free wafer is rolled, K: 25 °C before the stack's own; null when at neither. */
function temperatureOfRolling(stack: StackInput): number | null {
  const asked = [ROOM_TEMPERATURE, stack.temperature ?? ROOM_TEMPERATURE];
  return asked.find((temperature) => estimateStack({ ...stack, temperature }).shape.regime === "curled") ?? null;
}

function becauseItRolls(temperature: number): string {
  if (temperature === ROOM_TEMPERATURE) return "free, it would roll about one axis";
  const at = formatQuantity(temperature, "temperature", { unit: "°C" });
  return `free at ${at}, it would roll about one axis`;
}
