import { TickedPage } from "#app/components/ui/ticks/TickedPage.tsx";
import { tickedIds, tickedVersions } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { assessTicked, tickedFlows } from "#app/services/ticked/ticked-flows.server.ts";
import type { Route } from "./+types/assess";

export const meta: Route.MetaFunction = () => [{ title: "Assess flows again · Planeward" }];

export function loader({ context, url }: Route.LoaderArgs) {
  return tickedFlows(scopeOf(context), tickedIds(url.searchParams));
}

export async function action({ request, context }: Route.ActionArgs) {
  return assessTicked(scopeOf(context), [...tickedVersions(await postedForm(request)).keys()]);
}

export default function AssessFlows({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <TickedPage
      title="Assess flows again"
      what={["flow", "flows"]}
      list={{ name: "Flows", path: "/flows" }}
      asked={loaderData}
      done={actionData}
      did="Assessed"
      button={{
        label: (number) => `Assess ${number}`,
        busy: (number) => `Assessing ${number}`,
        meanwhile:
          "One after the other; what has become of each is said here. If you leave, it goes on, and each flow shows its new revision.",
      }}
    >
      Each is assessed as it is now and gets a new revision. Sheets of earlier revisions stay as they are.
    </TickedPage>
  );
}
