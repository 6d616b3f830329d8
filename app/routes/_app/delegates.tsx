import { data, redirect } from "react-router";
import { DelegatesPage } from "#app/components/delegates/DelegatesPage.tsx";
import { delegationSchema, endDelegationSchema } from "#app/schemas/delegation.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { delegations, endDelegation, nameDelegate } from "#app/services/people/delegations.server.ts";
import type { Route } from "./+types/delegates";

const DONE = ["named", "ended"] as const;

export const meta: Route.MetaFunction = () => [{ title: "Delegates · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const said = url.searchParams.get("done");
  return { ...(await delegations(scopeOf(context))), done: DONE.find((each) => each === said) ?? null };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  if (formData.get("intent") === "end") {
    const asked = parseForm(formData, endDelegationSchema);
    if (asked.status !== "success")
      throw problem(400, "This is no delegation. Open the page again and choose one from it.");
    await endDelegation(scope, asked.value.delegation);
    throw redirect("/delegates?done=ended");
  }
  const submission = parseForm(formData, delegationSchema);
  if (submission.status !== "success") return data({ lastResult: submission.reply() }, { status: 400 });
  const refused = await nameDelegate(scope, submission.value);
  if (refused !== null)
    return data({ lastResult: submission.reply({ fieldErrors: { whom: [refused] } }) }, { status: 409 });
  throw redirect("/delegates?done=named");
}

export default function Delegates({ loaderData, actionData }: Route.ComponentProps) {
  return <DelegatesPage {...loaderData} lastResult={actionData?.lastResult} />;
}
