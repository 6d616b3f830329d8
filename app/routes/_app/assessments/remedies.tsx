import { redirect } from "react-router";
import { RemediesPage, type RemediesPageData } from "#app/components/assessments/RemediesPage.tsx";
import { trialPath } from "#app/lib/leg-query.ts";
import { byServer, readSent } from "#app/lib/read-sent.ts";
import type { SentTrial } from "#app/schemas/trial.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { remediesOf } from "#app/services/assessments/remedies.server.ts";
import { trialGround, trialHead, trialQuestion } from "#app/services/assessments/trial-ground.server.ts";
import { tryOnCopy } from "#app/services/assessments/try-on-copy.server.ts";
import type { Route } from "./+types/remedies";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `What clears it${loaderData ? `, ${loaderData.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs): Promise<RemediesPageData> {
  const ground = await trialGround(scopeOf(context), params.assessmentId, url.searchParams);
  return { head: trialHead(ground), view: await remediesOf(trialQuestion(ground)) };
}

/** Within the application the browser looks for changes itself, unless the address has the server do it. */
export async function clientLoader({
  params,
  request,
  serverLoader,
}: Route.ClientLoaderArgs): Promise<RemediesPageData> {
  const url = new URL(request.url);
  if (byServer(url)) return serverLoader();
  return readSent<SentTrial>(trialPath(params.assessmentId, url.searchParams.get("leg"))).catch(() => serverLoader());
}

/** Trying a change on a copy: from here, from the assessment and from the finder. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await postedForm(request);
  const { path } = await tryOnCopy(scopeOf(context), params.assessmentId, form.get("changes"), form.get("leg"));
  throw redirect(path);
}

export default function Remedies({ loaderData }: Route.ComponentProps) {
  return <RemediesPage {...loaderData} />;
}
