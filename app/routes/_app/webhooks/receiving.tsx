import { ReceivingPage } from "#app/components/webhooks/ReceivingPage.tsx";
import { exampleSignature } from "#app/services/webhooks/sign.server.ts";
import type { Route } from "./+types/receiving";

export const meta: Route.MetaFunction = () => [{ title: "Receiving webhooks · Planeward" }];

/** It says nothing of anybody's work, so everybody who is signed in may read it. */
export const loader = () => ({ example: exampleSignature() });

export default function Receiving({ loaderData }: Route.ComponentProps) {
  return <ReceivingPage {...loaderData} />;
}
