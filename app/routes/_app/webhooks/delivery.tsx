import { redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DeliveryPage } from "#app/components/webhooks/DeliveryPage.tsx";
import { eventWords } from "#app/schemas/webhook.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { deliveryView, sendAgain } from "#app/services/webhooks/deliveries.server.ts";
import type { Route } from "./+types/delivery";

export const meta: Route.MetaFunction = () => [{ title: "A delivery · Planeward" }];

export async function loader({ context, params: { webhookId, deliveryId } }: Route.LoaderArgs) {
  return { delivery: await deliveryView(scopeOf(context), webhookId, deliveryId) };
}

export async function action({ context, params: { webhookId, deliveryId } }: Route.ActionArgs) {
  throw redirect(`/webhooks/${webhookId}/deliveries/${await sendAgain(scopeOf(context), webhookId, deliveryId)}`);
}

export default function Delivery({ loaderData: { delivery } }: Route.ComponentProps) {
  const { webhook, event, about } = delivery;
  return (
    <>
      <PageHead
        title={eventWords(event)}
        remark={`${about}, ${webhook.program}`}
        crumbs={[
          { name: "Webhooks", path: "/webhooks" },
          { name: webhook.name, path: `/webhooks/${webhook.id}` },
        ]}
      />
      <DeliveryPage delivery={delivery} />
    </>
  );
}
