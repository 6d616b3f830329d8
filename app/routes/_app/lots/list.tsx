import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { LooseWaferList } from "#app/components/lots/LooseWaferList.tsx";
import { LOT_COLUMNS } from "#app/components/lots/lot-columns.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { looseWafers } from "#app/services/wafers/loose-wafers.server.ts";
import { listLots, LOT_SORTS } from "#app/services/wafers/lots.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Lots · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = scanPrograms(scope, "see the work");
  const params = readListParams(url.searchParams, { sorts: LOT_SORTS, filters: ["program"], descending: true });
  return {
    page: withinPages(url, await listLots(scope, params)),
    loose: await looseWafers(scope, params),
    programs: programs.map(({ programName, programSlug }) => ({ value: programSlug, label: programName })),
    mayUpload: programsWhere(scope.actor, "upload scans").length > 0,
  };
}

export default function Lots({ loaderData }: Route.ComponentProps) {
  const { page, loose, programs, mayUpload } = loaderData;
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const importing = mayUpload && (
    <>
      <Link to="/scans/import" className="btn">
        Import scans and summaries
      </Link>
      <Link to="/lots/new" className="btn btn-primary">
        New lots
      </Link>
    </>
  );
  const empty = page.total === 0 && !searched;
  return (
    <>
      <PageHead
        title="Lots"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={searched ? `${page.total} found` : page.total === 1 ? "1 lot" : `${page.total} lots`}
        actions={!empty && importing}
      />
      <ListHead what="lots, wafers and people" filters={[{ name: "program", label: "Program", options: programs }]} />
      {page.rows.length > 0 ? (
        <DataTable caption="Lots" columns={LOT_COLUMNS} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title={searched ? "No lot fits" : "No lots yet"} actions={empty && importing}>
          {searched
            ? "Change the search, or take a filter away."
            : "A lot stands here once it is made, with its wafers or without, and as soon as a file is imported that names it: a summary of its wafers, a thickness map, or a scan of one of them."}
        </EmptyState>
      )}
      <LooseWaferList wafers={loose} />
    </>
  );
}
