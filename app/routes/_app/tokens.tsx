import { data, redirect } from "react-router";
import { TokensPage } from "#app/components/tokens/TokensPage.tsx";
import { newTokenSchema, revokeTokenSchema } from "#app/schemas/api-token.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { proveAgain } from "#app/services/people/recent-proof.server.ts";
import { makeToken, revokeToken, tokensView } from "#app/services/api/tokens.server.ts";
import type { Route } from "./+types/tokens";

export const meta: Route.MetaFunction = () => [{ title: "API tokens · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return { ...(await tokensView(scopeOf(context))), revoked: url.searchParams.get("done") === "revoked" };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  if (formData.get("intent") === "revoke") {
    const asked = parseForm(formData, revokeTokenSchema);
    if (asked.status !== "success") throw problem(400, "This is no token. Open the page again and choose one from it.");
    await revokeToken(scope, asked.value.token);
    throw redirect("/tokens?done=revoked");
  }
  const submission = parseForm(formData, newTokenSchema);
  if (submission.status !== "success")
    return data({ lastResult: submission.reply(), made: null, proofFault: undefined }, { status: 400 });
  const proven = await proveAgain(scope, postedProof(formData));
  if (proven.fault !== null)
    return data(
      { lastResult: submission.reply({ formErrors: [proven.fault.sentence] }), made: null, proofFault: proven.fault },
      { status: 400 },
    );
  const made = await makeToken(proven.scope, submission.value);
  if ("refused" in made)
    return data(
      { lastResult: submission.reply({ fieldErrors: { name: [made.refused] } }), made: null, proofFault: undefined },
      { status: 409 },
    );
  // Shown by the answer to the form itself: a token has no place in an address or a history.
  return data(
    { lastResult: undefined, made: made.token, proofFault: undefined },
    { headers: { "Cache-Control": "no-store" } },
  );
}

export default function Tokens({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <TokensPage
      {...loaderData}
      made={actionData?.made ?? null}
      lastResult={actionData?.lastResult}
      proofFault={actionData?.proofFault}
    />
  );
}
