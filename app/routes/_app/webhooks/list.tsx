import { data } from "react-router";
import { WebhooksPage } from "#app/components/webhooks/WebhooksPage.tsx";
import { newWebhookSchema } from "#app/schemas/webhook.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { proveAgain } from "#app/services/people/recent-proof.server.ts";
import { makeWebhook, webhooksView } from "#app/services/webhooks/webhooks.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Webhooks · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return { ...(await webhooksView(scopeOf(context))), deleted: url.searchParams.get("done") === "deleted" };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const { formData, submission } = await readForm(request, newWebhookSchema(environment.WEBHOOK_HTTP));
  if (submission.status !== "success")
    return data({ lastResult: submission.reply(), secret: null, proofFault: undefined }, { status: 400 });
  const proven = await proveAgain(scope, postedProof(formData));
  if (proven.fault !== null)
    return data(
      { lastResult: submission.reply({ formErrors: [proven.fault.sentence] }), secret: null, proofFault: proven.fault },
      { status: 400 },
    );
  const made = await makeWebhook(proven.scope, submission.value);
  if ("refused" in made)
    return data(
      { lastResult: submission.reply({ fieldErrors: { name: [made.refused] } }), secret: null, proofFault: undefined },
      { status: 409 },
    );
  // Shown by the answer to the form itself: a secret has no place in an address or a history.
  return data(
    { lastResult: undefined, secret: made.secret, proofFault: undefined },
    { headers: { "Cache-Control": "no-store" } },
  );
}

export default function Webhooks({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <WebhooksPage
      {...loaderData}
      secret={actionData?.secret ?? null}
      lastResult={actionData?.lastResult}
      proofFault={actionData?.proofFault}
    />
  );
}
