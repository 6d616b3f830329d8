import { redirect } from "react-router";
import { RemediesPage } from "#app/components/assessments/RemediesPage.tsx";
import { remediesView } from "#app/lib/remedies-view.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { remediesOf } from "#app/services/assessments/remedies.server.ts";
import { trialGround, trialHead } from "#app/services/assessments/trial-ground.server.ts";
import { tryOnCopy } from "#app/services/assessments/try-on-copy.server.ts";
import type { Route } from "./+types/remedies";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `What clears it${loaderData ? `, ${loaderData.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const ground = await trialGround(scopeOf(context), params.assessmentId);
  const answers = await remediesOf(ground);
  return {
    head: trialHead(ground),
    view: answers && remediesView(answers, { flow: ground.input.flow, catalogue: ground.catalogue }),
  };
}

/** Trying a change on a copy: from here, from the assessment and from the finder. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await postedForm(request);
  const { path } = await tryOnCopy(scopeOf(context), params.assessmentId, form.get("changes"));
  throw redirect(path);
}

export default function Remedies({ loaderData }: Route.ComponentProps) {
  return <RemediesPage {...loaderData} />;
}
