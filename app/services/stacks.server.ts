import { randomUUID } from "node:crypto";
import { raw, type EntityManager, type QueryOrderMap } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import { StackLayer } from "#app/db/entities/stack-layer.ts";
import { Stack } from "#app/db/entities/stack.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import type { CutFilm } from "#app/lib/film-cut.ts";
import { coverRequest } from "#app/lib/stack-of-request.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import { mayInProgram, programsWhere, type ProgramPermission } from "#app/policies/permissions.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import type { StackRow } from "#app/schemas/stack-row.ts";
import type { StackValues } from "#app/schemas/stack.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { answerOrNull } from "./estimate-answer.ts";
import { favouriteIds } from "./kept/favourites.server.ts";
import { everyWord } from "./like.server.ts";
import { readLimits } from "./limits.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { programFilter } from "./program-filter.server.ts";
import { conflictOf, newRecord, saving, stampOf, touch, type Saved } from "./record.server.ts";
import { idFrom } from "./uuid.server.ts";

export const STACK_SORTS = ["updated", "name", "program", "thickness"] as const;

export interface StackLayerDetail extends Required<CutFilm> {
  side: Side;
  filmId: string;
  filmName: string;
  filmKind: string;
  thickness: Measured;
  /** this stack's own, when it has one */
  ownStress: Measured | null;
  /** the one that counts: own, else the film's */
  stress: Measured;
  youngsModulus: number;
  poissonsRatio: number;
  expansion: number;
}

export interface StackDetail {
  id: string;
  name: string;
  note: string;
  program: { id: string; name: string; slug: string };
  silicon: { id: string; name: string; diameter: number; orientation: "100" | "111"; nominalThickness: number };
  siliconThickness: Measured;
  layers: StackLayerDetail[];
  stamp: RecordStamp;
  mayEdit: boolean;
}

function layerDetail(layer: StackLayer): StackLayerDetail {
  const { film } = layer;
  return {
    side: layer.side,
    filmId: film.id,
    filmName: film.name,
    filmKind: film.kind,
    thickness: layer.thickness,
    ownStress: layer.stress ?? null,
    stress: layer.stress ?? film.stress,
    youngsModulus: film.youngsModulus.value,
    poissonsRatio: film.poissonsRatio.value,
    expansion: film.expansion.value,
    coverage: layer.coverage,
    lines: layer.lines ?? null,
  };
}

/** What to ask for a stored stack at 25 °C. */
export function requestOf({ silicon, siliconThickness, layers }: StackDetail): EstimateRequest {
  return {
    wafer: {
      diameter_m: silicon.diameter,
      orientation: silicon.orientation,
      thickness_m: siliconThickness.value,
      thickness_tolerance_m: siliconThickness.tolerance ?? undefined,
    },
    films: layers.map((layer) => ({
      side: layer.side,
      thickness_m: layer.thickness.value,
      stress_Pa: layer.stress.value,
      youngs_modulus_Pa: layer.youngsModulus,
      poissons_ratio: layer.poissonsRatio,
      cte_per_K: layer.expansion,
      ...coverRequest(layer),
      thickness_tolerance_m: layer.thickness.tolerance ?? undefined,
      stress_tolerance_Pa: layer.stress.tolerance ?? undefined,
    })),
  };
}

async function layersByStack(em: EntityManager, stackIds: string[]): Promise<Map<string, StackLayerDetail[]>> {
  const layers = await em.find(
    StackLayer,
    { stack: { $in: stackIds } },
    { populate: ["film"], orderBy: { side: "desc", position: "asc" } },
  );
  const found = new Map<string, StackLayerDetail[]>(stackIds.map((id) => [id, []]));
  for (const layer of layers) found.get(layer.stack.id)?.push(layerDetail(layer));
  return found;
}

