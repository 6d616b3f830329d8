import { data, redirect } from "react-router";
import { AddInstrument } from "#app/components/instruments/AddInstrument.tsx";
import { INSTRUMENT_COLUMNS } from "#app/components/instruments/instrument-columns.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import { newInstrumentSchema } from "#app/schemas/instrument.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { addInstrument, listInstruments } from "#app/services/instruments/list-instruments.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Instruments · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: ["name"] });
  const page = withinPages(url, await listInstruments(scope, params));
  return { page, mayCheck: mayOnSite(scope.actor, "check instruments") };
}

const TAKEN = "There is already an instrument of that name. Open it from the list, or choose another name.";

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, newInstrumentSchema);
  if (submission.status !== "success") return data({ lastResult: submission.reply() }, { status: 400 });
  const saved = await addInstrument(scopeOf(context), submission.value.name);
  if (saved.outcome === "saved") throw redirect(`/instruments/${saved.id}`);
  return data({ lastResult: submission.reply({ fieldErrors: { name: [TAKEN] } }) }, { status: 409 });
}

export default function Instruments({ loaderData, actionData }: Route.ComponentProps) {
  const { page, mayCheck } = loaderData;
  const searched = page.params.query !== "";
  const counted = page.total === 1 ? "1 instrument" : `${page.total} instruments`;
  return (
    <>
      <PageHead
        title="Instruments"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={searched ? `${page.total} found` : counted}
      />
      <ListHead what="instruments" />
      {page.rows.length > 0 ? (
        <>
          <DataTable caption="Instruments" columns={INSTRUMENT_COLUMNS} page={page} rowKey={({ id }) => id} />
          <p className="text-label text-quiet">
            Uncertainties are expanded, k = 2. A curvature of 1&nbsp;1/km is a bow of 5&nbsp;µm over 200&nbsp;mm.
          </p>
        </>
      ) : (
        <EmptyState title={searched ? "No instrument fits" : "No instruments yet"}>
          {searched
            ? "Search by a part of its name, or clear the search."
            : "The profilometers of the site belong here: how each writes its files, how well it repeats, and what it reads on wafers of known bow. Budgets of film stress use it."}
        </EmptyState>
      )}
      {mayCheck && <AddInstrument lastResult={actionData?.lastResult} />}
    </>
  );
}
