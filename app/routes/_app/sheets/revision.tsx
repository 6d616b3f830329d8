import { data, redirect } from "react-router";
import { RevisionPage } from "#app/components/sheet/released/RevisionPage.tsx";
import { withdrawSchema } from "#app/schemas/review-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { revisionPage } from "#app/services/sheets/revision-page.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import { withdrawRevision } from "#app/services/sheets/withdraw.server.ts";
import type { Route } from "./+types/revision";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `${loaderData.view.sheet} ${loaderData.view.letter}` : "Sheet"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return { view: await revisionPage(scope, params.revisionId), paper: await paperFor(scope, url) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { submission } = await readForm(request, withdrawSchema);
  if (submission.status !== "success") return data(submission.reply(), { status: 400 });
  await withdrawRevision(scopeOf(context), params.revisionId, submission.value.reason);
  throw redirect(`/sheets/revisions/${params.revisionId}`);
}

export default function Revision({ loaderData, actionData }: Route.ComponentProps) {
  return <RevisionPage {...loaderData} answer={actionData} />;
}
