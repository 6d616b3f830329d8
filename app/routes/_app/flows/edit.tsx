import { data, redirect } from "react-router";
import { FlowForm } from "#app/components/flows/FlowForm.tsx";
import { flowFormValues } from "#app/components/flows/flow-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { flowSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import { changeFlow, getFlow } from "#app/services/flows/flows.server.ts";
import { headChoices } from "#app/services/flows/head-choices.server.ts";
import { requireInProgram } from "#app/services/permission.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/edit";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.flow.name ?? "Flow"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const {
    steps: _steps,
    mayEdit: _mayEdit,
    mayAssess: _mayAssess,
    stamp,
    ...flow
  } = await getFlow(scope, params.flowId);
  requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
  const { silicon: wafers } = await headChoices(scope);
  return { flow, stamp, wafers };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { formData, submission } = await readForm(request, flowSchema);
  if (submission.status !== "success") return data(refusal(submission, null, "flow"), { status: 400 });
  const id = idFrom(params.flowId, "flow");
  const saved = await changeFlow(scopeOf(context), { id, version: versionOf(formData), values: submission.value });
  if (saved.outcome !== "saved") return data(refusal(submission, saved, "flow"), { status: 409 });
  throw redirect(`/flows/${saved.id}`);
}

export default function EditFlow({ loaderData, actionData }: Route.ComponentProps) {
  const { flow, stamp, wafers } = loaderData;
  const back = `/flows/${flow.id}`;
  return (
    <>
      <PageHead
        title="Name and wafer"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: back },
        ]}
        remark={`Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
      />
      <FlowForm
        values={flowFormValues(flow)}
        version={actionData?.version ?? stamp.version}
        program={flow.program}
        silicon={wafers}
        lastResult={actionData?.lastResult}
        back={back}
        save="Save"
      />
    </>
  );
}
