import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { FlowStepFilm } from "../entities/flow-step-film.ts";
import { FlowStep } from "../entities/flow-step.ts";
import { Flow } from "../entities/flow.ts";
import type { Program } from "../entities/program.ts";
import type { DemoFlow } from "./demo-flows.ts";
import { measured } from "./measured.ts";
import { delivered } from "./reference-seeder.ts";
import type { SeedLibrary } from "./seed-library.ts";
import { seedStep } from "./seed-step.ts";

/** A demo flow with all its steps. */
export function addDemoFlow(em: EntityManager, program: Program, demo: DemoFlow, library: SeedLibrary): void {
  const flow = em.create(Flow, {
    ...delivered(),
    program,
    name: demo.name,
    note: demo.note,
    silicon: library.silicon(demo.silicon),
    incomingBowAlong: null,
    incomingBowAcross: null,
    incomingFilmShare: null,
    waferKind: "silicon wafer",
    gateBow: null,
    gateWarp: null,
    incomingThickness: measured(demo.incoming * 1e-6, 15e-6, "measured here", "incoming check"),
  });
  for (const [position, demoStep] of demo.steps.entries()) {
    const { films, ...columns } = seedStep(demoStep, library);
    const step = em.create(FlowStep, { id: randomUUID(), program, flow, position, ...columns });
    for (const [at, { coverage, ...change }] of films.entries())
      em.create(FlowStepFilm, { id: randomUUID(), program, step, position: at, coverage: coverage ?? 1, ...change });
  }
}
