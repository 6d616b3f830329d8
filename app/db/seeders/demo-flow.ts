import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { BLANK_HANDLING } from "#app/lib/blank-step.ts";
import { FlowStepFilm } from "../entities/flow-step-film.ts";
import { FlowStep } from "../entities/flow-step.ts";
import { Flow } from "../entities/flow.ts";
import type { Program } from "../entities/program.ts";
import type { DemoFlow } from "./demo-flows.ts";
import { stressFor } from "./demo-stacks.ts";
import type { DemoStep } from "./demo-step.ts";
import { celsius, measured } from "./measured.ts";
import { delivered } from "./reference-seeder.ts";
import type { SeedLibrary } from "./seed-library.ts";

/** A demo flow with all its steps. */
export function addDemoFlow(em: EntityManager, program: Program, demo: DemoFlow, library: SeedLibrary): void {
  const flow = em.create(Flow, {
    ...delivered(),
    program,
    name: demo.name,
    note: demo.note,
    silicon: library.silicon(demo.silicon),
    waferKind: "silicon wafer",
    gateBow: null,
    gateWarp: null,
    incomingThickness: measured(demo.incoming * 1e-6, 15e-6, "measured here", "incoming check"),
  });
  for (const [position, step] of demo.steps.entries()) {
    const entity = em.create(FlowStep, {
      id: randomUUID(),
      program,
      flow,
      position,
      kind: step.kind,
      title: step.title,
      peakTemperature: celsius(step.peak),
      holdTime: step.minutes === undefined ? null : step.minutes * 60,
      equipment: library.tool(step.equipment),
      exposures: step.exposures ?? [],
      planned: step.planned,
      siliconAfter: step.silicon
        ? measured(step.silicon.thickness * 1e-6, step.silicon.tolerance * 1e-6, "supplier", "grinder specification")
        : null,
      trimWidth: step.trim ? measured(step.trim.width * 1e-3, 0.05e-3, "supplier") : null,
      trimDepth: step.trim ? measured(step.trim.depth * 1e-6, 10e-6, "supplier") : null,
      carrier: step.bond ? library.carrier(step.bond.carrier) : null,
      bondingMaterial: step.bond ? library.material(step.bond.material) : null,
      bondThickness: step.bond ? measured(step.bond.thickness * 1e-6, 2e-6, "supplier", "coater recipe") : null,
      handling: { ...BLANK_HANDLING, ...step.handling },
      groundFaceForce: step.groundFaceForce === undefined ? null : faceForce(step.groundFaceForce),
    });
    addStepFilms(em, program, entity, step, library);
  }
}

const faceForce = (force: number) => measured(force, Math.abs(force) / 2, "handbook", "common practice, no source");

function addStepFilms(
  em: EntityManager,
  program: Program,
  step: FlowStep,
  { adds = [], removes = [] }: DemoStep,
  library: SeedLibrary,
): void {
  const off = removes.map(({ side, film }) => ({
    change: "removes" as const,
    side,
    film: library.film(film),
    thickness: null,
    stress: null,
    coverage: 1,
  }));
  const on = adds.map(({ side, film, thickness, stress, coverage }) => ({
    change: "adds" as const,
    side,
    film: library.film(film),
    thickness: measured(thickness * 1e-6, thickness * 0.03e-6, "measured here"),
    stress: stressFor(library.film(film), stress),
    coverage,
  }));
  for (const [position, change] of [...off, ...on].entries())
    em.create(FlowStepFilm, { id: randomUUID(), program, step, position, ...change });
}
