import { FilmDetail } from "#app/components/films/FilmDetail.tsx";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getLibraryRecord } from "#app/services/library/library.server.ts";
import { whereUsed } from "#app/services/library/use.server.ts";
import type { Route } from "./+types/detail";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Film"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const found = await getLibraryRecord(scope, "film", params.filmId);
  return {
    ...found,
    uses: await whereUsed(scope, "film", found.record.id),
    mayAsk: programsWhere(scope.actor, "see the work").length > 0,
  };
}

export default function Film({ loaderData }: Route.ComponentProps) {
  return <FilmDetail {...loaderData} />;
}
