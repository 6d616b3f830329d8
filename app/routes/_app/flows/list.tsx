import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { FAVOURITES_ONLY } from "#app/components/kept/favourites-only.ts";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { TickBar } from "#app/components/ui/ticks/TickBar.tsx";
import { tickColumn } from "#app/components/ui/ticks/tick-column.tsx";
import { useTicked } from "#app/components/ui/ticks/use-ticked.ts";
import { MOST_COMPARED } from "#app/lib/comparison/asked.ts";
import { formatBare } from "#app/lib/format-measured.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { MOST_TICKED } from "#app/lib/ticked-ids.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { FLOW_SORTS, listFlows } from "#app/services/flows/flows.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Flows · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, {
    sorts: FLOW_SORTS,
    filters: ["program", "favourites"],
    descending: true,
  });
  return {
    page: withinPages(url, await listFlows(scope, params)),
    programs: programsWhere(scope.actor, "see the work").map(({ programName, programSlug }) => ({
      value: programSlug,
      label: programName,
    })),
    mayEdit: programsWhere(scope.actor, "edit stacks and flows").length > 0,
    mayAssess: programsWhere(scope.actor, "run assessments").length > 0,
  };
}

type Row = Route.ComponentProps["loaderData"]["page"]["rows"][number];

const columns: Column<Row>[] = [
  {
    key: "name",
    head: "Flow",
    sortable: true,
    cell: ({ id, name }) => (
      <Link to={`/flows/${id}`} className="link">
        {name}
      </Link>
    ),
  },
  { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program },
  {
    key: "diameter",
    head: "Diameter",
    unit: "mm",
    numeric: true,
    sortable: true,
    wide: true,
    cell: ({ diameter }) => formatBare(diameter, "length", "mm"),
  },
  { key: "steps", head: "Steps", numeric: true, wide: true, cell: ({ steps }) => steps },
  {
    key: "latest",
    head: "Newest assessment",
    cell: ({ latest }) =>
      latest ? (
        <Link to={`/assessments/${latest.id}`} className="text-inherit">
          <FindingTag outcome={latest.outcome}>
            {revisionLetters(latest.number)}, {latest.at.slice(0, 10)}
          </FindingTag>
        </Link>
      ) : (
        <span className="text-quiet">not assessed yet</span>
      ),
  },
  { key: "updated", head: "Last changed", sortable: true, wide: true, cell: ({ updatedAt }) => updatedAt.slice(0, 10) },
];

export default function Flows({ loaderData }: Route.ComponentProps) {
  const { page, programs, mayEdit, mayAssess } = loaderData;
  const ticks = useTicked("flows-ticked");
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const add = mayEdit && (
    <Link to="/flows/new" className="btn btn-primary">
      New flow
    </Link>
  );
  return (
    <>
      <PageHead
        title="Flows"
        remark={`${page.total} ${searched ? "found" : page.total === 1 ? "flow" : "flows"}`}
        actions={
          <>
            <Link to="/assessments/change-request" className="btn">
              What would change?
            </Link>
            <Link to="/flows/library/flows" className="btn">
              Templates
            </Link>
            <Link to="/flows/library/steps" className="btn">
              Step library
            </Link>
            {add}
          </>
        }
      />
      <ListHead
        what="flows"
        filters={[
          ...(programs.length > 1 ? [{ name: "program", label: "Program", options: programs }] : []),
          FAVOURITES_ONLY,
        ]}
      />
      {page.rows.length > 0 ? (
        <>
          <TickBar
            ticks={ticks}
            what={["flow", "flows"]}
            onPage={page.rows.map(({ id }) => id)}
            actions={[
              { label: "Compare", to: "/flows/compare", least: 2, most: MOST_COMPARED },
              ...(mayAssess ? [{ label: "Assess again", to: "/flows/assess", most: MOST_TICKED }] : []),
              { label: "Mark as favourites", to: "/flows/mark", method: "post", most: MOST_TICKED },
            ]}
          />
          <DataTable caption="Flows" columns={[tickColumn(ticks), ...columns]} page={page} rowKey={({ id }) => id} />
        </>
      ) : (
        <EmptyState title={searched ? "No flow fits" : "No flows yet"} actions={!searched && add}>
          {searched
            ? "Change the search, or take a filter away."
            : "What happens to a wafer, step by step from the incoming wafer to dicing, belongs here. A flow can start from a stack."}
        </EmptyState>
      )}
    </>
  );
}
