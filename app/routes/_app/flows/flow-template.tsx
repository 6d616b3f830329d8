import { data, Form, Link, redirect } from "react-router";
import { IntentForm } from "#app/components/flows/IntentForm.tsx";
import { StepTable } from "#app/components/flows/StepTable.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import { templateNameSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { getFlowTemplate, removeFlowTemplate, renameFlowTemplate } from "#app/services/flows/flow-templates.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/flow-template";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.name ?? "Template"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return getFlowTemplate(scopeOf(context), params.templateId);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const id = idFrom(params.templateId, "flow template");
  const { formData, submission } = await readForm(request, templateNameSchema);
  if (formData.get("intent") === "remove") {
    await removeFlowTemplate(scope, id);
    throw redirect("/flows/library/flows");
  }
  const typed = { name: String(formData.get("name") ?? ""), note: String(formData.get("note") ?? "") };
  if (submission.status !== "success") {
    const { error } = submission.reply();
    return data({ typed, errors: { name: error?.["name"]?.[0], note: error?.["note"]?.[0] } }, { status: 400 });
  }
  if ((await renameFlowTemplate(scope, id, submission.value)) === "saved") throw redirect(`/flows/library/flows/${id}`);
  return data(
    { typed, errors: { name: "There is already a template of that name.", note: undefined } },
    { status: 409 },
  );
}

export default function FlowTemplateRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { id, name, note, diameter, rows, stamp, mayEdit } = loaderData;
  return (
    <>
      <PageHead
        title={name}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: "Flow templates", path: "/flows/library/flows" },
        ]}
        remark={`${formatQuantity(diameter, "length", { unit: "mm" })}, ${rows.length} steps. Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
        actions={
          mayEdit && (
            <Link to={`/flows/new?template=${id}`} className="btn btn-primary">
              New flow from it
            </Link>
          )
        }
      />
      <div className="frame">
        {note && <p className="max-w-160 border-b border-line p-4 whitespace-pre-line tablet:px-6">{note}</p>}
        <StepTable caption="Steps of the template" rows={rows} />
        {mayEdit && (
          <div className="space-y-3 border-t border-ink p-4 tablet:px-6">
            <Form
              method="post"
              key={stamp.version}
              className="grid max-w-200 items-start gap-3 tablet:grid-cols-[1fr_1fr_auto]"
            >
              <TextField
                name="name"
                label="Name"
                defaultValue={actionData?.typed.name ?? name}
                error={actionData?.errors.name}
              />
              <TextField
                name="note"
                label="Note"
                defaultValue={actionData?.typed.note ?? note}
                error={actionData?.errors.note}
              />
              <div className="tablet:pt-5">
                <SubmitButton busy="Saving">Save name</SubmitButton>
              </div>
            </Form>
            <p className="text-quiet">
              To change its steps,{" "}
              <Link to={`/flows/new?template=${id}`} className="link">
                make a flow from it
              </Link>
              , change that, press ‘Keep as template’ there and choose ‘In place of ‘{name}’’.
            </p>
            <details>
              <summary className="btn btn-remove list-none">Remove this template</summary>
              <div className="mt-3 flex flex-wrap items-center gap-3">
                <p className="font-semibold">Remove it for the whole site? Flows that began from it stay.</p>
                <IntentForm intent="remove" busy="Removing" className="btn btn-remove">
                  Remove it
                </IntentForm>
              </div>
            </details>
          </div>
        )}
      </div>
    </>
  );
}
