import type { StepKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { formatBare } from "./format-measured.ts";
import type { ShownStep } from "./flow-rows.ts";

/** Words of at most twelve characters for the head of a column in a strip. */
const SHORT: Record<StepKind, string> = {
  receive: "Receive",
  measure: "Measure",
  deposit: "Deposit",
  cure: "Cure",
  anneal: "Anneal",
  pattern: "Pattern",
  plate: "Plate",
  reflow: "Reflow",
  clean: "Clean",
  "edge trim": "Edge trim",
  "laminate tape": "Tape on",
  bond: "Bond",
  grind: "Grind",
  "stress relief": "Relieve",
  polish: "Polish",
  "via reveal": "Reveal",
  "back-side film": "Back film",
  "mount on frame": "Mount",
  debond: "Debond",
  dice: "Dice",
  move: "Move",
  store: "Store",
  hold: "Hold",
};

/** The columns of a drawn plan: silicon is carried on from step to step, a carrier goes by its name. */
export function planColumns(steps: readonly ShownStep[], incoming: Measured) {
  let silicon = incoming.value;
  let carrier: string | null = null;
  return steps.map((step, index) => {
    silicon = step.siliconAfter?.value ?? silicon;
    if (step.kind === "bond" && step.carrier) carrier = step.carrier.name;
    const planned = step.planned === "carrier" && carrier ? carrier : step.planned;
    return {
      number: index + 1,
      name: step.title,
      shortName: SHORT[step.kind],
      silicon: { thickness: silicon, text: formatBare(silicon, "length", "µm") },
      temperature: { peak: step.peakTemperature, text: formatBare(step.peakTemperature, "temperature", "°C") },
      planned: step.planned === "bare" ? null : planned,
    };
  });
}
