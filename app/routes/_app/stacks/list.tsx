import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { exaggerationOf } from "#app/components/stacks/bow-of.ts";
import { stackColumns } from "#app/components/stacks/stack-columns.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { FAVOURITES_ONLY } from "#app/components/kept/favourites-only.ts";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { TickBar } from "#app/components/ui/ticks/TickBar.tsx";
import { tickColumn } from "#app/components/ui/ticks/tick-column.tsx";
import { useTicked } from "#app/components/ui/ticks/use-ticked.ts";
import { MOST_COMPARED } from "#app/lib/comparison/asked.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { MOST_TICKED } from "#app/lib/ticked-ids.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listStacks, STACK_SORTS } from "#app/services/stacks.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Stacks · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, {
    sorts: STACK_SORTS,
    filters: ["program", "favourites"],
    descending: true,
  });
  const { flatWithin, ...page } = withinPages(url, await listStacks(scope, params));
  return {
    page,
    flatWithin,
    programs: programsWhere(scope.actor, "see the work").map(({ programSlug, programName }) => ({
      value: programSlug,
      label: programName,
    })),
    mayEdit: programsWhere(scope.actor, "edit stacks and flows").length > 0,
  };
}

/** What may be done by whoever edits stacks; each asks once more. */
const CHANGES = [
  { label: "Duplicate", to: "/stacks/duplicate", most: MOST_TICKED },
  { label: "Remove", to: "/stacks/remove", most: MOST_TICKED, removes: true },
];

export default function Stacks({ loaderData }: Route.ComponentProps) {
  const { page, flatWithin, programs, mayEdit } = loaderData;
  const ticks = useTicked("stacks-ticked");
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const wafers = page.rows.flatMap(({ answer, diameter }) => (answer ? [{ shape: answer.shape, diameter }] : []));
  const add = mayEdit && (
    <Link to="/stacks/new" className="btn btn-primary">
      New stack
    </Link>
  );
  return (
    <>
      <PageHead
        title="Stacks"
        remark={`${page.total} ${searched ? "found" : page.total === 1 ? "stack" : "stacks"}`}
        actions={add}
      />
      <ListHead
        what="stacks"
        filters={[
          ...(programs.length > 1 ? [{ name: "program", label: "Program", options: programs }] : []),
          FAVOURITES_ONLY,
        ]}
      />
      {page.rows.length > 0 ? (
        <>
          <TickBar
            ticks={ticks}
            what={["stack", "stacks"]}
            onPage={page.rows.map(({ id }) => id)}
            actions={[
              { label: "Compare", to: "/stacks/compare", least: 2, most: MOST_COMPARED },
              ...(mayEdit ? CHANGES : []),
            ]}
          />
          <DataTable
            caption="Stacks"
            columns={[tickColumn(ticks), ...stackColumns(exaggerationOf(wafers), flatWithin)]}
            page={page}
            rowKey={({ id }) => id}
          />
        </>
      ) : (
        <EmptyState title={searched ? "No stack fits" : "No stacks yet"} actions={add}>
          {searched
            ? "Change the search, or take a filter away."
            : "Films on silicon of a given thickness belong here: how the free wafer lies, and what it takes to lift it. Flows start from them."}
        </EmptyState>
      )}
    </>
  );
}
