import { bondSpans } from "../finder/bond-spans.ts";
import { withBond } from "../finder/with-bond.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { FilmAddition, FlowInput, StepInput } from "../flow/model.ts";
import { slotsServed } from "../flow/legs.ts";
import { withPeak } from "../flow/temperature-profile.ts";
import type { Holding } from "../vocabulary.ts";
import type { Catalogue } from "./catalogue.ts";
import { tried } from "./tried.ts";

/** Quantities that are changed to a value: m, K or Pa. */
export const STEP_QUANTITIES = ["silicon after", "peak temperature", "bond thickness", "trim depth"] as const;
export type StepQuantity = (typeof STEP_QUANTITIES)[number];
export const FILM_QUANTITIES = ["film thickness", "film stress", "film on the back"] as const;
export type FilmQuantity = (typeof FILM_QUANTITIES)[number];

/**
 * One change of a flow. `step` is a step's number from 1, `film` counts what the step adds from 0, ids are the catalogue's.
 *
 * - 'film on the back': the same film on the other face as well, `value` thick
 * - 'bond': carrier, bonding material and its thickness together; a choice of one of them leaves the others
 * - 'frame': mounted on a film frame before the step, and left on it for as long as nothing else holds it
 * - 'place': the step is done as number `to` instead
 */
export type FlowChange =
  | { quantity: StepQuantity; step: number; value: number }
  | { quantity: FilmQuantity; step: number; film: number; value: number }
  | { quantity: "bond"; step: number; carrier: string; material: string; thickness: number }
  | { quantity: "tool"; step: number; tool: string }
  | { quantity: "support"; step: number; holding: Holding }
  | { quantity: "frame"; step: number; tool: string }
  | { quantity: "place"; step: number; to: number };

/** What a value is said to come from that a remedy has put in. */
export const REMEDY_NOTE = "from a change tried";

export const FRAME_TITLE = "Mount on film frame";

/** The flow with a change. One that names what is not there leaves the flow as it is. */
export function applyChange(flow: FlowInput, change: FlowChange, catalogue: Catalogue): FlowInput {
  switch (change.quantity) {
    case "bond":
      return otherBond(flow, change, catalogue);
    case "frame":
      return onFrame(flow, change, catalogue);
    case "place":
      return { ...flow, steps: moved(flow.steps, change) };
    default:
      return withStep(flow, change.step, (step) => changedStep(step, change, catalogue));
  }
}

/** Number before the change of each step after it; null for a step that the change has put in. */
export function originsOf(count: number, change: FlowChange): (number | null)[] {
  const numbers = Array.from({ length: count }, (_, index) => index + 1);
  if (change.quantity === "place") return moved(numbers, change);
  if (change.quantity === "frame")
    return [...numbers.slice(0, change.step - 1), null, ...numbers.slice(change.step - 1)];
  return numbers;
}

/** A list with the `step`th of its items as its `to`th. */
export function moved<Item>(items: readonly Item[], { step, to }: { step: number; to: number }): Item[] {
  const item = items[step - 1];
  if (item === undefined) return [...items];
  return items.toSpliced(step - 1, 1).toSpliced(to - 1, 0, item);
}

/** Numbers of the steps that a frame takes over, from the step on: those where nothing else holds the wafer. */
export function framedSteps(steps: readonly Pick<StepInput, "planned" | "kind" | "skipped">[], from: number): number[] {
  const rest = steps.slice(from - 1);
  const end = rest.findIndex(
    ({ planned, kind, skipped }) => !skipped && (!["bare", "thin-wafer gripper"].includes(planned) || kind === "bond"),
  );
  const length = end < 0 ? rest.length : end;
  return Array.from({ length }, (_, index) => from + index);
}

function withStep(flow: FlowInput, number: number, change: (step: StepInput) => StepInput): FlowInput {
  return { ...flow, steps: flow.steps.map((step, index) => (index + 1 === number ? change(step) : step)) };
}

type StepChange = Exclude<FlowChange, { quantity: "bond" | "frame" | "place" }>;

function changedStep(step: StepInput, change: StepChange, { tools }: Catalogue): StepInput {
  switch (change.quantity) {
    case "silicon after":
      return { ...step, siliconAfter: tried(step.siliconAfter, change.value, REMEDY_NOTE) };
    case "peak temperature":
      return withPeak(step, change.value);
    case "bond thickness":
      return step.bond
        ? { ...step, bond: { ...step.bond, thickness: tried(step.bond.thickness, change.value, REMEDY_NOTE) } }
        : step;
    case "trim depth":
      return step.edgeTrim
        ? { ...step, edgeTrim: { ...step.edgeTrim, depth: tried(step.edgeTrim.depth, change.value, REMEDY_NOTE) } }
        : step;
    case "film thickness":
      return withFilm(step, change, (film) => [
        { ...film, thickness: tried(film.thickness, change.value, REMEDY_NOTE) },
      ]);
    case "film stress":
      // What a stress was measured on says nothing of one that nobody measured.
      return withFilm(step, change, ({ stressRecord: _measuredOn, ...film }) => [
        { ...film, stress: tried(film.stress, change.value, REMEDY_NOTE) },
      ]);
    case "film on the back":
      return withFilm(step, change, (film) => [
        film,
        { ...film, side: "back", thickness: tried(film.thickness, change.value, REMEDY_NOTE) },
      ]);
    case "support":
      return { ...step, planned: change.holding };
    case "tool": {
      const found = tools.find(({ tool }) => tool.id === change.tool);
      return found ? { ...step, equipment: found.tool } : step;
    }
  }
}

function withFilm(
  step: StepInput,
  { film }: { film: number },
  change: (film: FilmAddition) => FilmAddition[],
): StepInput {
  return { ...step, adds: step.adds.flatMap((addition, at) => (at === film ? change(addition) : [addition])) };
}

function otherBond(
  flow: FlowInput,
  change: Extract<FlowChange, { quantity: "bond" }>,
  { carriers, materials }: Catalogue,
): FlowInput {
  const span = bondSpans(flow).find(({ from }) => from === change.step);
  const carrier = carriers.find(({ id }) => id === change.carrier);
  const entry = materials.find(({ material }) => material.id === change.material);
  if (!span || !carrier || !entry) return flow;
  return withBond(flow, span, { carrier, material: entry.material, thickness: change.thickness });
}

function onFrame(
  flow: FlowInput,
  { step, tool }: Extract<FlowChange, { quantity: "frame" }>,
  { tools }: Catalogue,
): FlowInput {
  const equipment = tools.find((each) => each.tool.id === tool)?.tool;
  if (!equipment || !flow.steps[step - 1]) return flow;
  const framed = new Set(framedSteps(flow.steps, step));
  const steps = flow.steps.map((each, index) =>
    framed.has(index + 1) ? { ...each, planned: "film frame" as const } : each,
  );
  const slots = slotsServed(flow.steps.filter(({ skipped }, index) => !skipped && framed.has(index + 1)));
  const mount = mountStep(equipment);
  return { ...flow, steps: steps.toSpliced(step - 1, 0, slots ? { ...mount, slots } : mount) };
}

function mountStep(equipment: StepInput["equipment"]): StepInput {
  return {
    kind: "mount on frame",
    title: FRAME_TITLE,
    peakTemperature: ROOM_TEMPERATURE,
    holdTime: null,
    equipment,
    exposures: [],
    planned: "film frame",
    siliconAfter: null,
    adds: [],
    removes: [],
    edgeTrim: null,
    bond: null,
    groundFaceForce: null,
  };
}
