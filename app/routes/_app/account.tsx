import { data, redirect } from "react-router";
import { AccountPage, type AccountAnswer } from "#app/components/people/AccountPage.tsx";
import { passwordChangeSchema } from "#app/schemas/own-account.ts";
import { emailAddress } from "#app/schemas/person-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { ownCodes } from "#app/services/codes/own-codes.server.ts";
import { askForAddress } from "#app/services/people/change-address.server.ts";
import { changePassword, endOwnSession, ownSessions, SESSION_HOURS } from "#app/services/people/own-account.server.ts";
import { proofAsked, proveAgain } from "#app/services/people/recent-proof.server.ts";
import type { Route } from "./+types/account";

const DONE = ["ended", "changed", "asked", "address"] as const;

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
    codesSince: (await ownCodes(scope)).since,
    proofAsked: proofAsked(scope),
    done: DONE.find((each) => each === said) ?? null,
  };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  if (formData.get("intent") === "end") {
    const proven = await proveAgain(scope, postedProof(formData));
    if (proven.fault !== null) return refused({ ending: proven.fault });
    const id = formData.get("session");
    await endOwnSession(proven.scope, typeof id === "string" ? id : undefined);
    throw redirect("/account?done=ended");
  }
  if (formData.get("intent") === "address") return takeAddress(scope, formData);
  const submission = parseForm(formData, passwordChangeSchema);
  if (submission.status !== "success")
    return refused({
      password: { current: submission.error?.["current"]?.[0], password: submission.error?.["password"]?.[0] },
    });
  const faults = await changePassword(scope, submission.value);
  if (faults !== null) return refused({ password: { current: undefined, password: undefined, ...faults } });
  throw redirect("/account?done=changed");
}

const refused = (answer: AccountAnswer) => data(answer, { status: 400 });

async function takeAddress(scope: ActorScope, formData: FormData) {
  const sent = formData.get("address");
  const typed = typeof sent === "string" ? sent.slice(0, 200) : "";
  const address = emailAddress.safeParse(sent);
  if (!address.success) return refused({ address: { typed, fault: address.error.issues[0]?.message } });
  if (address.data === scope.actor.email)
    return refused({ address: { typed, fault: "This is your address already. Type the one that is to replace it." } });
  const proven = await proveAgain(scope, postedProof(formData));
  if (proven.fault !== null) return refused({ address: { typed, proofFault: proven.fault } });
  await askForAddress(proven.scope, address.data);
  throw redirect("/account?done=asked");
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  return <AccountPage {...loaderData} answer={actionData} />;
}
