import type { Measured } from "#app/engine/measured.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { fulmarSteps } from "./demo-fulmar.ts";
import { petrelSteps } from "./demo-petrel.ts";
import type { DemoAddition, DemoStep } from "./demo-step.ts";
import { TERN_STEPS } from "./demo-tern.ts";
import type { SeedLibrary } from "./seed-library.ts";
import { seedStep } from "./seed-step.ts";
import { twoCarrierSteps } from "./template-two-carriers.ts";

interface TemplateFlow {
  name: string;
  note: string;
  /** m */
  diameter: number;
  /** µm */
  incoming: number;
  steps: DemoStep[];
}

const GO_THROUGH = "Go through the steps and put in your own films, temperatures and tools: every number is assumed.";

/** Flows that a site may start from. */
export const TEMPLATE_FLOWS: TemplateFlow[] = [
  { name: "Tape flow to 100 µm, 200 mm", note: GO_THROUGH, diameter: 0.2, incoming: 725, steps: TERN_STEPS },
  {
    name: "Glass carrier flow to 50 µm with back-side metal, 300 mm",
    note: GO_THROUGH,
    diameter: 0.3,
    incoming: 775,
    steps: petrelSteps({
      carrier: "Aluminosilicate glass, low expansion, 300 mm",
      material: "Laser release on thermoset (class)",
      thickness: 50,
      peak: 180,
      debond: { title: "Laser debond through glass, on frame", peak: 25 },
    }),
  },
  {
    name: "Silicon carrier flow to 20 µm with via reveal, 300 mm",
    note: GO_THROUGH,
    diameter: 0.3,
    incoming: 775,
    steps: fulmarSteps({
      carrier: "Silicon carrier, 300 mm",
      material: "Elastomer with release layer, peel (class)",
      thickness: 40,
      peak: 150,
      debond: { title: "Mechanical peel debond, on frame", peak: 25 },
    }),
  },
  {
    name: "Two-carrier transfer to 50 µm, lines on both sides, 300 mm",
    note: `${GO_THROUGH} The device side is bonded first, then the back side, and each debond says which it lets go.`,
    diameter: 0.3,
    incoming: 775,
    steps: twoCarrierSteps({
      first: {
        carrier: "Aluminosilicate glass, low expansion, 300 mm",
        material: "Laser release on thermoset (class)",
        thickness: 50,
        peak: 180,
        debond: { title: "Laser debond through glass", peak: 25 },
      },
      second: {
        carrier: "Silicon carrier, 300 mm",
        material: "Elastomer with release layer, peel (class)",
        thickness: 40,
        peak: 150,
        debond: { title: "Mechanical peel debond, on frame", peak: 25 },
      },
    }),
  },
];

/** Films of the library that stand for the demo's own, from the silicon outwards, each with its share of the thickness. */
const GENERIC: Record<string, [film: string, share: number][]> = {
  "Fab back-end equivalent film": [["Silicon dioxide, plasma", 1 / 4]],
  "Passivation nitride A": [["Silicon nitride, plasma, compressive", 1]],
  "Polymer dielectric A": [["Polyimide", 1]],
  "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)": [
    ["Titanium-tungsten, sputtered", 1 / 3],
    ["Copper seed, sputtered", 2 / 3],
  ],
  "Plated copper A": [["Copper, plated", 1]],
  "Nickel pad metal A": [["Nickel, back side", 1]],
  "Copper pillar with tin-silver cap A": [
    ["Copper, plated", 1],
    ["Solder, tin-silver", 10 / 12],
  ],
  "Back-side oxide A (low temperature)": [["Silicon dioxide, plasma", 1]],
  "Back-side nitride A (low temperature)": [["Silicon nitride, plasma, compressive", 1]],
  "Back-side metal A (titanium 0.1 µm + nickel 0.3 µm + silver 1.0 µm)": [
    ["Titanium, sputtered", 1 / 14],
    ["Nickel, back side", 3 / 14],
    ["Silver, back side", 10 / 14],
  ],
};

function generic(film: string): [film: string, share: number][] {
  const known = GENERIC[film];
  if (!known) throw new Error(`No film of the library stands for ${film}.`);
  return known;
}

const genericAdds = ({ film, thickness, stress: _stress, ...addition }: DemoAddition): DemoAddition[] =>
  generic(film).map(([name, share]) => ({
    ...addition,
    film: name,
    thickness: Number((thickness * share).toPrecision(3)),
  }));

/** A tape of the pilot line as the reference library has it. */
const genericTape = (name: string) =>
  name === "Bump-embedding grinding tape A"
    ? "Grinding tape for bumps, ultraviolet release"
    : "Dicing tape, ultraviolet release";

const isMeasured = (value: unknown): value is Measured =>
  typeof value === "object" && value !== null && "source" in value;

/** The same numbers, of which nobody has measured any here. */
function assumed<Value>(value: Value): Value {
  if (isMeasured(value)) return { ...value, source: "assumed", note: "typical, check it" };
  if (Array.isArray(value)) return value.map((each) => assumed(each as unknown)) as Value;
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, each]) => [key, assumed(each as unknown)])) as Value;
}

/** The steps of a template, with films of the reference library at their own stresses. */
export function templateSteps({ steps }: TemplateFlow, library: SeedLibrary): StepValues[] {
  return steps.map((step) =>
    assumed(
      seedStep(
        {
          ...step,
          tape: step.tape && genericTape(step.tape),
          adds: step.adds?.flatMap(genericAdds),
          removes: step.removes?.flatMap(({ side, film }) =>
            generic(film)
              .toReversed()
              .map(([name]) => ({ side, film: name })),
          ),
        },
        library,
      ),
    ),
  );
}
