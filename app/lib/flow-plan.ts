import type { Measured } from "#app/engine/measured.ts";
import { formatBare } from "./format-measured.ts";
import { BOTH_CARRIERS, carriersAlong, type ShownStep } from "./flow-rows.ts";
import { SHORT_STEP_NAMES } from "./step-names.ts";

/** The columns of a drawn plan: silicon is carried on from step to step, carriers go by their names. */
export function planColumns(steps: readonly ShownStep[], incoming: Measured) {
  let silicon = incoming.value;
  const carriers = carriersAlong(steps);
  return steps.map((step, index) => {
    silicon = step.siliconAfter?.value ?? silicon;
    const [carrier, other] = carriers[index] ?? [];
    const named = other ? BOTH_CARRIERS : carrier?.name;
    const planned = (step.planned === "carrier" && named) || step.planned;
    return {
      number: index + 1,
      name: step.title,
      shortName: SHORT_STEP_NAMES[step.kind],
      silicon: { thickness: silicon, text: formatBare(silicon, "length", "µm") },
      temperature: { peak: step.peakTemperature, text: formatBare(step.peakTemperature, "temperature", "°C") },
      planned: step.planned === "bare" ? null : planned,
    };
  });
}
