import type { Holding } from "#app/engine/vocabulary.ts";
import type { StepResult } from "#app/schemas/assessment-result.ts";
import { isRolled } from "../lying-as.ts";
import { roundedRadius } from "../sheet-round.ts";

/** The one command of a step in words for hands, and why. */
export interface FloorCommand {
  command: string;
  why: string;
}

const KEEP: Record<Holding, string> = {
  bare: "May be lifted bare",
  "thin-wafer gripper": "Thin-wafer gripper only",
  "grinding tape": "Keep on the tape",
  "film frame": "Keep on the frame",
  "edge ring": "Keep in the ring",
  carrier: "Keep on the carrier",
};

const PUT: Record<Holding, string> = {
  bare: "Leaves bare",
  "thin-wafer gripper": "Goes to the thin-wafer gripper",
  "grinding tape": "Goes on tape here",
  "film frame": "Goes on the frame here",
  "edge ring": "Goes in the ring here",
  carrier: "Goes on the carrier here",
};

const WHY: Record<Holding, string> = {
  bare: "By back side and edge. Do not touch the device side.",
  "thin-wafer gripper": "Do not lift it by hand or with a plain arm.",
  "grinding tape": "Do not lift the wafer off it.",
  "film frame": "Carry it by the frame. Do not lift the wafer off it.",
  "edge ring": "Carry it by the ring. Do not lift the wafer out.",
  carrier: "Do not lift the wafer off it.",
};

/**
 * What hands do with the wafer at a step.
 * @param before the step before it, null at the first
 * @param stopped the assessment stops this step and no deviation in force lets it run
 */
export function floorCommand(step: StepResult, before: StepResult | null, stopped: boolean): FloorCommand {
  if (stopped) return { command: "Do not run this step", why: "The assessment stops it. Ask the process owner." };
  const changes = before !== null && before.planned !== step.planned;
  const command =
    step.kind === "debond" ? `Debond here: ${lowered(PUT[step.planned])}` : (changes ? PUT : KEEP)[step.planned];
  return { command, why: [WHY[step.planned], ifLetGo(step)].filter(Boolean).join(" ") };
}

const lowered = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);

/** A diced wafer is dies on tape: it has no shape of its own. */
function ifLetGo({ planned, released, kind }: StepResult): string {
  if (planned === "bare" || kind === "dice" || !isRolled(released)) return "";
  return `Let go, it rolls up to a radius of about ${roundedRadius(released.rollRadius)}.`;
}
