import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Silicon } from "../entities/silicon.ts";
import { StackLayer } from "../entities/stack-layer.ts";
import { Stack } from "../entities/stack.ts";
import type { Film } from "../entities/film.ts";
import type { Program } from "../entities/program.ts";
import { measured } from "./measured.ts";
import { delivered } from "./reference-seeder.ts";
import type { DemoAddition } from "./demo-step.ts";

interface DemoStack {
  program: string;
  name: string;
  note: string;
  silicon: string;
  /** µm */
  thickness: number;
  layers: DemoAddition[];
}

const BARRIER = "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)";
const BACK_METAL = "Back-side metal A (titanium 0.1 µm + nickel 0.3 µm + silver 1.0 µm)";

/** One stack for each program: the films that are on the wafer when it is thin. */
export const DEMO_STACKS: DemoStack[] = [
  {
    program: "tern",
    name: "Tern T-2, one redistribution layer",
    note: "As it goes to the grinder, copper after its cure.",
    silicon: "Silicon (001), 200 mm, 725 µm",
    thickness: 100,
    layers: [
      { side: "front", film: "Passivation nitride A", thickness: 0.8, stress: -100, coverage: 1 },
      { side: "front", film: "Polymer dielectric A", thickness: 5, stress: 30, coverage: 0.95 },
      { side: "front", film: BARRIER, thickness: 0.3, stress: -150, coverage: 0.35 },
      { side: "front", film: "Plated copper A", thickness: 5, stress: 200, coverage: 0.35 },
      { side: "front", film: "Polymer dielectric A", thickness: 7, stress: 30, coverage: 0.92 },
    ],
  },
  {
    program: "petrel",
    name: "Petrel P-3, back-side metal",
    note: "With the back-side films on; copper after its anneal.",
    silicon: "Silicon (001), 300 mm, 775 µm",
    thickness: 50,
    layers: [
      { side: "front", film: "Fab back-end equivalent film", thickness: 6, stress: -25, coverage: 1 },
      { side: "front", film: "Polymer dielectric A", thickness: 4, stress: 30, coverage: 0.9 },
      { side: "front", film: "Plated copper A", thickness: 4, stress: 200, coverage: 0.3 },
      { side: "back", film: "Back-side oxide A (low temperature)", thickness: 0.5, stress: -120, coverage: 1 },
      { side: "back", film: BACK_METAL, thickness: 1.4, stress: 140, coverage: 1 },
    ],
  },
  {
    program: "fulmar",
    name: "Fulmar F-1, pillars and vias",
    note: "After the reveal etch, before the back-side films.",
    silicon: "Silicon (001), 300 mm, 775 µm",
    thickness: 20,
    layers: [
      { side: "front", film: "Fab back-end equivalent film", thickness: 4, stress: 35, coverage: 1 },
      { side: "front", film: "Copper pillar with tin-silver cap A", thickness: 12, stress: 200, coverage: 0.06 },
    ],
  },
];

/** Puts a demo stack into its program. A stress that differs from the film's own is kept as this stack's. */
export async function addDemoStack(
  em: EntityManager,
  program: Program,
  { name, note, silicon, thickness, layers }: DemoStack,
  films: Map<string, Film>,
): Promise<void> {
  const wafer = await em.findOneOrFail(Silicon, { name: silicon });
  const stack = em.create(Stack, {
    ...delivered(),
    program,
    name,
    note,
    silicon: wafer,
    siliconThickness: measured(thickness * 1e-6, 3e-6, "supplier", "grinder and polisher specification"),
  });
  for (const [position, layer] of layers.entries()) {
    const film = films.get(layer.film);
    if (!film) throw new Error(`The demo names a film that is not in the library: ${layer.film}`);
    em.create(StackLayer, {
      id: randomUUID(),
      program,
      stack,
      side: layer.side,
      position,
      film,
      thickness: measured(layer.thickness * 1e-6, layer.thickness * 0.03e-6, "measured here"),
      stress: stressFor(film, layer.stress),
      coverage: layer.coverage,
    });
  }
}

/** The stress of an addition, MPa, as its own when it differs from the film's. */
export function stressFor(film: Film, stress: number | undefined) {
  if (stress === undefined) return null;
  const pascals = stress * 1e6;
  return film.stress.value === pascals
    ? null
    : measured(pascals, Math.max(3e6, Math.abs(pascals) * 0.05), "measured here", "state at this point of the flow");
}
