import { data, redirect } from "react-router";
import { HandOverPage } from "#app/components/floor/HandOverPage.tsx";
import { takeForm } from "#app/schemas/hand-over.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { handOver, takeOver } from "#app/services/floor/hand-over.server.ts";
import type { Route } from "./+types/hand-over";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `Hand-over of ${loaderData.handOver.place}` : "Hand-over"} · Floor · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return {
    handOver: await handOver(scope, params.handOverId),
    person: { id: scope.actor.id, name: scope.actor.name },
    now: new Date().toISOString(),
    isNext: url.searchParams.has("next"),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { submission } = await readForm(request, takeForm);
  if (submission.status !== "success") return data({ lastResult: submission.reply() }, { status: 400 });
  const next = await takeOver(scopeOf(context), params.handOverId, submission.value.remark);
  throw redirect(next === null ? `/floor/hand-overs/${params.handOverId}` : `/floor/hand-overs/${next}?next`);
}

export default function HandOver({ loaderData, actionData }: Route.ComponentProps) {
  return <HandOverPage {...loaderData} lastResult={actionData?.lastResult} />;
}
