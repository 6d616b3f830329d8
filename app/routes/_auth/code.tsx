import { data, Form, Link, redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { CodeField } from "#app/components/people/CodeField.tsx";
import { localPath } from "#app/lib/local-path.ts";
import { PEER_HEADER } from "#app/server/connection.server.ts";
import { actorContext, requestIdContext } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { clearedHalfCookie, halfOf, sessionCookie, tokenOf } from "#app/server/session-cookie.server.ts";
import { whoIsHalfSignedIn } from "#app/services/codes/half-signed-in.server.ts";
import { takeSecondStep } from "#app/services/codes/second-step.server.ts";
import { endSession } from "#app/services/sessions.server.ts";
import type { Route } from "./+types/code";

export const meta: Route.MetaFunction = () => [{ title: "One-time code · Planeward" }];

export async function loader({ request, context, url }: Route.LoaderArgs) {
  if (context.get(actorContext)) throw redirect(localPath(url.searchParams.get("next")));
  const held = await halfOf(request);
  const person = held === null ? null : await whoIsHalfSignedIn(held, context.get(requestIdContext));
  if (!person) throw redirect(`/sign-in${url.search}`);
  return { email: person.email, again: `/sign-in${url.search}` };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const requestId = context.get(requestIdContext);
  const typed = (await postedForm(request)).get("code");
  const code = typeof typed === "string" ? typed.trim().slice(0, 100) : "";
  const held = await halfOf(request);
  if (held === null) throw redirect(`/sign-in${url.search}`);
  if (code === "") return data({ fault: "Type the code that your app shows." }, { status: 400 });
  const step = await takeSecondStep(held, code, {
    address: request.headers.get(PEER_HEADER) ?? "",
    userAgent: request.headers.get("User-Agent") ?? "",
    requestId,
  });
  if (step.outcome === "over") throw redirect(`/sign-in${url.search}`);
  if (step.outcome !== "signed in")
    return data({ fault: step.sentence }, { status: step.outcome === "too many" ? 429 : 400 });
  // A session that the browser had before is not the one that was proved now.
  const before = await tokenOf(request);
  if (before !== null) await endSession(before, requestId);
  const headers = new Headers();
  headers.append("Set-Cookie", await sessionCookie(request, step.session));
  headers.append("Set-Cookie", await clearedHalfCookie(request));
  throw redirect(localPath(url.searchParams.get("next")), { headers });
}

export default function Code({ loaderData: { email, again }, actionData }: Route.ComponentProps) {
  return (
    <PublicCard>
      <div className="p-6">
        <h1 className="text-answer font-medium">One more step: your one-time code</h1>
        <p className="mt-2 wrap-anywhere">
          For {email}. Your password is right; the code must come within five minutes of it.
        </p>
        <Form method="post" className="mt-4 space-y-2">
          <CodeField name="code" label="Code" error={actionData?.fault} />
          <SubmitButton busy="Signing in">Sign in</SubmitButton>
        </Form>
        <p className="mt-4 text-quiet">
          Neither app nor recovery codes at hand: ask an administrator to reset your codes.
        </p>
        <p className="mt-1">
          <Link to={again} className="link">
            Begin anew, or as somebody else
          </Link>
        </p>
      </div>
    </PublicCard>
  );
}
