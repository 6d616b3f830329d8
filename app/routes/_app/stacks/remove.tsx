import { TickedPage } from "#app/components/ui/ticks/TickedPage.tsx";
import { tickedIds, tickedVersions } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { removeStacks, tickedStacks } from "#app/services/ticked/ticked-stacks.server.ts";
import type { Route } from "./+types/remove";

export const meta: Route.MetaFunction = () => [{ title: "Remove stacks · Planeward" }];

export function loader({ context, url }: Route.LoaderArgs) {
  return tickedStacks(scopeOf(context), tickedIds(url.searchParams), "It goes for good.");
}

export async function action({ request, context }: Route.ActionArgs) {
  return removeStacks(scopeOf(context), tickedVersions(await postedForm(request)));
}

export default function RemoveStacks({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <TickedPage
      what={["stack", "stacks"]}
      list={{ name: "Stacks", path: "/stacks" }}
      title="Remove stacks"
      asked={loaderData}
      done={actionData}
      did="Removed"
      button={{
        label: (number) => `Remove ${number} for good`,
        busy: (number) => `Removing ${number}`,
        removes: true,
      }}
    >
      There is no way back. Flows and assessments do not depend on these stacks and stay.
    </TickedPage>
  );
}
