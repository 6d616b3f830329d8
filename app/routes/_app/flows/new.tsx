import { data, redirect } from "react-router";
import { FlowForm } from "#app/components/flows/FlowForm.tsx";
import { StepTable } from "#app/components/flows/StepTable.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { newFlowSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, refusal } from "#app/server/form.server.ts";
import { addFlow, newFlowPage } from "#app/services/flows/new-flow-page.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New flow · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return newFlowPage(scopeOf(context), url.searchParams.get("stack"));
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

export default function NewFlow({ loaderData, actionData }: Route.ComponentProps) {
  const { proposal, values, program, silicon, bond } = loaderData;
  return (
    <>
      <PageHead
        title={proposal ? `New flow from ${proposal.stack.name}` : "New flow"}
        crumbs={[{ name: "Flows", path: "/flows" }]}
      />
      <FlowForm
        values={values}
        version={null}
        program={program}
        silicon={silicon}
        bond={bond}
        stack={proposal?.stack.id}
        lastResult={actionData?.lastResult}
        back={proposal ? `/stacks/${proposal.stack.id}` : "/flows"}
        save={proposal ? "Save with the steps below" : "Save and add steps"}
      />
      {proposal && (
        <section className="mt-6" aria-labelledby="proposal-head">
          <h2 id="proposal-head" className="text-figure font-medium">
            Steps proposed
          </h2>
          <p className="mt-1 mb-3 max-w-160 text-quiet">
            How these films could come onto the wafer and how it could be thinned. What the stack does not say is
            assumed: go through the steps afterwards and put in your own.
          </p>
          <div className="frame">
            <StepTable caption="Steps proposed" rows={proposal.rows} />
          </div>
        </section>
      )}
    </>
  );
}
