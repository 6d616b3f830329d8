import { redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { MAIL_STATE_WORDS, OUTBOX_COLUMNS } from "#app/components/mail/outbox-columns.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { MAIL_STATES } from "#app/schemas/outbox.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listOutbox, OUTBOX_SORTS, tryAgain } from "#app/services/mail/outbox.server.ts";
import type { Route } from "./+types/outbox";

export const meta: Route.MetaFunction = () => [{ title: "Outbox · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, {
    sorts: OUTBOX_SORTS,
    filters: ["program", "state"],
    descending: true,
  });
  const page = withinPages(url, await listOutbox(scope, params));
  return {
    page,
    programs: programsWhere(scope.actor, "see the outbox").map(({ programName, programSlug }) => ({
      value: programSlug,
      label: programName,
    })),
    hasMailServer: environment.SMTP_URL !== undefined,
  };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const mail = (await postedForm(request)).get("mail");
  await tryAgain(scopeOf(context), typeof mail === "string" ? mail : undefined);
  throw redirect(`/mail/outbox${url.search}`);
}

export default function Outbox({ loaderData: { page, programs, hasMailServer } }: Route.ComponentProps) {
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const counted = page.total === 1 ? "1 mail" : `${page.total} mails`;
  return (
    <>
      <PageHead title="Outbox" remark={searched ? `${page.total} found` : counted} />
      {!hasMailServer && (
        <Notice kind="caution" title="No mail server is named, so nothing is sent.">
          What is written waits here. Name one in SMTP_URL and start Planeward anew.
        </Notice>
      )}
      <ListHead
        what="kinds and people"
        filters={[
          { name: "program", label: "Program", options: programs },
          {
            name: "state",
            label: "State",
            options: MAIL_STATES.map((value) => ({ value, label: MAIL_STATE_WORDS[value] })),
          },
        ]}
      />
      {page.total > 0 ? (
        <>
          <DataTable caption="Mail" columns={OUTBOX_COLUMNS} page={page} rowKey={({ id }) => id} />
          <p className="mt-3 max-w-160 text-label text-quiet">
            Parked mail was refused, or nobody can tell whether it arrived. Ask its reader before you have it tried
            again: it may come twice, under the same Message-ID.
          </p>
        </>
      ) : (
        <EmptyState title={searched ? "No mail fits" : "No mail yet"}>
          {searched
            ? "Change the search, or take a filter away."
            : "What Planeward mails to the people of your programs stands here, with how far it is."}
        </EmptyState>
      )}
    </>
  );
}
