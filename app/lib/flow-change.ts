import { spansOfKinds } from "#app/engine/finder/bond-spans.ts";
import { slotsServed, takes } from "#app/engine/flow/legs.ts";
import { FINDER_NOTE } from "#app/engine/finder/with-bond.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { FRAME_TITLE, framedSteps, moved, REMEDY_NOTE, type FlowChange } from "#app/engine/trial/change.ts";
import { tried } from "#app/engine/trial/tried.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FlowPlan, StepPlan } from "#app/schemas/flow-plan.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { BLANK_STEP } from "./blank-step.ts";
import { planWithCarrier, planWithPeak } from "./step-edits.ts";

/**
 * The changes that the engine tries, made in a flow's stored plan. Both must come to the same flow, which a test holds; only the
 * titles of steps are the plan's own, so that they do not go on naming what is no longer used.
 */

/** What the plan alone does not know. */
export interface PlanContext {
  catalogue: Catalogue;
  /** stress in force of the film that a step (from 1) adds as its nth (from 0): its own, else the film's */
  stressOf: (step: number, film: number) => Measured | null;
  newId: () => string;
  /** a slot of the leg that the change was tried on; missing where the flow does not part by slot */
  slot?: number | undefined;
}

const LONGEST_TITLE = 120;

/** Marks the steps that the wafer of a slot does not take. */
const onLeg =
  (slot: number | undefined) =>
  (step: StepPlan): StepPlan & { skipped: boolean } => ({
    ...step,
    skipped: slot !== undefined && !takes(step.handling, slot),
  });

/** A plan with one change. */
export function planWith(plan: FlowPlan, change: FlowChange, context: PlanContext): FlowPlan {
  const { steps } = plan;
  switch (change.quantity) {
    case "place":
      return { ...plan, steps: moved(steps, change) };
    case "frame":
      return { ...plan, steps: withFrame(steps, change, context) };
    case "bond":
      return { ...plan, steps: rebonded(steps, change, context) };
    default:
      return {
        ...plan,
        steps: steps.map((step, index) => (index + 1 === change.step ? changedStep(step, change, context) : step)),
      };
  }
}

type StepChange = Exclude<FlowChange, { quantity: "bond" | "frame" | "place" }>;

function changedStep(step: StepPlan, change: StepChange, context: PlanContext): StepPlan {
  const at = (was: Measured | null, value: number) => tried(was, value, REMEDY_NOTE);
  switch (change.quantity) {
    case "silicon after":
      return { ...step, siliconAfter: at(step.siliconAfter, change.value) };
    case "peak temperature":
      return planWithPeak(step, change.value);
    case "bond thickness":
      return { ...step, bondThickness: at(step.bondThickness, change.value) };
    case "trim depth":
      return { ...step, trimDepth: at(step.trimDepth, change.value) };
    case "tool":
      return { ...step, equipment: change.tool };
    case "support":
      return { ...step, planned: change.holding };
    case "film thickness":
      return withFilm(step, change, (film) => [{ ...film, thickness: at(film.thickness, change.value) }]);
    case "film stress": {
      const was = context.stressOf(change.step, change.film);
      return withFilm(step, change, (film) => [{ ...film, stress: at(was, change.value) }]);
    }
    case "film on the back":
      return withFilm(step, change, (film) => [
        film,
        { ...film, side: "back", thickness: at(film.thickness, change.value) },
      ]);
  }
}

type FilmPlan = StepValues["films"][number];

function withFilm(step: StepPlan, { film }: { film: number }, change: (film: FilmPlan) => FilmPlan[]): StepPlan {
  let count = 0;
  const films = step.films.flatMap((each) => (each.change === "adds" && count++ === film ? change(each) : [each]));
  return { ...step, films };
}

function withFrame(
  steps: StepPlan[],
  { step, tool }: Extract<FlowChange, { quantity: "frame" }>,
  { newId, slot }: PlanContext,
): StepPlan[] {
  const taken = steps.map(onLeg(slot));
  const framed = new Set(framedSteps(taken, step).filter((number) => !taken[number - 1]?.skipped));
  const slots = slotsServed(steps.flatMap(({ handling }, index) => (framed.has(index + 1) ? handling : [])));
  const mount: StepPlan = {
    ...BLANK_STEP,
    id: newId(),
    kind: "mount on frame",
    title: FRAME_TITLE,
    planned: "film frame",
    equipment: tool,
    handling: { ...BLANK_STEP.handling, slots },
  };
  return steps
    .map((each, index): StepPlan => (framed.has(index + 1) ? { ...each, planned: "film frame" } : each))
    .toSpliced(step - 1, 0, mount);
}

function rebonded(
  steps: StepPlan[],
  change: Extract<FlowChange, { quantity: "bond" }>,
  { catalogue, slot }: PlanContext,
): StepPlan[] {
  const bond = steps[change.step - 1];
  const nameOf = (list: readonly { id: string; name: string }[], id: string | null) =>
    list.find((each) => each.id === id)?.name ?? null;
  const materials = catalogue.materials.map(({ material }) => material);
  const material = materials.find(({ id }) => id === change.material);
  if (!bond || !material) return steps;
  const otherMaterial = bond.bondingMaterial !== change.material;
  const sameLayer = !otherMaterial && bond.bondThickness?.value === change.thickness;
  const renamed = (title: string) =>
    replaced(
      replaced(title, nameOf(catalogue.carriers, bond.carrier), nameOf(catalogue.carriers, change.carrier)),
      nameOf(materials, bond.bondingMaterial),
      material.name,
    );
  const made = planWithCarrier(
    otherMaterial ? planWithPeak(bond, material.bondTemperature.value) : bond,
    change.carrier,
  );
  const next: StepPlan = {
    ...made,
    title: renamed(bond.title),
    bondingMaterial: change.material,
    bondThickness: sameLayer
      ? bond.bondThickness
      : tried(otherMaterial ? null : bond.bondThickness, change.thickness, FINDER_NOTE),
    handling: sameLayer ? made.handling : { ...made.handling, bondThicknessVariation: null },
  };
  const taken = steps.map(onLeg(slot));
  const span = spansOfKinds(
    taken.map(({ kind, handling, skipped }) => ({ ...handling, kind: skipped ? null : kind })),
  ).find(({ from }) => from === change.step);
  return steps.map((step, index) => {
    if (index + 1 === change.step) return next;
    if (index + 1 !== span?.to || !otherMaterial) return step;
    return { ...planWithPeak(step, material.releaseTemperature.value), title: `Debond, ${material.release}` };
  });
}

function replaced(title: string, old: string | null, now: string | null): string {
  return old && now ? title.replace(old, now).slice(0, LONGEST_TITLE) : title;
}
