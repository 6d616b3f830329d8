import type { FlowInput } from "#app/engine/flow/model.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { FlowChange } from "#app/engine/trial/change.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { WindowInput } from "#app/schemas/process-window.ts";
import type { QuantityRule } from "./read-quantity.ts";

/** An input of a window with what the engine and its fields need. */
export interface WindowChoice {
  key: string;
  label: string;
  /** SI */
  value: number;
  rule: QuantityRule;
  unit: string;
  /** from SI to the unit of the axis */
  toUnit: (value: number) => number;
  change: (value: number) => FlowChange;
}

const micrometres = { unit: "µm", toUnit: (value: number) => value * 1e6 };
const degrees = { unit: "°C", toUnit: (value: number) => value - 273.15 };
const megapascals = { unit: "MPa", toUnit: (value: number) => value / 1e6 };

/** Every quantity of a flow that a window can be drawn over, in the order of the steps. */
export function windowChoices(flow: Pick<FlowInput, "steps">): WindowChoice[] {
  return flow.steps.flatMap((step, index): WindowChoice[] => {
    const number = index + 1;
    const found: WindowChoice[] = [];
    const place = `step ${number}, ${step.title}`;
    for (const [
      film,
      {
        film: { name },
        thickness,
        stress,
      },
    ] of step.adds.entries()) {
      if (step.kind === "receive") continue;
      found.push(
        {
          key: `film thickness ${number} ${film}`,
          label: `${name}, thickness: ${place}`,
          value: thickness.value,
          rule: RULES.filmThickness,
          ...micrometres,
          change: (value) => ({ quantity: "film thickness", step: number, film, value }),
        },
        {
          key: `film stress ${number} ${film}`,
          label: `${name}, stress: ${place}`,
          value: stress.value,
          rule: RULES.stress,
          ...megapascals,
          change: (value) => ({ quantity: "film stress", step: number, film, value }),
        },
      );
    }
    if (step.bond)
      found.push({
        key: `bond thickness ${number}`,
        label: `Bond thickness: ${place}`,
        value: step.bond.thickness.value,
        rule: RULES.bondThickness,
        ...micrometres,
        change: (value) => ({ quantity: "bond thickness", step: number, value }),
      });
    if (step.siliconAfter)
      found.push({
        key: `silicon after ${number}`,
        label: `Silicon left: ${place}`,
        value: step.siliconAfter.value,
        rule: RULES.siliconThickness,
        ...micrometres,
        change: (value) => ({ quantity: "silicon after", step: number, value }),
      });
    if (step.peakTemperature > ROOM_TEMPERATURE)
      found.push({
        key: `peak temperature ${number}`,
        label: `Peak temperature: ${place}`,
        value: step.peakTemperature,
        rule: RULES.temperature,
        ...degrees,
        change: (value) => ({ quantity: "peak temperature", step: number, value }),
      });
    return found;
  });
}

/** An SI value of a choice as text with the unit of its axis. */
export function choiceText({ rule, unit }: WindowChoice, value: number): string {
  return formatQuantity(value, rule.dimension as Dimension, { unit, significant: 4, trim: true });
}

/** A range about what is planned: half of it to half as much again, temperatures 40 K either way. */
export function usualRange(choice: WindowChoice): { from: number; to: number } {
  const { value, unit } = choice;
  if (unit === "°C") return { from: Math.max(ROOM_TEMPERATURE, value - 40), to: value + 40 };
  return value === 0 ? { from: -50e6, to: 50e6 } : { from: value * 0.5, to: value * 1.5 };
}

/** A choice as its page offers it. */
export function windowInput(choice: WindowChoice): WindowInput {
  const { key, label, value, unit, toUnit } = choice;
  return { key, label, unit, value: toUnit(value), planned: choiceText(choice, value) };
}
