import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { runsInWords } from "../runs-in-words.ts";
import type { FlowInput, StepInput } from "./model.ts";
import { heatDuration } from "./temperature-profile.ts";

/** Slots of a cassette, from 1. */
export const SLOTS = 25;

/** Into how many legs the slots of a lot may part. */
export const MOST_LEGS = 6;

const EVERY_SLOT = Array.from({ length: SLOTS }, (_, index) => index + 1);

/**
 * The flow once for each leg: the classes of slots that take the same steps, by their first slot. A leg has all the steps of the
 * flow, so that a step keeps its number; those of other slots are marked `skipped`. A flow whose steps are all for all slots, or
 * one that is a leg already, comes back as it is.
 * @throws EngineInputError for a slot that is none, slots out of order, and more than six legs
 */
export function legFlows(flow: FlowInput): FlowInput[] {
  if (flow.leg || !hasLegs(flow)) return [flow];
  flow.steps.forEach(checkSlots);
  const legs = legsOfSteps(flow.steps);
  if (legs.length > MOST_LEGS)
    throw new EngineInputError("slots", `the slots part into ${legs.length} legs`, `up to ${MOST_LEGS} legs`);
  return legs.length === 1 ? [{ ...flow, leg: { slots: EVERY_SLOT } }] : legs.map((slots) => legOf(flow, slots));
}

/** The classes of slots that take the same steps, by their first slot; one with every slot where no step is for some only. */
export function legsOfSteps(steps: readonly SlottedStep[]): number[][] {
  const legs = new Map<string, number[]>();
  for (const slot of EVERY_SLOT) {
    const taken = steps.map((step) => (takes(step, slot) ? "+" : "-")).join("");
    legs.set(taken, [...(legs.get(taken) ?? []), slot]);
  }
  return [...legs.values()];
}

/** What of a step says which slots take it. */
type SlottedStep = Pick<StepInput, "slots">;

/** The flow as the wafer of a slot goes through it. @throws EngineInputError as `legFlows` does, and for a slot that is none */
export function legOfSlot(flow: FlowInput, slot: number): FlowInput {
  const [first, ...others] = legFlows(flow);
  const leg = others.length === 0 ? first : [first, ...others].find((each) => each?.leg?.slots.includes(slot));
  if (!leg) throw new EngineInputError("slot", `there is no slot ${slot}`, `1 to ${SLOTS}`);
  return leg;
}

/** Whether some step of a flow is for some slots only, so that it cannot be walked before one of its legs is chosen. */
export function hasLegs({ leg, steps }: Pick<FlowInput, "leg" | "steps">): boolean {
  return !leg && steps.some(({ slots }) => slots);
}

/** Whether the wafer of a slot goes through a step. */
export const takes = ({ slots }: SlottedStep, slot: number) => !slots || slots.includes(slot);

/** The slots of all of some steps together; null when one of them is for every slot. */
export function slotsServed(steps: readonly SlottedStep[]): number[] | null {
  if (steps.length === 0 || steps.some(({ slots }) => !slots)) return null;
  return EVERY_SLOT.filter((slot) => steps.some((step) => takes(step, slot)));
}

function checkSlots({ slots }: StepInput, index: number): void {
  if (!slots) return;
  const field = `steps[${index}].slots`;
  if (slots.length === 0) throw new EngineInputError(field, "the step is for no slot", `1 to ${SLOTS}`);
  for (const [at, slot] of slots.entries()) {
    if (!Number.isInteger(slot) || slot < 1 || slot > SLOTS)
      throw new EngineInputError(field, `there is no slot ${slot}`, `1 to ${SLOTS}`);
    if (at > 0 && slot <= (slots[at - 1] ?? 0))
      throw new EngineInputError(field, "the slots are not each once and in order", `1 to ${SLOTS}`);
  }
}

function legOf(flow: FlowInput, slots: number[]): FlowInput {
  const [slot = 1] = slots;
  let planned: StepInput["planned"] = "bare";
  const steps = flow.steps.map((step) => {
    if (!takes(step, slot)) return skipped(step, planned);
    planned = step.planned;
    return step;
  });
  return { ...flow, leg: { slots }, steps };
}

/**
 * A step that other slots take, as it is for those that do not: nothing is done, the wafer stays as it is held. It keeps its times,
 * for which the wafers wait.
 */
function skipped(step: StepInput, planned: StepInput["planned"]): StepInput {
  const { kind, title, slots, timeSincePrevious } = step;
  return {
    kind,
    title,
    slots: slots ?? null,
    skipped: true,
    peakTemperature: ROOM_TEMPERATURE,
    holdTime: heatDuration(step),
    timeSincePrevious: timeSincePrevious ?? null,
    equipment: null,
    exposures: [],
    planned,
    siliconAfter: null,
    adds: [],
    removes: [],
    edgeTrim: null,
    bond: null,
    groundFaceForce: null,
  };
}

/** 'slots 1 to 12', 'slot 3', 'slots 1, 2, 5 to 7 and 9'. */
export function slotsInWords(slots: readonly number[]): string {
  return `${slots.length === 1 ? "slot" : "slots"} ${runsInWords(slots)}`;
}
