import type { EntityManager, Loaded } from "@mikro-orm/postgresql";
import { FilmStressInUse } from "#app/db/entities/film-stress-in-use.ts";
import { FilmStressValue } from "#app/db/entities/film-stress-value.ts";
import { Film } from "#app/db/entities/film.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { acceptedValueWorking } from "#app/engine/profile/lot-figures/working.ts";
import { meanInputs, stressMean } from "#app/lib/film-mean.ts";
import { readListParams, type ListParams } from "#app/lib/list-params.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import { chosenValues, pageOfValues, STRESS_SORTS, UNNAMED } from "#app/lib/stress-values.ts";
import { mayOnSite, programsWhere } from "#app/policies/permissions.ts";
import type { FilmStressHistory, StressInUseRow, StressOrigin, StressValueRow } from "#app/schemas/film-stress.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { usesMean } from "./film-values.server.ts";
import { chartOf, instrumentsOf } from "./stress-chart.ts";

/** Address parameters of the history on a film's page. */
const readHistoryParams = (search: URLSearchParams): ListParams =>
  readListParams(search, { sorts: STRESS_SORTS, filters: ["state", "instrument"], descending: true });

/**
 * The history of a film's stress. The library is the whole site's: of a scan that the person may not see there is the figure, its
 * day and its instrument, and neither wafer, program, reason nor link, and none of it is found by a search.
 * @throws 403 for somebody who may not see the library, 404 for no film
 */
export async function stressHistory(
  scope: ActorScope,
  filmId: string | undefined,
  search: URLSearchParams,
): Promise<FilmStressHistory> {
  const params = readHistoryParams(search);
  return inScope(scope, async (em) => {
    const { film, values, rows } = await read(em, scope, filmId);
    const instruments = instrumentsOf(rows);
    const instrument = instruments.find((name) => (name || UNNAMED) === params.filters["instrument"]) ?? instruments[0];
    const { readings, common } = meanInputs(values);
    return {
      film: { id: film.id, version: film.version },
      page: pageOfValues(rows, params),
      all: rows.length,
      instruments,
      chart: instrument === undefined ? null : chartOf(rows, instrument),
      mean: stressMean(values),
      meanWorking: readings.length === 0 ? null : shownWorking(acceptedValueWorking(readings, "Pa", common)),
      usesMean: usesMean(film),
      inUse: await inUseRows(em, film.id),
      mayEdit: mayOnSite(scope.actor, "edit films"),
    };
  });
}

/** The values that a search and filters leave of a film's history, all pages of them, with the film's name. */
export async function stressValues(
  scope: ActorScope,
  filmId: string | undefined,
  search: URLSearchParams,
): Promise<{ film: string; rows: StressValueRow[] }> {
  return inScope(scope, async (em) => {
    const { film, rows } = await read(em, scope, filmId);
    return { film: film.name, rows: chosenValues(rows, readHistoryParams(search)) };
  });
}

async function read(em: EntityManager, scope: ActorScope, filmId: string | undefined) {
  requireOnSite(scope, "see the library");
  const film = await em.findOne(Film, { id: idFrom(filmId, "film") });
  if (!film) throw notFound("film");
  const values = await em.find(
    FilmStressValue,
    { film },
    {
      populate: ["acceptedBy", "setAsideBy", "putBackBy"],
      orderBy: { measuredAt: "asc", acceptedAt: "asc", id: "asc" },
    },
  );
  return { film, values, rows: rowsOf(values, await originsOf(em, scope, values)) };
}

/** Scans behind the values that the person may see, by their ids. Filtered here as well as by the database. */
async function originsOf(
  em: EntityManager,
  { actor }: ActorScope,
  values: readonly FilmStressValue[],
): Promise<Map<string, StressOrigin>> {
  const ids = values.flatMap(({ scan }) => (scan ? [scan.id] : []));
  const programs = programsWhere(actor, "see the work").map(({ programId }) => programId);
  const scans = await em.find(Scan, { id: { $in: ids }, program: { $in: programs } }, { populate: ["program"] });
  return new Map(
    scans.map(({ id, label, program }) => [id, { kind: "scan", id, label, program: program.name } as const]),
  );
}

type Whole = Loaded<FilmStressValue, "acceptedBy" | "setAsideBy" | "putBackBy">;

function rowsOf(values: readonly Whole[], origins: ReadonlyMap<string, StressOrigin>): StressValueRow[] {
  const numbers = new Map<string, number>();
  return values.map((value) => {
    const number = (numbers.get(value.instrument) ?? 0) + 1;
    numbers.set(value.instrument, number);
    const origin: StressOrigin = value.scan
      ? (origins.get(value.scan.id) ?? { kind: "another program" })
      : { kind: "typed", source: value.source };
    return {
      id: value.id,
      version: value.version,
      number,
      value: value.value,
      standardUncertainty: value.standardUncertainty,
      filmThickness: value.filmThickness ?? null,
      instrument: value.instrument,
      measuredAt: value.measuredAt.toISOString(),
      state: value.state,
      origin,
      reason: origin.kind === "another program" ? null : value.reason,
      acceptedAt: value.acceptedAt.toISOString(),
      acceptedBy: value.acceptedBy.name,
      setAside: value.setAsideAt
        ? {
            reason: value.setAsideReason ?? "",
            at: value.setAsideAt.toISOString(),
            by: value.setAsideBy?.name ?? "somebody",
          }
        : null,
      putBack: value.putBackAt ? { at: value.putBackAt.toISOString(), by: value.putBackBy?.name ?? "somebody" } : null,
    };
  });
}

/** Every stress that the film had in use, the newest first. */
async function inUseRows(em: EntityManager, filmId: string): Promise<StressInUseRow[]> {
  const rows = await em.find(
    FilmStressInUse,
    { film: filmId },
    { populate: ["by"], orderBy: { since: "desc", id: "asc" } },
  );
  return rows.map(({ id, stress, since, by }, index) => ({
    id,
    stress,
    since: since.toISOString(),
    until: rows[index - 1]?.since.toISOString() ?? null,
    by: by?.name ?? "delivered with Planeward",
  }));
}
