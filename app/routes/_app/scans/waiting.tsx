import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { waitingColumns } from "#app/components/scans/waiting/waiting-columns.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { listWaiting, WAITING_SORTS } from "#app/services/wafers/waiting.server.ts";
import type { Route } from "./+types/waiting";

export const meta: Route.MetaFunction = () => [{ title: "Files that wait · Scans · Planeward" }];

const AGES = [
  { value: "day", label: "A day" },
  { value: "week", label: "A week" },
  { value: "month", label: "30 days" },
];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = scanPrograms(scope, "see the work");
  const asked = { sorts: WAITING_SORTS, filters: ["program", "older"], descending: true };
  const params = readListParams(url.searchParams, asked);
  return {
    page: withinPages(url, await listWaiting(scope, params)),
    programs: programs.map(({ programName, programSlug }) => ({ value: programSlug, label: programName })),
    mayUpload: programsWhere(scope.actor, "upload scans").length > 0,
    now: new Date().toISOString(),
  };
}

export default function Waiting({ loaderData }: Route.ComponentProps) {
  const { page, programs, mayUpload, now } = loaderData;
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const filters = [
    { name: "program", label: "Program", options: programs },
    { name: "older", label: "Waits longer than", options: AGES },
  ];
  const importing = mayUpload && (
    <Link to="/scans/import" className="btn btn-primary">
      Import scans
    </Link>
  );
  const empty = page.total === 0 && !searched;
  return (
    <>
      <PageHead
        title="Files that wait for their partner"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={searched ? `${page.total} found` : page.total === 1 ? "1 file" : `${page.total} files`}
        actions={!empty && importing}
      />
      <ListHead what="wafers, lots, files and people" filters={filters} />
      {page.rows.length > 0 ? (
        <DataTable
          caption="Files that wait for their partner"
          columns={waitingColumns(new Date(now))}
          page={page}
          rowKey={({ id }) => id}
        />
      ) : (
        <EmptyState title={searched ? "No file fits" : "No file waits"} actions={empty && importing}>
          {searched
            ? "Change the search, or take a filter away."
            : "A scan that is imported without its partner waits here. As soon as the other one comes, of the same wafer and line, the two make a scan."}
        </EmptyState>
      )}
    </>
  );
}
