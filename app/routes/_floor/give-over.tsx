import { randomUUID } from "node:crypto";
import { data, redirect } from "react-router";
import { GiveOverForm } from "#app/components/floor/GiveOverForm.tsx";
import { giveForm } from "#app/schemas/hand-over.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { giveOver } from "#app/services/floor/hand-over.server.ts";
import { lotsToHandOver } from "#app/services/floor/lots-at-place.server.ts";
import type { Route } from "./+types/give-over";

export const meta: Route.MetaFunction = () => [{ title: "Hand a place over · Floor · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return { ...(await lotsToHandOver(scope)), given: randomUUID(), person: scope.actor.name };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const { submission } = await readForm(request, giveForm);
  if (submission.status !== "success") return data({ lastResult: submission.reply() }, { status: 400 });
  await giveOver(scope, submission.value);
  throw redirect("/floor/hand-overs?done=given");
}

export default function GiveOver({ loaderData, actionData }: Route.ComponentProps) {
  return <GiveOverForm {...loaderData} lastResult={actionData?.lastResult} />;
}
