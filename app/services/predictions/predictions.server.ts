import type { EntityManager } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { parityWorking } from "#app/engine/profile/lot-figures/working.ts";
import { readListParams, type ListParams } from "#app/lib/list-params.ts";
import { chosenPoints, compared, pageOfPoints, PREDICTION_SORTS } from "#app/lib/predictions.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { PREDICTED, type Predicted, type PredictionPoint, type Predictions } from "#app/schemas/prediction.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { isUuid } from "../uuid.server.ts";
import { bowPoints } from "./bow-points.server.ts";
import { stressPoints } from "./stress-points.server.ts";

interface Asked {
  of: Predicted | null;
  params: ListParams;
}

function readAsked(search: URLSearchParams): Asked {
  const params = readListParams(search, {
    sorts: PREDICTION_SORTS,
    filters: ["program", "film", "flow"],
    descending: true,
  });
  return { of: PREDICTED.find((kind) => kind === search.get("of")) ?? null, params };
}

/**
 * Predicted against measured in the person's own programs: bows after steps, and stresses of films.
 * @throws 403 for somebody who may see no program's work
 */
export async function predictionsPage(scope: ActorScope, search: URLSearchParams): Promise<Predictions> {
  const asked = readAsked(search);
  return inScope(scope, async (em) => {
    const { of, points, counts, filters } = await read(em, scope, asked);
    const found = compared(points);
    const working = found && parityWorking(points.map(withStep), of === "bow" ? "m" : "Pa");
    return {
      of,
      page: pageOfPoints(chosenPoints(points, asked.params), asked.params),
      points,
      all: found?.all ?? null,
      groups: found?.groups ?? [],
      flows: found?.flows ?? [],
      working: working && shownWorking(working),
      counts,
      filters,
    };
  });
}

const withStep = ({ group, flow: _, ...point }: PredictionPoint) => ({ step: group, ...point });

/** The points that the filters and the search leave, all pages of them. */
export async function predictionPoints(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ of: Predicted; points: PredictionPoint[] }> {
  const asked = readAsked(search);
  return inScope(scope, async (em) => {
    const { of, points } = await read(em, scope, asked);
    return { of, points: chosenPoints(points, asked.params) };
  });
}

async function read(em: EntityManager, scope: ActorScope, { of, params }: Asked) {
  requireInSomeProgram(scope, "see the work");
  const mine = programsWhere(scope.actor, "see the work");
  const { program = "", film = "", flow = "" } = params.filters;
  const programs = mine.filter(({ programSlug }) => !program || programSlug === program).map((each) => each.programId);
  const { films, flows } = await narrowed(em, programs, { film, flow });
  const found = { bow: await bowPoints(em, programs, flows), stress: await stressPoints(em, programs, films) };
  const kind = of ?? (found.bow.length > 0 || found.stress.length === 0 ? "bow" : "stress");
  return {
    of: kind,
    points: found[kind],
    counts: { bow: found.bow.length, stress: found.stress.length },
    filters: await choices(em, mine),
  };
}

/**
 * The films and flows that the filters leave; null for all of them. A film stands for the flows that put it down, a flow for the
 * films that it puts down. An id that is none leaves nothing.
 */
async function narrowed(em: EntityManager, programs: readonly string[], asked: { film: string; flow: string }) {
  const { film, flow } = asked;
  if (!film && !flow) return { films: null, flows: null };
  if ([film, flow].some((id) => id && !isUuid(id)) || programs.length === 0)
    return { films: new Set<string>(), flows: new Set<string>() };
  const pairs = await em.execute<{ film_id: string; flow_id: string }[]>(
    `select distinct used.film_id, step.flow_id from flow_step_film used join flow_step step on step.id = used.step_id
      where step.program_id in (?)`,
    [[...programs]],
  );
  const kept = pairs.filter((pair) => (!film || pair.film_id === film) && (!flow || pair.flow_id === flow));
  return {
    films: film && !flow ? new Set([film]) : new Set(kept.map(({ film_id }) => film_id)),
    flows: flow && !film ? new Set([flow]) : new Set(kept.map(({ flow_id }) => flow_id)),
  };
}

async function choices(em: EntityManager, mine: ReturnType<typeof programsWhere>): Promise<Predictions["filters"]> {
  const films = await em.find(Film, {}, { fields: ["id", "name"], orderBy: { name: "asc" } });
  const flows = await em.find(
    Flow,
    { program: { $in: mine.map(({ programId }) => programId) } },
    { fields: ["id", "name"], orderBy: { name: "asc" } },
  );
  const choice = ({ id, name }: { id: string; name: string }) => ({ value: id, label: name });
  return {
    programs: mine.map(({ programName, programSlug }) => ({ value: programSlug, label: programName })),
    films: films.map(choice),
    flows: flows.map(choice),
  };
}
