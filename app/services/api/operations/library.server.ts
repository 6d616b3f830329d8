import { z } from "zod";
import { Film } from "#app/db/entities/film.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import { inScope } from "#app/server/scope.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { requireOnSite } from "../../permission.server.ts";
import { idFrom } from "../../uuid.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { id, idParam, moment, stated, statedIn, statedOrNull } from "../shapes.ts";

const film = z.object({
  id,
  name: z.string(),
  kind: z.string(),
  note: z.string(),
  stress_Pa: statedIn("Pa").describe("At 25 °C on a full-thickness monitor held flat, tension positive."),
  stress_state: z.string(),
  youngs_modulus_Pa: statedIn("Pa"),
  poissons_ratio: statedIn("1"),
  cte_per_K: statedIn("1/K"),
  yield_stress_Pa: statedIn("Pa").nullable(),
  zero_stress_temperature_K: statedIn("K").nullable(),
  temperature_limit_K: statedIn("K").nullable(),
  version: z.int(),
  updated_at: moment,
});
const silicon = z.object({
  id,
  name: z.string(),
  diameter_m: z.number(),
  orientation: z.enum(["100", "111"]),
  thickness_m: statedIn("m"),
});

const filmJson = (found: Film): z.input<typeof film> => ({
  id: found.id,
  name: found.name,
  kind: found.kind,
  note: found.note,
  stress_Pa: stated(found.stress),
  stress_state: found.stressState,
  youngs_modulus_Pa: stated(found.youngsModulus),
  poissons_ratio: stated(found.poissonsRatio),
  cte_per_K: stated(found.expansion),
  yield_stress_Pa: statedOrNull(found.yieldStress),
  zero_stress_temperature_K: statedOrNull(found.zeroStressTemperature),
  temperature_limit_K: statedOrNull(found.temperatureLimit),
  version: found.version,
  updated_at: found.updatedAt.toISOString(),
});

export const libraryOperations = [
  operation({
    id: "listFilms",
    method: "GET",
    path: "/films",
    scope: "films:read",
    group: "Films and silicon",
    summary: "Films of the site, the newest first",
    query: z.strictObject({
      ...pageQuery,
      kind: z.string().max(40).optional().describe("Kind of film, such as metal."),
    }),
    answer: pageOf(film),
    handle: async ({ scope, query }) => {
      requireOnSite(scope, "see the library");
      const where = query.kind === undefined ? {} : { kind: query.kind as Film["kind"] };
      const { rows, next_cursor } = await inScope(scope, (em) => keysetPage(em, Film, where, "createdAt", query));
      return { answer: { data: rows.map(filmJson), next_cursor } };
    },
  }),
  operation({
    id: "getFilm",
    method: "GET",
    path: "/films/{film_id}",
    scope: "films:read",
    group: "Films and silicon",
    summary: "One film",
    params: idParam("film_id"),
    answer: film,
    handle: async ({ scope, params }) => {
      requireOnSite(scope, "see the library");
      const found = await inScope(scope, (em) => em.findOne(Film, { id: idFrom(params.film_id, "film") }));
      if (!found) throw notFound("film");
      return { answer: filmJson(found) };
    },
  }),
  operation({
    id: "listSilicon",
    method: "GET",
    path: "/silicon",
    scope: "films:read",
    group: "Films and silicon",
    summary: "Silicon wafers of the site, the newest first",
    query: z.strictObject(pageQuery),
    answer: pageOf(silicon),
    handle: async ({ scope, query }) => {
      requireOnSite(scope, "see the library");
      const { rows, next_cursor } = await inScope(scope, (em) => keysetPage(em, Silicon, {}, "createdAt", query));
      const data = rows.map((found) => ({
        id: found.id,
        name: found.name,
        diameter_m: found.diameter,
        orientation: found.orientation,
        thickness_m: stated(found.thickness),
      }));
      return { answer: { data, next_cursor } };
    },
  }),
];
