import { randomUUID } from "node:crypto";
import { isDeepStrictEqual } from "node:util";
import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import type { Flow } from "#app/db/entities/flow.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import { Tape } from "#app/db/entities/tape.ts";
import { BLANK_HANDLING, completeStep } from "#app/lib/blank-step.ts";
import type { FlowPlan, StepPlan } from "#app/schemas/flow-plan.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { notFound } from "#app/server/problem.server.ts";

/** A flow's plan with the rows that hold it. */
export interface StoredPlan {
  plan: FlowPlan;
  steps: Map<string, FlowStep>;
  films: Map<string, FlowStepFilm[]>;
}

/** A flow as the value that a person edits. */
export async function readPlan(em: EntityManager, flow: Flow): Promise<StoredPlan> {
  const [stored] = await readPlans(em, [flow]);
  if (!stored) throw notFound("flow");
  return stored;
}

/** Plans of flows, in their order; as many queries for many as for one. */
export async function readPlans(em: EntityManager, flows: Flow[]): Promise<StoredPlan[]> {
  const allSteps = await em.find(
    FlowStep,
    { flow: { $in: flows.map(({ id }) => id) } },
    { orderBy: { position: "asc" } },
  );
  const films = new Map(allSteps.map(({ id }): [string, FlowStepFilm[]] => [id, []]));
  for (const film of await em.find(
    FlowStepFilm,
    { step: { $in: [...films.keys()] } },
    { orderBy: { position: "asc" } },
  ))
    films.get(film.step.id)?.push(film);
  const stepsOf = new Map(flows.map(({ id }): [string, FlowStep[]] => [id, []]));
  for (const step of allSteps) stepsOf.get(step.flow.id)?.push(step);
  return flows.map((flow) => storedPlan(flow, stepsOf.get(flow.id) ?? [], films));
}

/** The shape that a flow's wafer comes in with. */
export function incomingShape({ incomingBowAlong, incomingBowAcross, incomingFilmShare }: Flow) {
  return {
    incomingBowAlong: incomingBowAlong ?? null,
    incomingBowAcross: incomingBowAcross ?? null,
    incomingFilmShare: incomingFilmShare ?? null,
  };
}

function storedPlan(flow: Flow, steps: FlowStep[], films: Map<string, FlowStepFilm[]>): StoredPlan {
  const { name, note, silicon, incomingThickness, waferKind } = flow;
  return {
    plan: {
      name,
      note,
      silicon: silicon.id,
      incomingThickness,
      ...incomingShape(flow),
      waferKind,
      gateBow: flow.gateBow ?? null,
      gateWarp: flow.gateWarp ?? null,
      steps: steps.map((step) => stepPlan(step, films.get(step.id) ?? [])),
    },
    steps: new Map(steps.map((step) => [step.id, step])),
    films: new Map(steps.map(({ id }) => [id, films.get(id) ?? []])),
  };
}

function stepPlan(step: FlowStep, films: FlowStepFilm[]): StepPlan {
  return {
    id: step.id,
    title: step.title,
    kind: step.kind,
    peakTemperature: step.peakTemperature,
    holdTime: step.holdTime ?? null,
    equipment: step.equipment?.id ?? null,
    exposures: step.exposures,
    planned: step.planned,
    siliconAfter: step.siliconAfter ?? null,
    trimWidth: step.trimWidth ?? null,
    trimDepth: step.trimDepth ?? null,
    carrier: step.carrier?.id ?? null,
    bondingMaterial: step.bondingMaterial?.id ?? null,
    bondThickness: step.bondThickness ?? null,
    groundFaceForce: step.groundFaceForce ?? null,
    tape: step.tape?.id ?? null,
    handling: { ...BLANK_HANDLING, ...step.handling },
    films: films.map(({ change, side, film, thickness, stress, coverage, lines }) => ({
      change,
      side,
      film: film.id,
      thickness: thickness ?? null,
      stress: stress ?? null,
      coverage: change === "adds" ? coverage : null,
      lines: (change === "adds" && lines) || null,
    })),
  };
}

/** Of a film only what an addition has; a coverage left blank is all of the area. */
const settled = (films: StepValues["films"]): StepValues["films"] =>
  films.map(({ change, side, film, thickness, stress, coverage, lines }) =>
    change === "adds"
      ? { change, side, film, thickness, stress, coverage: coverage ?? 1, lines: lines ?? null }
      : { change, side, film, thickness: null, stress: null, coverage: null, lines: null },
  );

/** Writes what differs between the plan that is stored and the one that is to be. */
export async function writePlan(em: EntityManager, flow: Flow, stored: StoredPlan, next: FlowPlan): Promise<void> {
  if (next.silicon !== flow.silicon.id)
    flow.silicon = await required(em.findOne(Silicon, { id: next.silicon }), "silicon wafer");
  const { silicon: _silicon, steps, ...head } = next;
  em.assign(flow, head, { mergeObjectProperties: false });
  const before = new Map(stored.plan.steps.map((step) => [step.id, step]));
  const kept = new Set(steps.map(({ id }) => id));
  for (const [id, step] of stored.steps) if (!kept.has(id)) em.remove(step);
  for (const [position, { id, ...typed }] of steps.map(completeStep).entries()) {
    const values = { ...typed, films: settled(typed.films) };
    const known = stored.steps.get(id);
    const was = before.get(id);
    if (!known || !was) {
      const step = em.create(FlowStep, {
        id,
        program: flow.program,
        flow,
        position,
        ...(await stepColumns(em, values)),
      });
      await addFilms(em, step, values.films);
      continue;
    }
    known.position = position;
    if (isDeepStrictEqual({ ...was }, { id, ...values })) continue;
    em.assign(known, await stepColumns(em, values), { mergeObjectProperties: false });
    if (isDeepStrictEqual(was.films, values.films)) continue;
    for (const film of stored.films.get(id) ?? []) em.remove(film);
    await addFilms(em, known, values.films);
  }
}

async function required<Entity>(found: Promise<Entity | null>, what: string): Promise<Entity> {
  const entity = await found;
  if (!entity) throw notFound(what);
  return entity;
}

async function stepColumns(em: EntityManager, values: StepValues) {
  const { films: _films, equipment, carrier, bondingMaterial, tape, ...columns } = values;
  return {
    ...columns,
    equipment: equipment ? await required(em.findOne(Equipment, { id: equipment }), "tool") : null,
    carrier: carrier ? await required(em.findOne(Carrier, { id: carrier }), "carrier") : null,
    bondingMaterial: bondingMaterial
      ? await required(em.findOne(BondingMaterial, { id: bondingMaterial }), "bonding material")
      : null,
    tape: tape ? await required(em.findOne(Tape, { id: tape }), "tape") : null,
  };
}

async function addFilms(em: EntityManager, step: FlowStep, changes: StepValues["films"]): Promise<void> {
  for (const [position, { film, coverage, ...change }] of changes.entries())
    em.create(FlowStepFilm, {
      id: randomUUID(),
      program: step.program,
      step,
      position,
      ...change,
      film: await required(em.findOne(Film, { id: film }), "film"),
      coverage: coverage ?? 1,
    });
}
