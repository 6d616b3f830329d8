import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Equipment } from "../entities/equipment.ts";
import type { Film } from "../entities/film.ts";
import { FlowStepFilm } from "../entities/flow-step-film.ts";
import { FlowStep } from "../entities/flow-step.ts";
import { Flow } from "../entities/flow.ts";
import type { Program } from "../entities/program.ts";
import { Silicon } from "../entities/silicon.ts";
import { stressFor } from "./demo-stacks.ts";
import { TERN_STEPS, type DemoStep } from "./demo-tern.ts";
import { celsius, measured } from "./measured.ts";
import { delivered } from "./reference-seeder.ts";

/** The Tern flow, all nineteen steps. */
export async function addDemoFlow(em: EntityManager, program: Program, films: Map<string, Film>): Promise<void> {
  const equipment = new Map((await em.findAll(Equipment)).map((tool) => [tool.name, tool]));
  const flow = em.create(Flow, {
    ...delivered(),
    program,
    name: "Tern T-2, to 100 µm on tape",
    note: "One redistribution layer and balls; tape from the grind on.",
    silicon: await em.findOneOrFail(Silicon, { name: "Silicon (001), 200 mm, 725 µm" }),
    incomingThickness: measured(725e-6, 15e-6, "measured here", "incoming check"),
  });
  for (const [position, step] of TERN_STEPS.entries()) {
    const tool = equipment.get(step.equipment);
    if (!tool) throw new Error(`The demo names a tool that is not there: ${step.equipment}`);
    const entity = em.create(FlowStep, {
      id: randomUUID(),
      program,
      flow,
      position,
      kind: step.kind,
      title: step.title,
      peakTemperature: celsius(step.peak),
      holdTime: step.minutes === undefined ? null : step.minutes * 60,
      equipment: tool,
      exposures: step.exposures ?? [],
      planned: step.planned,
      siliconAfter: step.silicon
        ? measured(step.silicon.thickness * 1e-6, step.silicon.tolerance * 1e-6, "supplier", "grinder specification")
        : null,
      trimWidth: step.trim ? measured(step.trim.width * 1e-3, 0.05e-3, "supplier") : null,
      trimDepth: step.trim ? measured(step.trim.depth * 1e-6, 10e-6, "supplier") : null,
      carrier: null,
      bondingMaterial: null,
      bondThickness: null,
      groundFaceForce:
        step.groundFaceForce === undefined
          ? null
          : measured(
              step.groundFaceForce,
              Math.abs(step.groundFaceForce) / 2,
              "handbook",
              "common practice, no source",
            ),
    });
    addStepFilms(em, program, entity, step, films);
  }
}

function addStepFilms(
  em: EntityManager,
  program: Program,
  entity: FlowStep,
  { adds = [], removes = [] }: DemoStep,
  films: Map<string, Film>,
): void {
  const filmNamed = (name: string) => {
    const film = films.get(name);
    if (!film) throw new Error(`The demo names a film that is not in the library: ${name}`);
    return film;
  };
  const changes = [
    ...removes.map(({ side, film }) => ({ change: "removes" as const, side, film: filmNamed(film) })),
    ...adds.map((addition) => ({ change: "adds" as const, ...addition, film: filmNamed(addition.film) })),
  ];
  for (const [position, change] of changes.entries())
    em.create(FlowStepFilm, {
      id: randomUUID(),
      program,
      step: entity,
      position,
      change: change.change,
      side: change.side,
      film: change.film,
      thickness:
        change.change === "adds"
          ? measured(change.thickness * 1e-6, change.thickness * 0.03e-6, "measured here")
          : null,
      stress: change.change === "adds" ? stressFor(change.film, change.stress) : null,
      coverage: change.change === "adds" ? change.coverage : 1,
    });
}
