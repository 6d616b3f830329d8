import type { StepHeat } from "#app/engine/flow/temperature-profile.ts";
import { formatQuantity } from "#app/engine/units/format.ts";

/** Time at peak in words; as it follows from a profile it is rounded. Null when it does not matter. */
export function holdWords({ holdTime, profile }: Omit<StepHeat, "peakTemperature">, unit?: string): string | null {
  if (holdTime === null) return null;
  return formatQuantity(holdTime, "time", profile ? { unit, significant: 3, trim: true } : { unit });
}

/** Which of several tools runs a step and by which recipe, 'oven 3, recipe PI-5'; null when neither is said. */
export function runWords(run: {
  machine?: string | null | undefined;
  recipe?: string | null | undefined;
}): string | null {
  return [run.machine, run.recipe && `recipe ${run.recipe}`].filter(Boolean).join(", ") || null;
}
