import { SearchPage } from "#app/components/search/SearchPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { searchEverything } from "#app/services/search.server.ts";
import type { Route } from "./+types/search";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.query ? `${loaderData.query} · ` : ""}Search · Planeward` },
];

export async function loader({ context, url }: Route.LoaderArgs) {
  return searchEverything(scopeOf(context), url.searchParams.get("q"));
}

export default function Search({ loaderData }: Route.ComponentProps) {
  return <SearchPage answer={loaderData} />;
}
