import type { FilmKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { exceeds, reaches } from "#app/engine/rules/against-limit.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Exposure, Holding, Side } from "#app/engine/vocabulary.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { BLANK_STEP } from "./blank-step.ts";
import { filmCutWords } from "./film-cut.ts";
import { filmThicknessText } from "./flow-thickness.ts";

/**
 * A first step list for a stack: how its films could come onto the wafer, and how it could be thinned. Every number that the
 * stack does not give is assumed and says so; the person goes through the steps afterwards.
 */

/** A film of the stack, from the silicon outwards on its side. */
export interface StackFilm {
  side: Side;
  id: string;
  name: string;
  kind: FilmKind;
  thickness: Measured;
  /** the stack's own; null keeps the film's */
  stress: Measured | null;
  coverage: number;
  lines?: FilmLines | null;
}

/** The carrier and bonding material that the person chose. */
export interface ChosenBond {
  carrier: { id: string; name: string };
  material: {
    id: string;
    name: string;
    /** K */
    bondTemperature: number;
    /** K */
    releaseTemperature: number;
    /** range of thickness that it is made for, m */
    leastThickness: number;
    mostThickness: number;
  };
}

export interface StackStart {
  /** m */
  diameter: number;
  /** silicon as it comes in */
  incoming: Measured;
  /** silicon that is to remain */
  target: Measured;
  films: StackFilm[];
  tools: { id: string; name: string }[];
  /** used only where `needsCarrier` says so */
  bond: ChosenBond | null;
}

const NOTE = "proposed by Planeward, check it";

const um = (micrometres: number) => micrometres / 1e6;
const kelvin = (celsius: number) => celsius + 273.15;
const assumed = (value: number, tolerance: number | null): Measured => ({
  value,
  tolerance,
  source: "assumed",
  note: NOTE,
  on: null,
});

const TRIM_BELOW = um(150);
const CARRIER_BELOW = um(50);
/** Left by the grind for the stress relief to take off. */
const RELIEF = um(10);

const isThinned = ({ incoming, target }: Pick<StackStart, "incoming" | "target">) =>
  exceeds(incoming.value, target.value);

/** Whether the thinning goes onto a carrier: below 50 µm, or when back-side films follow it. On tape otherwise. */
export function needsCarrier(start: Pick<StackStart, "incoming" | "target" | "films">): boolean {
  if (!isThinned(start)) return false;
  return !reaches(start.target.value, CARRIER_BELOW) || start.films.some(({ side }) => side === "back");
}

/** A step by what it differs in from one that does nothing, and the name of its tool. */
type Sketch = Pick<StepValues, "kind" | "title"> & Partial<Omit<StepValues, "equipment">> & { tool: string };

/** A step as sketched, everything else left as it is at room temperature on a bare wafer. */
function stepOf({ tool, title, ...sketch }: Sketch, tools: StackStart["tools"]): StepValues {
  const called = tool.toLowerCase();
  return {
    ...BLANK_STEP,
    ...sketch,
    title: title.slice(0, 120),
    equipment: tools.find(({ name }) => name.toLowerCase() === called)?.id ?? null,
  };
}

const minutes = (count: number) => count * 60;
const PLASMA: Exposure[] = ["vacuum", "plasma"];

/** How a film comes onto the wafer, by its kind; thick metal is plated, thin metal sputtered. */
function filmStep(
  { id, name, kind, side, thickness, stress, coverage, lines = null }: StackFilm,
  planned: Holding,
): Sketch {
  const what = [name, filmThicknessText(thickness.value), filmCutWords({ coverage, lines })]
    .filter(Boolean)
    .join(", ")
    .replaceAll("\u00A0", " ");
  const films = [{ change: "adds" as const, side, film: id, thickness, stress, coverage, lines }];
  const back = side === "back";
  switch (kind) {
    case "polymer":
      return {
        kind: "cure",
        title: `Coat and cure ${what}`,
        peakTemperature: kelvin(230),
        holdTime: minutes(120),
        tool: "Polymer cure oven",
        exposures: ["nitrogen"],
        planned,
        films,
      };
    case "solder":
      return {
        kind: "reflow",
        title: `Place and reflow ${what}`,
        peakTemperature: kelvin(245),
        holdTime: minutes(1),
        tool: "Reflow oven, belt or plate",
        exposures: ["flux", "nitrogen"],
        planned,
        films,
      };
    case "metal":
      if (exceeds(thickness.value, um(1)) && !back)
        return {
          kind: "plate",
          title: `Plate ${what}`,
          tool: "Single-wafer wet or plating",
          exposures: ["acid"],
          planned,
          films,
        };
      return {
        kind: back ? "back-side film" : "deposit",
        title: `Sputter ${what}`,
        peakTemperature: kelvin(100),
        tool: "Sputter, electrostatic or clamp chuck",
        exposures: PLASMA,
        planned,
        films,
      };
    case "inorganic":
      return {
        kind: back ? "back-side film" : "deposit",
        title: `Deposit ${what}`,
        peakTemperature: kelvin(180),
        tool: "Plasma deposition, electrostatic chuck",
        exposures: PLASMA,
        planned,
        films,
      };
  }
}

/** Grind to a little more than the target, then take off the damage; nothing to grind where the target is that near. */
function thinning({ incoming, target }: StackStart, planned: Holding): Sketch[] {
  const ground = target.value + RELIEF;
  const water: Exposure[] = ["water"];
  const tool = "Grinder and polisher";
  const grind: Sketch = {
    kind: "grind",
    title: `Grind to ${inMicrometres(ground)}`,
    tool,
    exposures: water,
    planned,
    siliconAfter: assumed(ground, um(3)),
    groundFaceForce: assumed(-60, 30),
  };
  const relief: Sketch = {
    kind: "stress relief",
    title: `Stress relief to ${inMicrometres(target.value)}`,
    tool,
    exposures: water,
    planned,
    siliconAfter: target,
    groundFaceForce: assumed(-5, 2.5),
  };
  return exceeds(incoming.value, ground) ? [grind, relief] : [relief];
}

const inMicrometres = (length: number) => formatQuantity(length, "length", { unit: "µm" }).replaceAll("\u00A0", " ");

function trim({ target }: StackStart): Sketch[] {
  if (reaches(target.value, TRIM_BELOW)) return [];
  return [
    {
      kind: "edge trim",
      title: "Trim the edge from the device side",
      tool: "Edge trimmer",
      exposures: ["water"],
      trimWidth: assumed(0.7e-3, 0.05e-3),
      trimDepth: assumed(target.value + um(50), um(10)),
    },
  ];
}

const mount = (planned: Holding): Sketch => ({
  kind: "mount on frame",
  title: planned === "carrier" ? "Mount back side on film frame" : "Mount on film frame",
  peakTemperature: kelvin(60),
  holdTime: minutes(1),
  tool: "Frame mounter",
  planned,
});

const FINISH: Sketch[] = [
  { kind: "dice", title: "Dice on frame", tool: "Dicer", exposures: ["water"], planned: "film frame" },
  { kind: "store", title: "Store on frame", tool: "Frame store", planned: "film frame" },
];

function onTape(start: StackStart): Sketch[] {
  return [
    {
      kind: "laminate tape",
      title: "Laminate grinding tape on the device side",
      peakTemperature: kelvin(60),
      holdTime: minutes(1),
      tool: "Tape laminator",
      planned: "grinding tape",
    },
    ...thinning(start, "grinding tape"),
    mount("film frame"),
  ];
}

function onCarrier(start: StackStart, bond: ChosenBond): Sketch[] {
  const { carrier, material } = bond;
  const middle = (material.leastThickness + material.mostThickness) / 2;
  return [
    {
      kind: "bond",
      title: `Bond to ${carrier.name}, ${material.name}`,
      peakTemperature: material.bondTemperature,
      tool: "Wafer bonder",
      exposures: ["vacuum"],
      planned: "carrier",
      carrier: carrier.id,
      bondingMaterial: material.id,
      bondThickness: assumed(middle, middle / 10),
    },
    ...thinning(start, "carrier"),
    ...start.films.filter(({ side }) => side === "back").map((film) => filmStep(film, "carrier")),
    mount("carrier"),
    {
      kind: "debond",
      title: "Debond, on frame",
      peakTemperature: material.releaseTemperature,
      tool: "Debonder",
      planned: "film frame",
    },
    {
      kind: "clean",
      title: "Remove the bonding material, on frame",
      peakTemperature: kelvin(30),
      holdTime: minutes(10),
      tool: "Frame cleaner",
      exposures: ["solvent"],
      planned: "film frame",
    },
  ];
}

/**
 * The steps proposed for a stack, in order.
 * @throws Error when the stack needs a carrier and none is chosen: ask `needsCarrier` first
 */
export function proposeSteps(start: StackStart): StepValues[] {
  const { diameter, tools, films, bond } = start;
  const store = `Cassette or box store ${Math.round(diameter * 1e3)} mm`;
  const fronts = films.filter(({ side }) => side === "front").map((film) => filmStep(film, "bare"));
  const receive: Sketch = { kind: "receive", title: `Receive, ${inMicrometres(start.incoming.value)}`, tool: store };
  const sketch = (steps: Sketch[]) => steps.map((step) => stepOf(step, tools));
  if (!isThinned(start)) {
    const backs = films.filter(({ side }) => side === "back").map((film) => filmStep(film, "bare"));
    return sketch([receive, ...fronts, ...backs, mount("film frame"), ...FINISH]);
  }
  if (!needsCarrier(start)) return sketch([receive, ...fronts, ...trim(start), ...onTape(start), ...FINISH]);
  if (!bond) throw new Error("This stack needs a carrier, and none was chosen.");
  return sketch([receive, ...fronts, ...trim(start), ...onCarrier(start, bond), ...FINISH]);
}
