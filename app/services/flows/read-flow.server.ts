import type { EntityManager, Loaded } from "@mikro-orm/postgresql";
import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { FlowDetail, StepDetail, StepFilmDetail } from "#app/schemas/flow-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { stampOf } from "../record.server.ts";
import { stressRecordOf } from "#app/lib/library-handling.ts";
import { bondingMaterialInput, carrierInput, equipmentInput, filmInput } from "./flow-inputs.ts";

type LoadedFlow = Loaded<Flow, "program" | "silicon" | "updatedBy">;

/** The flow that an id names, if the person may see it. */
export async function findFlow(em: EntityManager, scope: ActorScope, id: string): Promise<LoadedFlow> {
  const flow = await em.findOne(Flow, { id }, { populate: ["program", "silicon", "updatedBy"] });
  if (!flow) throw notFound("flow");
  requireInProgram(scope, "see the work", flow.program.id, "flow");
  return flow;
}

/** A flow with its steps, in order. */
export async function readFlow(em: EntityManager, scope: ActorScope, id: string): Promise<FlowDetail> {
  const flow = await findFlow(em, scope, id);
  return {
    ...(await flowDetailOf(em, flow)),
    mayEdit: mayInProgram(scope.actor, "edit stacks and flows", flow.program.id),
    mayAssess: mayInProgram(scope.actor, "run assessments", flow.program.id),
  };
}

/** What a flow is, whoever asks: its head, with program, silicon and last editor loaded, and its steps in order. */
export async function flowDetailOf(
  em: EntityManager,
  flow: LoadedFlow,
): Promise<Omit<FlowDetail, "mayEdit" | "mayAssess">> {
  const steps = await em.find(
    FlowStep,
    { flow: flow.id },
    { populate: ["equipment", "carrier", "bondingMaterial"], orderBy: { position: "asc" } },
  );
  const films = await em.find(
    FlowStepFilm,
    { step: { $in: steps.map((step) => step.id) } },
    { populate: ["film"], orderBy: { position: "asc" } },
  );
  const { program, silicon } = flow;
  return {
    id: flow.id,
    name: flow.name,
    note: flow.note,
    program: { id: program.id, name: program.name, slug: program.slug },
    silicon: {
      id: silicon.id,
      name: silicon.name,
      diameter: silicon.diameter,
      orientation: silicon.orientation,
    },
    incomingThickness: flow.incomingThickness,
    steps: steps.map((step) =>
      stepDetail(
        step,
        films.filter((film) => film.step.id === step.id),
      ),
    ),
    stamp: stampOf(flow),
  };
}

function stepDetail(step: FlowStep, films: FlowStepFilm[]): StepDetail {
  return {
    id: step.id,
    kind: step.kind,
    title: step.title,
    peakTemperature: step.peakTemperature,
    holdTime: step.holdTime ?? null,
    equipment: step.equipment ? equipmentInput(step.equipment) : null,
    exposures: step.exposures,
    planned: step.planned,
    siliconAfter: step.siliconAfter ?? null,
    trimWidth: step.trimWidth ?? null,
    trimDepth: step.trimDepth ?? null,
    carrier: step.carrier ? carrierInput(step.carrier) : null,
    bondingMaterial: step.bondingMaterial ? bondingMaterialInput(step.bondingMaterial) : null,
    bondThickness: step.bondThickness ?? null,
    groundFaceForce: step.groundFaceForce ?? null,
    films: films.map((film): StepFilmDetail => ({
      change: film.change,
      side: film.side,
      film: filmInput(film.film),
      thickness: film.thickness ?? null,
      ownStress: film.stress ?? null,
      stress: film.stress ?? film.film.stress,
      stressRecord: film.stress ? null : stressRecordOf(film.film),
      coverage: film.coverage,
    })),
  };
}
