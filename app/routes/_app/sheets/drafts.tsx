import { DraftList } from "#app/components/sheet/DraftList.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { ASSESSMENT_SORTS, listNewestAssessments } from "#app/services/assessments/newest-assessments.server.ts";
import type { Route } from "./+types/drafts";

export const meta: Route.MetaFunction = () => [{ title: "Draft sheets · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = programsWhere(scope.actor, "see the work").map(({ programSlug, programName }) => ({
    value: programSlug,
    label: programName,
  }));
  const params = readListParams(url.searchParams, { sorts: ASSESSMENT_SORTS, filters: ["program", "outcome"] });
  return { page: withinPages(url, await listNewestAssessments(scope, params)), programs };
}

export default function Drafts({ loaderData }: Route.ComponentProps) {
  return <DraftList {...loaderData} />;
}
