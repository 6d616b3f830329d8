import { KindDetail } from "#app/components/carriers/KindDetail.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getKindPage, requireKind } from "#app/services/library/kind-pages.server.ts";
import type { Route } from "./+types/detail";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Carriers & bonds"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return getKindPage(scopeOf(context), requireKind(params.kind), params.recordId, url.searchParams);
}

export default function Detail({ loaderData }: Route.ComponentProps) {
  return <KindDetail {...loaderData} />;
}
