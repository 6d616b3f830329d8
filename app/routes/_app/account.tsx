import { data, redirect } from "react-router";
import { AccountPage } from "#app/components/people/AccountPage.tsx";
import { passwordChangeSchema } from "#app/schemas/own-account.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { changePassword, endOwnSession, ownSessions, SESSION_HOURS } from "#app/services/people/own-account.server.ts";
import type { Route } from "./+types/account";

const DONE = ["ended", "changed"] as const;

export const meta: Route.MetaFunction = () => [{ title: "Account · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, email } = scope.actor;
  const said = url.searchParams.get("done");
  return {
    name,
    email,
    sessions: await ownSessions(scope),
    hours: SESSION_HOURS,
    done: DONE.find((each) => each === said) ?? null,
  };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  if (formData.get("intent") === "end") {
    const id = formData.get("session");
    await endOwnSession(scope, typeof id === "string" ? id : undefined);
    throw redirect("/account?done=ended");
  }
  const submission = parseForm(formData, passwordChangeSchema);
  if (submission.status !== "success")
    return data(
      { current: submission.error?.["current"]?.[0], password: submission.error?.["password"]?.[0] },
      { status: 400 },
    );
  const faults = await changePassword(scope, submission.value);
  if (faults !== null) return data({ current: undefined, password: undefined, ...faults }, { status: 400 });
  throw redirect("/account?done=changed");
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  return <AccountPage {...loaderData} faults={actionData} />;
}
