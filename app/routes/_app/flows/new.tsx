import { data, redirect } from "react-router";
import { FlowForm } from "#app/components/flows/FlowForm.tsx";
import { NewFlowOffers } from "#app/components/flows/NewFlowOffers.tsx";
import { StepTable } from "#app/components/flows/StepTable.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { newFlowSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, refusal } from "#app/server/form.server.ts";
import { addFlow, newFlowPage } from "#app/services/flows/new-flow-page.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New flow · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return newFlowPage(scopeOf(context), url.searchParams);
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, newFlowSchema);
  if (submission.status !== "success") return data(refusal(submission, null, "flow"), { status: 400 });
  const added = await addFlow(scopeOf(context), submission.value);
  if (added.outcome === "bond missing")
    return data({ lastResult: submission.reply({ fieldErrors: added.fieldErrors }), version: null }, { status: 400 });
  if (added.outcome !== "saved") return data(refusal(submission, added, "flow"), { status: 409 });
  throw redirect(`/flows/${added.id}`);
}

const BACK = { stack: "/stacks", template: "/flows/library/flows", flow: "/flows" };

const PROPOSED =
  "How these films could come onto the wafer and how it could be thinned. What the stack does not say is assumed: go through the steps afterwards and put in your own.";
const TAKEN = "Every step as it is there. Change them afterwards: what this starts from stays as it is.";

export default function NewFlow({ loaderData, actionData }: Route.ComponentProps) {
  const { origin, offers, values, program, silicon, bond } = loaderData;
  const proposed = origin?.kind === "stack";
  return (
    <>
      <PageHead
        title={origin ? `New flow from ${origin.name}` : "New flow"}
        crumbs={[{ name: "Flows", path: "/flows" }]}
      />
      <div className={offers ? "grid gap-4 wide:grid-cols-[minmax(0,60rem)_minmax(0,1fr)]" : undefined}>
        <FlowForm
          key={origin?.id}
          values={values}
          version={null}
          program={program}
          silicon={silicon}
          bond={bond}
          origin={origin}
          lastResult={actionData?.lastResult}
          back={origin ? `${BACK[origin.kind]}/${origin.id}` : "/flows"}
          save={origin ? "Save with the steps below" : "Save and add steps"}
        />
        {offers && <NewFlowOffers {...offers} />}
      </div>
      {origin && (
        <section className="mt-6" aria-labelledby="proposal-head">
          <h2 id="proposal-head" className="text-figure font-medium">
            {proposed ? "Steps proposed" : `${origin.rows.length} steps`}
          </h2>
          <p className="mt-1 mb-3 max-w-160 text-quiet">{proposed ? PROPOSED : TAKEN}</p>
          <div className="frame">
            <StepTable caption={proposed ? "Steps proposed" : "Steps it starts with"} rows={origin.rows} />
          </div>
        </section>
      )}
    </>
  );
}
