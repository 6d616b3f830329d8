import { redirect } from "react-router";
import { ChooseStack } from "#app/components/stacks/sweep/ChooseStack.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { requireInSomeProgram } from "#app/services/permission.server.ts";
import { stackChoices } from "#app/services/stacks.server.ts";
import { isUuid } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/sweep-choice";

export const meta: Route.MetaFunction = () => [{ title: "Sweep a stack · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  requireInSomeProgram(scope, "see the work");
  const of = url.searchParams.get("of") ?? "";
  if (isUuid(of)) throw redirect(`/stacks/${of}/sweep`);
  return { stacks: await stackChoices(scope) };
}

export default function ChooseStackToSweep({ loaderData }: Route.ComponentProps) {
  return <ChooseStack {...loaderData} />;
}
