import { data } from "react-router";
import { FinderPage } from "#app/components/assessments/FinderPage.tsx";
import { chosenRows, FINDER_SORTS, finderPage } from "#app/lib/finder-rows.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { finderOf } from "#app/services/assessments/finder.server.ts";
import type { Route } from "./+types/carriers";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Carriers and bonds${loaderData ? ` for ${loaderData.found.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const list = readListParams(url.searchParams, { sorts: FINDER_SORTS, filters: ["fits"] });
  const { rows, ...found } = await finderOf(scopeOf(context), params.assessmentId, url.searchParams);
  const page = rows && withinPages(url, finderPage(chosenRows(rows, list), list));
  return data({ found, page }, { status: Object.keys(found.asked.faults).length > 0 ? 400 : 200 });
}

export default function Carriers({ loaderData }: Route.ComponentProps) {
  return <FinderPage {...loaderData} />;
}
