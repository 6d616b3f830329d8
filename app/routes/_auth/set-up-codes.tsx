import { data, Form, Link, redirect, type ShouldRevalidateFunctionArgs } from "react-router";
import { RecoveryCodes } from "#app/components/codes/RecoveryCodes.tsx";
import { SetUpCodes } from "#app/components/codes/SetUpCodes.tsx";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { localPath } from "#app/lib/local-path.ts";
import { heldScopeOf } from "#app/server/contexts.server.ts";
import { sessionCookie, tokenOf } from "#app/server/session-cookie.server.ts";
import { takeCodesForm } from "#app/services/codes/codes-form.server.ts";
import { ownCodes } from "#app/services/codes/own-codes.server.ts";
import { proofAsked } from "#app/services/people/recent-proof.server.ts";
import { endSession, startSession } from "#app/services/sessions.server.ts";
import type { Route } from "./+types/set-up-codes";

export const meta: Route.MetaFunction = () => [{ title: "Set up one-time codes · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = heldScopeOf(context);
  // Somebody who may go on is sent where they wanted to; that page sends nobody to the door.
  if (!scope) throw redirect(localPath(url.searchParams.get("next")));
  const { waiting } = await ownCodes(scope);
  const { name, email } = scope.actor;
  return { name, email, waiting, proofAsked: proofAsked(scope), next: localPath(url.searchParams.get("next")) };
}

/** The answer that shows the recovery codes is the last of this page: asked anew it would lead on, and they were gone. */
export const shouldRevalidate = ({ actionResult, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs) =>
  typeof actionResult === "object" && actionResult !== null && "recovery" in actionResult
    ? false
    : defaultShouldRevalidate;

export async function action({ request, context, url }: Route.ActionArgs) {
  const scope = heldScopeOf(context);
  if (!scope) throw redirect(localPath(url.searchParams.get("next")));
  const before = await tokenOf(request);
  const taken = await takeCodesForm(request, scope);
  if (taken === "begun" || taken === "off") throw redirect(`/sign-in/set-up${url.search}`);
  if (!("recovery" in taken)) return data({ recovery: null, ...taken }, { status: 400 });
  // From here on more is open than before, so the session is another one.
  if (before !== null) await endSession(before, scope.requestId);
  const session = await startSession(scope.actor.id, request.headers.get("User-Agent") ?? "", scope.requestId);
  return data(taken, {
    headers: { "Cache-Control": "no-store", "Set-Cookie": await sessionCookie(request, session) },
  });
}

export default function SetUpCodesRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { name, email, waiting, proofAsked: asked, next } = loaderData;
  const recovery = actionData && "recovery" in actionData ? actionData.recovery : null;
  return (
    <PublicCard>
      <div className="p-6">
        {recovery ? (
          <>
            <h1 className="text-answer font-medium">One-time codes are on</h1>
            <h2 className="mt-4 font-semibold">Your recovery codes</h2>
            <RecoveryCodes codes={recovery} />
            <p className="mt-4">
              <Link to={next} reloadDocument className="btn btn-primary">
                I have kept them: go on
              </Link>
            </p>
          </>
        ) : (
          <>
            <h1 className="text-answer font-medium">Set up one-time codes</h1>
            <p className="mt-2 mb-4 wrap-anywhere">
              {name}, {email}: your role signs in with a one-time code beside the password. Set codes up now; until then
              nothing else is open to you.
            </p>
            <SetUpCodes
              waiting={waiting}
              proofAsked={asked}
              proofFault={actionData && "proofFault" in actionData ? actionData.proofFault : undefined}
              codeFault={actionData && "codeFault" in actionData ? actionData.codeFault : undefined}
            />
            <Form method="post" action="/sign-out" className="mt-6 border-t border-line pt-4">
              <button type="submit" className="btn">
                Sign out
              </button>
            </Form>
          </>
        )}
      </div>
    </PublicCard>
  );
}
