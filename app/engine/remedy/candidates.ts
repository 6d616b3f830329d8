import { bondSpans } from "../finder/bond-spans.ts";
import type { BondInput, FilmAddition } from "../flow/model.ts";
import { bondLetGo, type WaferState } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { isBonded } from "../rules/bonded.ts";
import type { Catalogue } from "../trial/catalogue.ts";
import type { FlowChange } from "../trial/change.ts";
import type { WalkedFlow } from "../trial/trial-walk.ts";

/** A quantity that can be changed by degrees, from what is planned as far as `to`. */
export interface Range {
  kind: "range";
  from: number;
  to: number;
  change: (value: number) => FlowChange;
}

/** Something that can be chosen otherwise, or done elsewhere. */
export interface Choice {
  kind: "choice";
  change: FlowChange;
}

export type Candidate = Range | Choice;

/** Films that are tried, those that pull hardest first: what bends a wafer is rarely more than these. */
const FILMS = 5;
/** Hot steps before the finding that are tried, the latest first. */
const HOT_STEPS = 3;
/** How many places up and down a step is moved. */
const PLACES = 4;

const BENDING = [2, 3, 4, 5, 7];
const rulesOf = {
  silicon: [1, ...BENDING, 9, 10],
  films: BENDING,
  peak: [6, 7, 8, 11, 12, 14, 16],
  hotBefore: [2, 3, 7],
  bond: [...BENDING, 6, 8, 9, 14],
  bondThickness: [2, 3, 7, 9],
  trim: [10],
  tool: [1, 2, 4, 5, 7, 12],
  support: [1, 2, 3, 5, 12],
  place: [6, 8, 10, 12, 17],
};

/** The quantities whose change can clear what a rule finds at a step, by what the rule asks. */
export function candidatesFor(base: WalkedFlow, rule: number, step: number, catalogue: Catalogue): Candidate[] {
  const state = base.steps[step - 1];
  if (!state) return [];
  const has = (what: keyof typeof rulesOf) => rulesOf[what].includes(rule);
  const hot = [...(has("peak") ? [state] : []), ...(has("hotBefore") ? hotBefore(base, state) : [])];
  return [
    ...(has("bond") ? bonds(base, state, catalogue) : []),
    ...(has("tool") ? tools(state, catalogue) : []),
    ...(has("support") ? supports(base, state, catalogue) : []),
    ...(has("silicon") ? silicon(base, state) : []),
    ...(has("films") ? films(base, state) : []),
    ...(has("bondThickness") ? bondThickness(base, state, catalogue) : []),
    ...peaks([...new Set(hot)]),
    ...(has("trim") ? trims(base, state) : []),
    ...(has("place") ? places(base, state) : []),
  ];
}

/** More silicon at the step that has last thinned it, up to what came into that step. */
function silicon({ steps }: WalkedFlow, { number }: StepState): Candidate[] {
  const thinned = steps.slice(0, number).findLast(({ step }) => step.siliconAfter !== null);
  const from = thinned?.step.siliconAfter?.value;
  if (!thinned || from === undefined || !(thinned.before.silicon.value > from)) return [];
  return [
    {
      kind: "range",
      from,
      to: thinned.before.silicon.value,
      change: (value) => ({ quantity: "silicon after", step: thinned.number, value }),
    },
  ];
}

/** Where an addition stands in the flow; null for what the wafer is received with, which nobody here can change. */
function placeOf({ flow }: WalkedFlow, addition: FilmAddition): { step: number; film: number } | null {
  for (const [index, step] of flow.steps.entries()) {
    const film = step.adds.indexOf(addition);
    if (film >= 0 && step.kind !== "receive") return { step: index + 1, film };
  }
  return null;
}

const pull = ({ stress, thickness, coverage }: FilmAddition) => Math.abs(stress.value * thickness.value * coverage);

function films(base: WalkedFlow, { after }: StepState): Candidate[] {
  const on = [...after.front, ...after.back].map(({ addition }) => addition);
  return on
    .toSorted((a, b) => pull(b) - pull(a))
    .slice(0, FILMS)
    .flatMap((addition) => {
      const place = placeOf(base, addition);
      return place ? ofFilm(addition, place, after) : [];
    });
}

function ofFilm(
  { side, film, thickness, stress }: FilmAddition,
  place: { step: number; film: number },
  { back }: WaferState,
): Candidate[] {
  const range = (quantity: "film thickness" | "film stress" | "film on the back", from: number, to: number): Range => ({
    kind: "range",
    from,
    to,
    change: (value) => ({ quantity, ...place, value }),
  });
  const [thick, pulls] = [thickness.value, stress.value];
  const byThickness = [range("film thickness", thick, thick / 5), range("film thickness", thick, thick * 3)];
  const byStress = pulls === 0 ? [] : [range("film stress", pulls, 0), range("film stress", pulls, pulls * 2)];
  // What is deposited on one face can be deposited on both; what is spun on or plated cannot.
  const both =
    side === "front" && film.kind === "inorganic" && back.every(({ addition }) => addition.film.id !== film.id);
  return [...byThickness, ...byStress, ...(both ? [range("film on the back", 0, thick * 3)] : [])];
}

/** The bonds that are there at a step, with what they are. The step after the debond still deals with what is left of a bond. */
function bondsAt({ flow }: WalkedFlow, { number }: StepState): { from: number; bond: BondInput }[] {
  return bondSpans(flow)
    .filter(({ from, to }) => from <= number && (to === null || number <= to + 1))
    .flatMap(({ from }) => {
      const bond = flow.steps[from - 1]?.bond;
      return bond ? [{ from, bond }] : [];
    });
}

