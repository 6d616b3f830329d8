import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import type { Flow } from "#app/db/entities/flow.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { conflictOf, saving, touch, type Saved } from "../record.server.ts";
import { findFlow } from "./read-flow.server.ts";

/** More steps than any line runs; keeps one form from filling the database. */
const MOST_STEPS = 300;

interface StepPlace {
  flowId: string;
  /** version of the flow that the person saw; a newer one is a conflict */
  version: number | null;
}

/** Opens a flow for a change of its steps: found, allowed, and still as the person saw it. */
async function openFlow(em: EntityManager, scope: ActorScope, { flowId, version }: StepPlace) {
  const flow = await findFlow(em, scope, flowId);
  requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
  const steps = await em.find(FlowStep, { flow: flow.id }, { orderBy: { position: "asc" } });
  return { flow, steps, conflict: conflictOf(flow, version) };
}

function requireRoom(steps: FlowStep[]): void {
  if (steps.length >= MOST_STEPS)
    throw problem(400, `A flow holds at most ${MOST_STEPS} steps. Split it into two flows.`);
}

/** Adds a step before `position` (from 0), or changes the one named. */
export async function saveStep(
  scope: ActorScope,
  place: StepPlace & { stepId: string | null; position: number },
  values: StepValues,
): Promise<Saved> {
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const { flow, steps, conflict } = await openFlow(em, scope, place);
      if (conflict) return { outcome: "conflict", conflict };
      const known = steps.find(({ id }) => id === place.stepId) ?? null;
      if (place.stepId !== null && !known) throw notFound("step");
      if (!known) requireRoom(steps);
      const step = known ?? (await addStep(em, flow, steps.length, values));
      if (known) {
        em.assign(known, await stepColumns(em, values), { mergeObjectProperties: false });
        await replaceFilms(em, flow, known, values.films);
      } else renumber([...steps.slice(0, place.position), step, ...steps.slice(place.position)]);
      touch(flow, scope);
      await em.flush();
      return { outcome: "saved", id: step.id };
    }),
  );
}

/** Creates a step at a position that the caller keeps free. */
export async function addStep(em: EntityManager, flow: Flow, position: number, values: StepValues): Promise<FlowStep> {
  const columns = await stepColumns(em, values);
  const step = em.create(FlowStep, { id: randomUUID(), program: flow.program, flow, position, ...columns });
  await addFilms(em, flow, step, values.films);
  return step;
}

export const STEP_MOVES = ["up", "down", "remove", "copy"] as const;
export type StepMove = (typeof STEP_MOVES)[number];

/** Moves, copies or removes a step; the answer names the step that is there to be looked at, of a copy the copy. */
export async function changeStep(
  scope: ActorScope,
  place: StepPlace & { stepId: string },
  move: StepMove,
): Promise<Saved> {
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const { flow, steps, conflict } = await openFlow(em, scope, place);
      if (conflict) return { outcome: "conflict", conflict };
      const at = steps.findIndex(({ id }) => id === place.stepId);
      const step = steps[at];
      if (!step) throw notFound("step");
      const others = steps.filter(({ id }) => id !== step.id);
      let shown = step;
      if (move === "remove") {
        em.remove(step);
        renumber(others);
      } else if (move === "copy") {
        requireRoom(steps);
        const copy = await copyStep(em, step, { flow, title: `${step.title}, again`.slice(0, 120) });
        renumber([...steps.slice(0, at + 1), copy, ...steps.slice(at + 1)]);
        shown = copy;
      } else {
        const to = Math.min(Math.max(0, move === "up" ? at - 1 : at + 1), others.length);
        // The first cannot go further up, the last no further down: nothing has changed then.
        if (to === at) return { outcome: "saved", id: step.id };
        renumber([...others.slice(0, to), step, ...others.slice(to)]);
      }
      touch(flow, scope);
      await em.flush();
      return { outcome: "saved", id: shown.id };
    }),
  );
}

function renumber(steps: FlowStep[]): void {
  steps.forEach((step, position) => {
    step.position = position;
  });
}

async function named<Entity extends { id: string }>(
  found: Promise<Entity | null> | null,
  id: string | null,
  what: string,
): Promise<Entity | null> {
  const entity = await found;
  if (id !== null && !entity) throw notFound(what);
  return entity;
}

async function stepColumns(em: EntityManager, values: StepValues) {
  const { films: _films, equipment, carrier, bondingMaterial, ...columns } = values;
  return {
    ...columns,
    equipment: await named(equipment ? em.findOne(Equipment, { id: equipment }) : null, equipment, "tool"),
    carrier: await named(carrier ? em.findOne(Carrier, { id: carrier }) : null, carrier, "carrier"),
    bondingMaterial: await named(
      bondingMaterial ? em.findOne(BondingMaterial, { id: bondingMaterial }) : null,
      bondingMaterial,
      "bonding material",
    ),
  };
}

async function replaceFilms(
  em: EntityManager,
  flow: Flow,
  step: FlowStep,
  changes: StepValues["films"],
): Promise<void> {
  for (const old of await em.find(FlowStepFilm, { step: step.id })) em.remove(old);
  await addFilms(em, flow, step, changes);
}

async function addFilms(em: EntityManager, flow: Flow, step: FlowStep, changes: StepValues["films"]): Promise<void> {
  const films = await em.find(Film, { id: { $in: changes.map(({ film }) => film) } });
  for (const [position, change] of changes.entries()) {
    const film = films.find(({ id }) => id === change.film);
    if (!film) throw notFound("film");
    const adds = change.change === "adds";
    em.create(FlowStepFilm, {
      id: randomUUID(),
      program: flow.program,
      step,
      position,
      change: change.change,
      side: change.side,
      film,
      thickness: adds ? change.thickness : null,
      stress: adds ? change.stress : null,
      coverage: adds ? (change.coverage ?? 1) : 1,
    });
  }
}

/** A copy of a step with its films, in the same or another flow of the program. */
export async function copyStep(
  em: EntityManager,
  step: FlowStep,
  changes: { flow: Flow; title?: string },
): Promise<FlowStep> {
  const copy = em.create(FlowStep, { ...step, ...changes, id: randomUUID() });
  for (const film of await em.find(FlowStepFilm, { step: step.id })) {
    em.create(FlowStepFilm, { ...film, id: randomUUID(), step: copy });
  }
  return copy;
}
