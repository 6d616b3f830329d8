import { ComparisonPage } from "#app/components/assessments/ComparisonPage.tsx";
import { comparisonView } from "#app/lib/comparison-view.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { comparisonOffer } from "#app/services/assessments/comparison.server.ts";
import type { Route } from "./+types/compare";

export const meta: Route.MetaFunction = ({ loaderData }) => {
  const chosen = loaderData?.view.chosen;
  return [{ title: `${chosen ? `${chosen.before.name} and ${chosen.after.name}` : "Compare"} · Planeward` }];
};

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { query } = readListParams(url.searchParams, { sorts: [] });
  const withId = url.searchParams.get("with") || null;
  return {
    view: comparisonView(await comparisonOffer(scopeOf(context), params.assessmentId, { withId, query })),
    query,
  };
}

export default function Compare({ loaderData }: Route.ComponentProps) {
  return <ComparisonPage {...loaderData} />;
}
