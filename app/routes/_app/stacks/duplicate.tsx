import { TickedPage } from "#app/components/ui/ticks/TickedPage.tsx";
import { tickedIds, tickedVersions } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { duplicateStacks, tickedStacks } from "#app/services/ticked/ticked-stacks.server.ts";
import type { Route } from "./+types/duplicate";

export const meta: Route.MetaFunction = () => [{ title: "Duplicate stacks · Planeward" }];

export function loader({ context, url }: Route.LoaderArgs) {
  return tickedStacks(scopeOf(context), tickedIds(url.searchParams), "A copy is added to its program.");
}

export async function action({ request, context }: Route.ActionArgs) {
  return duplicateStacks(scopeOf(context), [...tickedVersions(await postedForm(request)).keys()]);
}

export default function DuplicateStacks({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <TickedPage
      what={["stack", "stacks"]}
      list={{ name: "Stacks", path: "/stacks" }}
      title="Duplicate stacks"
      asked={loaderData}
      done={actionData}
      did="Copied"
      button={{ label: (number) => `Duplicate ${number}`, busy: (number) => `Copying ${number}` }}
    >
      Each copy stays in the program of its stack, as it is saved now, under the same name with a number behind it.
    </TickedPage>
  );
}
