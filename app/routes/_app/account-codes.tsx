import { data, redirect } from "react-router";
import { OwnCodesPage, type CodesAnswer } from "#app/components/codes/OwnCodesPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { takeCodesForm } from "#app/services/codes/codes-form.server.ts";
import { ownCodes } from "#app/services/codes/own-codes.server.ts";
import { proofAsked } from "#app/services/people/recent-proof.server.ts";
import type { Route } from "./+types/account-codes";

export const meta: Route.MetaFunction = () => [{ title: "One-time codes · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return { ...(await ownCodes(scope)), proofAsked: proofAsked(scope), turnedOff: url.searchParams.has("off") };
}

export async function action({ request, context }: Route.ActionArgs) {
  const taken = await takeCodesForm(request, scopeOf(context));
  if (taken === "begun") throw redirect("/account/codes");
  if (taken === "off") throw redirect("/account/codes?off");
  // Recovery codes are shown by the answer to the form itself, and have no place in a history.
  return data<CodesAnswer>(taken, {
    status: "recovery" in taken ? 200 : 400,
    headers: { "Cache-Control": "no-store" },
  });
}

export default function AccountCodes({ loaderData, actionData }: Route.ComponentProps) {
  return <OwnCodesPage {...loaderData} answer={actionData} />;
}
