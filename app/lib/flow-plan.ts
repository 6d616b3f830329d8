import type { Measured } from "#app/engine/measured.ts";
import { formatBare } from "./format-measured.ts";
import type { ShownStep } from "./flow-rows.ts";
import { BOTH_CARRIERS, planAlong, type OnCarrier } from "./plan-along.ts";
import { SHORT_STEP_NAMES } from "./step-names.ts";

/** The columns of a drawn plan: silicon is carried on from step to step, the thinnest that takes the step; carriers go by their names. */
export function planColumns(steps: readonly ShownStep[], incoming: Measured) {
  const along = planAlong(steps, incoming);
  return steps.map((step, index) => {
    const { silicon = [], after = [] } = along[index] ?? {};
    const thickness = Math.min(...silicon.map(({ value }) => value));
    const planned = (step.planned === "carrier" && carrierName(after)) || step.planned;
    return {
      number: index + 1,
      name: step.title,
      shortName: SHORT_STEP_NAMES[step.kind],
      silicon: { thickness, text: formatBare(thickness, "length", "µm") },
      temperature: {
        peak: step.peakTemperature,
        text: formatBare(step.peakTemperature, "temperature", "°C"),
      },
      planned: step.planned === "bare" ? null : planned,
    };
  });
}

/** Name of what holds the wafer, where there is room for one; null where wafers of several slots are held unlike. */
function carrierName([on = [], ...others]: readonly OnCarrier[][]): string | null {
  if (others.length > 0) return null;
  const [carrier, other] = on;
  return other ? BOTH_CARRIERS : (carrier?.name ?? null);
}
