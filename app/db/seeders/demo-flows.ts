import { fulmarSteps } from "./demo-fulmar.ts";
import { petrelSteps } from "./demo-petrel.ts";
import type { DemoBond, DemoStep } from "./demo-step.ts";
import { TERN_STEPS } from "./demo-tern.ts";

/** A flow of the demo; the silicon by name, what comes in in µm. */
export interface DemoFlow {
  program: string;
  name: string;
  note: string;
  silicon: string;
  incoming: number;
  steps: DemoStep[];
}

const LASER = { title: "Laser debond through glass, on frame", peak: 25 };

const onGlass = (expansion: string): DemoBond => ({
  carrier: `Glass carrier ${expansion} ppm`,
  material: "Laser-release adhesive B",
  thickness: 50,
  peak: 180,
  debond: LASER,
});

const petrel = (name: string, note: string, expansion: string): DemoFlow => ({
  program: "petrel",
  name,
  note,
  silicon: "Silicon (001), 300 mm, 775 µm",
  incoming: 775,
  steps: petrelSteps(onGlass(expansion)),
});

const fulmar = (name: string, note: string, bond: Omit<DemoBond, "carrier" | "thickness">): DemoFlow => ({
  program: "fulmar",
  name,
  note,
  silicon: "Silicon (001), 300 mm, 775 µm",
  incoming: 775,
  steps: fulmarSteps({ carrier: "Silicon carrier 775 µm", thickness: 40, ...bond }),
});

/** The flows of the three programs, each whole from the incoming wafer to the frame store. */
export const DEMO_FLOWS: DemoFlow[] = [
  {
    program: "tern",
    name: "Tern T-2, to 100 µm on tape",
    note: "One redistribution layer and balls; tape from the grind on.",
    silicon: "Silicon (001), 200 mm, 725 µm",
    incoming: 725,
    steps: TERN_STEPS,
  },
  petrel(
    "Petrel P-3, to 50 µm on glass 3.0 ppm",
    "Back-side metal on a glass carrier, let go by laser through the glass.",
    "3.0",
  ),
  petrel("Petrel P-3, on glass 3.3 ppm", "The same with the carrier that was in stock: a trial on paper.", "3.3"),
  petrel("Petrel P-3, on glass 7.2 ppm", "The same with a carrier that is made for moulded wafers.", "7.2"),
  fulmar("Fulmar F-1 A, to 20 µm, slide adhesive", "Via reveal on a silicon carrier with the adhesive in house.", {
    material: "Thermoplastic slide adhesive A",
    peak: 180,
    grindVariation: 1,
    debond: { title: "Thermal slide debond, on frame", peak: 200 },
  }),
  fulmar("Fulmar F-1 B, to 20 µm, peel adhesive", "Via reveal on a silicon carrier, peeled off at room temperature.", {
    material: "Peel adhesive C with release layer",
    peak: 150,
    variation: 1,
    grindVariation: 0.6,
    debond: { title: "Mechanical peel debond, on frame", peak: 25 },
  }),
];