function detailOf(stack: Stack, layers: StackLayerDetail[], scope: ActorScope): StackDetail {
  const { program, silicon } = stack;
  return {
    id: stack.id,
    name: stack.name,
    note: stack.note,
    program: { id: program.id, name: program.name, slug: program.slug },
    silicon: {
      id: silicon.id,
      name: silicon.name,
      diameter: silicon.diameter,
      orientation: silicon.orientation,
      nominalThickness: silicon.thickness.value,
    },
    siliconThickness: stack.siliconThickness,
    layers,
    stamp: stampOf(stack),
    mayEdit: mayInProgram(scope.actor, "edit stacks and flows", program.id),
  };
}

/** How lists of stacks sort in the database, by the name used in the address. */
const ORDERS: Record<(typeof STACK_SORTS)[number], (direction: "asc" | "desc") => QueryOrderMap<Stack>> = {
  updated: (direction) => ({ updatedAt: direction }),
  name: (direction) => ({ [raw((alias) => `lower(${alias}.name)`)]: direction }),
  program: (direction) => ({ program: { name: direction } }),
  thickness: (direction) => ({
    [raw((alias) => `(${alias}.silicon_thickness->>'value')::double precision`)]: direction,
  }),
};

/** A page of the stacks that the person may see, each with what its free wafer does, and up to which warp (m) it is called flat. */
export async function listStacks(
  scope: ActorScope,
  params: ListParams,
): Promise<ListPage<StackRow> & { flatWithin: number }> {
  requireSomewhere(scope, "see the work");
  return inScope(scope, async (em) => {
    const order = ORDERS[STACK_SORTS.find((name) => name === params.sort) ?? "updated"];
    const [stacks, total] = await em.findAndCount(
      Stack,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(params.filters["favourites"] ? { id: { $in: await favouriteIds(em, scope, "stack") } } : {}),
        ...(params.query ? everyWord(params.query, (name) => ({ name })) : {}),
      },
      {
        populate: ["program", "silicon", "updatedBy"],
        orderBy: [order(params.descending ? "desc" : "asc"), { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const layers = await layersByStack(
      em,
      stacks.map(({ id }) => id),
    );
    const limits = await readLimits(em);
    const rows = stacks.map((stack): StackRow => {
      const detail = detailOf(stack, layers.get(stack.id) ?? [], scope);
      return {
        id: stack.id,
        name: stack.name,
        program: stack.program.name,
        diameter: stack.silicon.diameter,
        thickness: stack.siliconThickness.value,
        films: detail.layers.length,
        updatedAt: detail.stamp.updatedAt,
        updatedBy: detail.stamp.updatedBy,
        answer: answerOrNull(requestOf(detail), limits),
      };
    });
    return { rows, total, params, flatWithin: limits.flatWithin.value };
  });
}

/** Refuses who may do this in no program at all. */
function requireSomewhere({ actor }: ActorScope, permission: ProgramPermission): void {
  if (programsWhere(actor, permission).length === 0)
    throw problem(403, `Your role may not ${permission} in any program. Ask a process owner.`);
}

/** Programs in which the person may add a stack; refuses who may in none. */
export function programsForNewStack(scope: ActorScope): { id: string; name: string }[] {
  requireSomewhere(scope, "edit stacks and flows");
  return programsWhere(scope.actor, "edit stacks and flows").map(({ programId, programName }) => ({
    id: programId,
    name: programName,
  }));
}

/** One stack, whole. @throws 404 for what is not there or not the person's to see */
export async function getStack(scope: ActorScope, id: string | undefined): Promise<StackDetail> {
  const stack = await findStack(scope, idFrom(id, "stack"));
  if (!stack) throw notFound("stack");
  return stack;
}

/** One stack, or null for what is not there or not the person's to see. */
export async function findStack(scope: ActorScope, id: string): Promise<StackDetail | null> {
  return inScope(scope, async (em) => {
    const stack = await em.findOne(Stack, { id }, { populate: ["program", "silicon", "updatedBy"] });
    if (!stack || !mayInProgram(scope.actor, "see the work", stack.program.id)) return null;
    const layers = await layersByStack(em, [stack.id]);
    return detailOf(stack, layers.get(stack.id) ?? [], scope);
  });
}

/** Those of some stacks that are there and the person's to see, in the order asked for. */
export async function findStacks(scope: ActorScope, ids: readonly string[]): Promise<StackDetail[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const stacks = await em.find(
      Stack,
      { id: { $in: [...ids] }, program: { $in: programs } },
      { populate: ["program", "silicon", "updatedBy"] },
    );
    const layers = await layersByStack(
      em,
      stacks.map(({ id }) => id),
    );
    return ids.flatMap((id) =>
      stacks.filter((stack) => stack.id === id).map((stack) => detailOf(stack, layers.get(id) ?? [], scope)),
    );
  });
}

/** Names of the stacks that the person may lay over another, newest first. */
export async function stackChoices(scope: ActorScope): Promise<{ id: string; name: string; program: string }[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const stacks = await em.find(
      Stack,
      { program: { $in: programs } },
      { populate: ["program"], orderBy: { updatedAt: "desc" }, limit: 200 },
    );
    return stacks.map(({ id, name, program }) => ({ id, name, program: program.name }));
  });
}

