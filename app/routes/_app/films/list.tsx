import { FILM_LIST } from "#app/components/films/film-list.tsx";
import { LibraryList } from "#app/components/library/LibraryList.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listLibraryAt } from "#app/services/library/library.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Films · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const list = await listLibraryAt(scopeOf(context), "film", url.searchParams);
  withinPages(url, list.page);
  return list;
}

export default function Films({ loaderData }: Route.ComponentProps) {
  return <LibraryList view={FILM_LIST} {...loaderData} />;
}
