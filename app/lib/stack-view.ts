import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { readQuantity, type ReadQuantity } from "./read-quantity.ts";

/** How a stack is looked at; in the address, so that every view can be linked. */
export interface StackView {
  /** another temperature as it was typed, blank for 25 °C alone */
  at: string;
  /** id of the stack laid over, blank for none */
  with: string;
  withFault: string | null;
}

/** The temperature of a view: null for none. */
export function viewTemperature(at: string): { temperature: number | null; read: ReadQuantity | null } {
  if (at.trim() === "") return { temperature: null, read: null };
  const read = readQuantity(at, RULES.temperature);
  const temperature = read.ok && Math.abs(read.value - ROOM_TEMPERATURE) > 0.005 ? read.value : null;
  return { temperature, read };
}
