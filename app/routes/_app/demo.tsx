import { data, redirect } from "react-router";
import { DemoPage } from "#app/components/demo/DemoPage.tsx";
import { demoFormSchema } from "#app/schemas/demo-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { demoView } from "#app/services/demo/demo-view.server.ts";
import { loadTheDemo } from "#app/services/demo/load-demo.server.ts";
import { removeTheDemo } from "#app/services/demo/remove-demo.server.ts";
import type { Route } from "./+types/demo";

export const meta: Route.MetaFunction = () => [{ title: "The demo · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { view: await demoView(scopeOf(context)) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const { submission } = await readForm(request, demoFormSchema);
  if (submission.status !== "success")
    throw problem(400, "This form could not be read. Open the page of the demo again and send it once more.");
  const { intent, ...asked } = submission.value;
  if (intent === "load") {
    await loadTheDemo(scope);
    throw redirect("/?demo=loaded");
  }
  const removed = await removeTheDemo(scope, asked);
  if (removed.outcome !== "refused") throw redirect(`/?demo=${removed.outcome}`);
  const { name, diameter } = asked;
  return data({ refused: removed, typed: { name, diameter } }, { status: 400 });
}

export default function DemoRoute({ loaderData, actionData }: Route.ComponentProps) {
  return <DemoPage view={loaderData.view} refused={actionData?.refused} typed={actionData?.typed} />;
}
