import type { ShouldRevalidateFunctionArgs } from "react-router";
import { FilmDetail } from "#app/components/films/FilmDetail.tsx";
import { StressHistory } from "#app/components/films/StressHistory.tsx";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { historyForm } from "#app/services/films/history-form.server.ts";
import { stressHistory } from "#app/services/films/stress-history.server.ts";
import { getLibraryRecord } from "#app/services/library/library.server.ts";
import { whereUsed } from "#app/services/library/use.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/detail";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Film"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const found = await getLibraryRecord(scope, "film", params.filmId);
  const history = await stressHistory(scope, found.record.id, url.searchParams);
  withinPages(url, history.page);
  return {
    ...found,
    history,
    uses: await whereUsed(scope, "film", found.record.id),
    mayAsk: programsWhere(scope.actor, "see the work").length > 0,
  };
}

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const filmId = idFrom(params.filmId, "film");
  return historyForm(request, scopeOf(context), { filmId, back: `/films/${filmId}${url.search}#history` });
}

/** After a conflict the history is to be seen as it is now. */
export function shouldRevalidate({ actionStatus, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  return actionStatus === 409 || defaultShouldRevalidate;
}

export default function Film({ loaderData, actionData }: Route.ComponentProps) {
  const { history, ...detail } = loaderData;
  return (
    <>
      <FilmDetail {...detail} />
      <StressHistory history={history} answer={actionData ?? null} />
    </>
  );
}