/** Another carrier or another bonding material; a thickness that the material is not put on in becomes the nearest one that is. */
function bonds(base: WalkedFlow, state: StepState, { carriers, materials }: Catalogue): Candidate[] {
  return bondsAt(base, state).flatMap(({ from, bond }) => {
    const choice = (carrier: string, material: string, thickness: number): Choice => ({
      kind: "choice",
      change: { quantity: "bond", step: from, carrier, material, thickness },
    });
    const { value } = bond.thickness;
    return [
      ...carriers.filter(({ id }) => id !== bond.carrier.id).map(({ id }) => choice(id, bond.material.id, value)),
      ...materials
        .filter(({ material }) => material.id !== bond.material.id)
        .map(({ material, leastThickness, mostThickness }) =>
          choice(bond.carrier.id, material.id, Math.min(Math.max(value, leastThickness), mostThickness)),
        ),
    ];
  });
}

function bondThickness(base: WalkedFlow, state: StepState, { materials }: Catalogue): Candidate[] {
  return bondsAt(base, state).flatMap(({ from: step, bond }) => {
    const entry = materials.find(({ material }) => material.id === bond.material.id);
    if (!entry) return [];
    const from = bond.thickness.value;
    return [entry.leastThickness, entry.mostThickness]
      .filter((to) => Math.abs(to - from) > 1e-9)
      .map((to): Range => ({
        kind: "range",
        from,
        to,
        change: (value) => ({ quantity: "bond thickness", step, value }),
      }));
  });
}

function hotBefore({ steps }: WalkedFlow, { number }: StepState): StepState[] {
  return steps
    .slice(0, number)
    .filter(({ step }) => step.peakTemperature > ROOM_TEMPERATURE)
    .slice(-HOT_STEPS);
}

/** Temperature, K, below which a step no longer does what it is for. A reflow has to melt its solder: it is not tried. */
function coolest({ step, before }: StepState): number {
  switch (step.kind) {
    case "bond":
      return step.bond?.material.bondTemperature.value ?? step.peakTemperature;
    case "debond":
      return bondLetGo(before, step)?.material.releaseTemperature.value ?? step.peakTemperature;
    case "reflow":
      return step.peakTemperature;
    default:
      return ROOM_TEMPERATURE;
  }
}

function peaks(states: StepState[]): Candidate[] {
  return states
    .map((state) => ({ ...state, coolest: coolest(state) }))
    .filter(({ step, coolest: to }) => step.peakTemperature > to)
    .map(({ number, step, coolest: to }) => ({
      kind: "range",
      from: step.peakTemperature,
      to,
      change: (value) => ({ quantity: "peak temperature", step: number, value }),
    }));
}

function trims({ steps }: WalkedFlow, { number }: StepState): Candidate[] {
  const trim = steps.slice(0, number).findLast(({ step }) => step.kind === "edge trim" && step.edgeTrim);
  const depth = trim?.step.edgeTrim?.depth.value;
  if (!trim || depth === undefined || !(trim.before.silicon.value > depth)) return [];
  return [
    {
      kind: "range",
      from: depth,
      to: trim.before.silicon.value,
      change: (value) => ({ quantity: "trim depth", step: trim.number, value }),
    },
  ];
}

function tools({ number, step }: StepState, catalogue: Catalogue): Candidate[] {
  return catalogue.tools
    .filter(({ tool, kinds }) => tool.id !== step.equipment?.id && kinds.includes(step.kind))
    .map(({ tool }) => ({ kind: "choice", change: { quantity: "tool", step: number, tool: tool.id } }));
}

const isFree = ({ step, after }: StepState) =>
  !isBonded(after) && (step.planned === "bare" || step.planned === "thin-wafer gripper");

/** The first of the steps in a row, up to this one, at which the wafer is as thin and nothing holds it. */
function firstFree({ steps }: WalkedFlow, { number, after }: StepState): number {
  let first = number;
  for (const state of steps.slice(0, number - 1).toReversed()) {
    if (!isFree(state) || state.after.silicon.value !== after.silicon.value) break;
    first = state.number;
  }
  return first;
}

function supports(base: WalkedFlow, state: StepState, catalogue: Catalogue): Candidate[] {
  const { number, step, after } = state;
  const held = isBonded(after) ? ["carrier" as const] : after.mount ? [after.mount] : [];
  const holdings = [...held, "thin-wafer gripper" as const].filter((holding) => holding !== step.planned);
  const mounters = isFree(state) ? catalogue.tools.filter(({ kinds }) => kinds.includes("mount on frame")) : [];
  const from = firstFree(base, state);
  return [
    ...holdings.map((holding): Choice => ({ kind: "choice", change: { quantity: "support", step: number, holding } })),
    ...mounters.map(({ tool }): Choice => ({
      kind: "choice",
      change: { quantity: "frame", step: from, tool: tool.id },
    })),
  ];
}

function places({ flow }: WalkedFlow, { number }: StepState): Candidate[] {
  return Array.from({ length: 2 * PLACES + 1 }, (_, index) => number - PLACES + index)
    .filter((to) => to !== number && to >= 1 && to <= flow.steps.length)
    .map((to) => ({ kind: "choice", change: { quantity: "place", step: number, to } }));
}
