import { SheetList } from "#app/components/sheet/released/SheetList.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listSheets, SHEET_SORTS } from "#app/services/sheets/sheet-list.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Sheets · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: SHEET_SORTS, filters: ["program", "state"] });
  return {
    page: withinPages(url, await listSheets(scope, params)),
    programs: programsWhere(scope.actor, "see released sheets").map(({ programSlug, programName }) => ({
      value: programSlug,
      label: programName,
    })),
    staff: programsWhere(scope.actor, "see the work").length > 0,
  };
}

export default function Sheets({ loaderData }: Route.ComponentProps) {
  return <SheetList {...loaderData} />;
}