/** Adds or changes a stack with all its layers, in one transaction. */
export async function saveStack(
  scope: ActorScope,
  { id, version, values }: { id: string | null; version: number | null; values: StackValues },
): Promise<Saved> {
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const stack = id === null ? null : await em.findOne(Stack, { id }, { populate: ["updatedBy", "program"] });
      if (id !== null && !stack) throw notFound("stack");
      const programId = stack?.program.id ?? values.program;
      requireInProgram(scope, "edit stacks and flows", programId, id === null ? "program" : "stack");
      const conflict = stack && conflictOf(stack, version);
      if (conflict) return { outcome: "conflict", conflict };
      const namesake = await em.findOne(Stack, { program: programId, name: values.name });
      if (namesake && namesake.id !== id) return { outcome: "name taken" };

      const silicon = await em.findOne(Silicon, { id: values.silicon });
      if (!silicon) throw notFound("silicon wafer");
      const columns = {
        name: values.name,
        note: values.note,
        silicon,
        siliconThickness: values.siliconThickness,
      };
      const saved = stack ?? em.create(Stack, { ...newRecord(scope), program: programId, ...columns });
      if (stack) {
        em.assign(stack, columns);
        touch(stack, scope);
      }
      await replaceLayers(em, saved, values.layers);
      await em.flush();
      return { outcome: "saved", id: saved.id };
    }),
  );
}

/** Films have no life of their own: a save writes them anew. The form lists them top to bottom, the table from the silicon outwards. */
async function replaceLayers(em: EntityManager, stack: Stack, layers: StackValues["layers"]): Promise<void> {
  const films = await em.find(Film, { id: { $in: layers.map(({ film }) => film) } });
  const known = new Map(films.map((film) => [film.id, film]));
  for (const old of await em.find(StackLayer, { stack: stack.id })) em.remove(old);
  const next: Record<Side, number> = { front: 0, back: 0 };
  for (const { side, film: filmId, thickness, stress, coverage, lines } of turnFront(layers)) {
    const film = known.get(filmId);
    if (!film) throw notFound("film");
    em.create(StackLayer, {
      id: randomUUID(),
      program: stack.program,
      stack,
      side,
      position: next[side]++,
      film,
      thickness,
      stress,
      coverage,
      lines,
    });
  }
}

/** Removes a stack. What was assessed from a flow does not depend on it. */
export async function removeStack(scope: ActorScope, id: string): Promise<void> {
  await inScope(scope, async (em) => {
    const stack = await em.findOne(Stack, { id }, { populate: ["program"] });
    if (!stack) throw notFound("stack");
    requireInProgram(scope, "edit stacks and flows", stack.program.id, "stack");
    for (const layer of await em.find(StackLayer, { stack: stack.id })) em.remove(layer);
    em.remove(stack);
    await em.flush();
  });
}
