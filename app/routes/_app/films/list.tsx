import { Link } from "react-router";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { LIBRARY } from "#app/services/library/kinds.server.ts";
import { listLibrary } from "#app/services/library/library.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Films · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: Object.keys(LIBRARY.film.sorts), filters: ["kind"] });
  return { page: await listLibrary(scope, "film", params), mayEdit: mayOnSite(scope.actor, "edit films") };
}

type Row = Route.ComponentProps["loaderData"]["page"]["rows"][number];

const columns: Column<Row>[] = [
  {
    key: "name",
    head: "Film",
    sortable: true,
    cell: ({ id, name }) => (
      <Link to={`/films/${id}`} className="link">
        {name}
      </Link>
    ),
  },
  { key: "kind", head: "Kind", sortable: true, wide: true, cell: ({ kind }) => kind },
  {
    key: "stress",
    head: "Stress at 25 °C",
    unit: "MPa",
    numeric: true,
    sortable: true,
    cell: ({ stress }) => formatMeasured(stress, "stress", { unit: "MPa", sign: true, bare: true }),
  },
  {
    key: "sense",
    head: "Pulls as",
    wide: true,
    cell: ({ stress }) => (stress.value > 0 ? "tension" : stress.value < 0 ? "compression" : "none"),
  },
  {
    key: "modulus",
    head: "Modulus E",
    unit: "GPa",
    numeric: true,
    sortable: true,
    wide: true,
    cell: ({ youngsModulus }) => formatBare(youngsModulus.value, "stress", "GPa"),
  },
  {
    key: "expansion",
    head: "Expansion",
    unit: "ppm/K",
    numeric: true,
    sortable: true,
    wide: true,
    cell: ({ expansion }) => formatBare(expansion.value, "expansion", "ppm/K"),
  },
  {
    key: "limit",
    head: "Limit",
    unit: "°C",
    numeric: true,
    sortable: true,
    wide: true,
    cell: ({ temperatureLimit }) =>
      temperatureLimit ? formatBare(temperatureLimit.value, "temperature", "°C") : "not given",
  },
  {
    key: "source",
    head: "Source of stress",
    sortable: true,
    cell: ({ stress }) => <SourceMark kind={stress.source} />,
  },
];

export default function Films({ loaderData }: Route.ComponentProps) {
  const { page, mayEdit } = loaderData;
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const add = mayEdit && (
    <Link to="/films/new" className="btn btn-primary">
      Add a film
    </Link>
  );
  return (
    <>
      <PageHead title="Films" remark={`${page.total} ${searched ? "found" : "films"}`} actions={add} />
      <ListHead what="films" filters={[{ name: "kind", label: "Kind", options: sameWords(FILM_KINDS) }]} />
      {page.rows.length > 0 ? (
        <DataTable caption="Films" columns={columns} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title={searched ? "No film fits" : "No films yet"} actions={add}>
          {searched
            ? "Change the search, or take a filter away."
            : "Films with their stress, modulus and expansion belong here. Stacks and flows are made of them."}
        </EmptyState>
      )}
    </>
  );
}
