import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { SCAN_COLUMNS } from "#app/components/scans/scan-columns.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listScans, SCAN_SORTS, scanPrograms } from "#app/services/scans.server.ts";
import { countWaiting } from "#app/services/wafers/waiting.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Scans · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = scanPrograms(scope, "see the work");
  const params = readListParams(url.searchParams, { sorts: SCAN_SORTS, filters: ["program"], descending: true });
  const page = withinPages(url, await listScans(scope, params));
  return {
    page,
    programs: programs.map(({ programName, programSlug }) => ({ value: programSlug, label: programName })),
    mayUpload: programsWhere(scope.actor, "upload scans").length > 0,
    waiting: await countWaiting(scope),
  };
}

export default function Scans({ loaderData }: Route.ComponentProps) {
  const { page, programs, mayUpload, waiting } = loaderData;
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const upload = mayUpload && (
    <>
      <Link to="/scans/new" className="btn">
        Upload one pair
      </Link>
      <Link to="/scans/import" className="btn btn-primary">
        Import scans
      </Link>
    </>
  );
  // One filled button a page: where nothing is there yet it stands with the words that say what belongs here.
  const empty = page.total === 0 && !searched;
  const counted = page.total === 1 ? "1 scan" : `${page.total} scans`;
  return (
    <>
      <PageHead
        title="Scans"
        remark={searched ? `${page.total} found` : counted}
        actions={
          <>
            <Link to="/lots" className="btn">
              Lots
            </Link>
            <Link to="/scans/waiting" className="btn">
              {waiting === 0 ? "Files that wait" : waiting === 1 ? "1 file waits" : `${waiting} files wait`}
            </Link>
            <Link to="/instruments" className="btn">
              Instruments
            </Link>
            <Link to="/predictions" className="btn">
              Predicted against measured
            </Link>
            <Link to="/jobs" className="btn">
              Work under way
            </Link>
            {!empty && upload}
          </>
        }
      />
      <ListHead what="wafers, films and people" filters={[{ name: "program", label: "Program", options: programs }]} />
      {page.rows.length > 0 ? (
        <>
          <DataTable caption="Scans" columns={SCAN_COLUMNS} page={page} rowKey={({ id }) => id} />
          <p className="text-label text-quiet">
            Uncertainties are expanded, k = 2. Bow: centre above the reference plane with the device side up is
            positive.
          </p>
        </>
      ) : (
        <EmptyState title={searched ? "No scan fits" : "No scans yet"} actions={empty && upload}>
          {searched
            ? "Change the search, or take a filter away."
            : "A profile across a monitor wafer before a film and one after it belong here. From the two come the film’s stress with its uncertainty and the bow that it makes."}
        </EmptyState>
      )}
    </>
  );
}
