import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { PEOPLE_COLUMNS, PERSON_STATE_WORDS } from "#app/components/people/people-columns.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { PERSON_STATES } from "#app/schemas/person-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listPeople, PEOPLE_SORTS } from "#app/services/people/list-people.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "People · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const params = readListParams(url.searchParams, { sorts: PEOPLE_SORTS, filters: ["state"] });
  return withinPages(url, await listPeople(scopeOf(context), params));
}

export default function People({ loaderData: page }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title="People"
        remark={page.total === 1 ? "1 person" : `${page.total} people`}
        actions={
          <Link to="/people/new" className="btn btn-primary">
            Invite somebody
          </Link>
        }
      />
      <ListHead
        what="names and addresses"
        filters={[
          {
            name: "state",
            label: "State",
            options: PERSON_STATES.map((value) => ({ value, label: PERSON_STATE_WORDS[value] })),
          },
        ]}
      />
      {page.total > 0 ? (
        <DataTable caption="People" columns={PEOPLE_COLUMNS} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title="Nobody fits">Change the search, or take the filter away.</EmptyState>
      )}
    </>
  );
}
