import { data, redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { SecretShown } from "#app/components/webhooks/SecretShown.tsx";
import { WebhookPage } from "#app/components/webhooks/WebhookPage.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { proveAgain } from "#app/services/people/recent-proof.server.ts";
import {
  DELIVERY_FILTERS,
  DELIVERY_SORTS,
  listDeliveries,
  sendTest,
} from "#app/services/webhooks/deliveries.server.ts";
import { deleteWebhook, renewSecret, switchWebhook, webhookPage } from "#app/services/webhooks/webhooks.server.ts";
import type { Route } from "./+types/webhook";

const DONE = {
  on: "The webhook is on. What happens from now on is sent to it.",
  off: "The webhook is off. Nothing is sent to it.",
};

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.webhook.name ?? "A webhook"} · Planeward` },
];

export async function loader({ context, params: { webhookId }, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, {
    sorts: DELIVERY_SORTS,
    filters: DELIVERY_FILTERS,
    descending: true,
  });
  const done = url.searchParams.get("done");
  return {
    ...(await webhookPage(scope, webhookId)),
    page: withinPages(url, await listDeliveries(scope, webhookId, params)),
    done: done === "on" || done === "off" ? DONE[done] : null,
  };
}

export async function action({ request, context, params: { webhookId } }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  const intent = formData.get("intent");
  if (intent === "test") throw redirect(`/webhooks/${webhookId}/deliveries/${await sendTest(scope, webhookId)}`);
  if (intent === "on" || intent === "off") {
    await switchWebhook(scope, webhookId, intent);
    throw redirect(`/webhooks/${webhookId}?done=${intent}`);
  }
  if (intent === "delete") {
    await deleteWebhook(scope, webhookId);
    throw redirect("/webhooks?done=deleted");
  }
  if (intent !== "renew") throw problem(400, "This is no deed. Open the page again and press one of its buttons.");
  const proven = await proveAgain(scope, postedProof(formData));
  if (proven.fault !== null) return data({ secret: null, proofFault: proven.fault }, { status: 400 });
  return data(
    { secret: await renewSecret(proven.scope, webhookId), proofFault: undefined },
    { headers: { "Cache-Control": "no-store" } },
  );
}

export default function WebhookRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { done, ...shown } = loaderData;
  return (
    <>
      <PageHead title={shown.webhook.name} crumbs={[{ name: "Webhooks", path: "/webhooks" }]} />
      {actionData?.secret && <SecretShown title="The secret is renewed." secret={actionData.secret} />}
      {done && !actionData && <Notice kind="done" title={done} />}
      <WebhookPage {...shown} proofFault={actionData?.proofFault} />
    </>
  );
}
