import { KindList } from "#app/components/carriers/KindList.tsx";
import { KINDS } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listKind, requireKind } from "#app/services/library/kind-pages.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? KINDS[loaderData.slug].title : "Carriers & bonds"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const list = await listKind(scopeOf(context), requireKind(params.kind), url.searchParams);
  withinPages(url, list.page);
  return list;
}

export default function List({ loaderData }: Route.ComponentProps) {
  return <KindList {...loaderData} />;
}
