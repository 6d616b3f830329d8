import { data, redirect } from "react-router";
import { IntentForm } from "#app/components/flows/IntentForm.tsx";
import { StepForm } from "#app/components/flows/StepForm.tsx";
import { StepReading } from "#app/components/flows/StepReading.tsx";
import { stepFormValues } from "#app/components/flows/step-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { stepSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, statusOf, versionOf } from "#app/server/form.server.ts";
import { libraryStepChoices } from "#app/services/flows/step-choices.server.ts";
import { getStepTemplate, removeStepTemplate, saveStepTemplate } from "#app/services/flows/step-library.server.ts";
import { templateRefusal } from "#app/services/flows/template-refusal.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/step-template";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.step.title ?? "Step of the library"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const template = await getStepTemplate(scope, params.templateId);
  return { ...template, choices: template.mayEdit ? await libraryStepChoices(scope) : null };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const id = idFrom(params.templateId, "step of the library");
  const { formData, submission } = await readForm(request, stepSchema);
  if (formData.get("intent") === "remove") {
    await removeStepTemplate(scope, id);
    throw redirect("/flows/library/steps");
  }
  if (submission.status !== "success") return data(templateRefusal(submission), { status: statusOf(submission) });
  const saved = await saveStepTemplate(scope, { id, version: versionOf(formData), step: submission.value });
  if (saved.outcome !== "saved") return data(templateRefusal(submission, saved), { status: 409 });
  throw redirect("/flows/library/steps");
}

export default function StepTemplateRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { step, stamp, choices } = loaderData;
  return (
    <>
      <PageHead
        title={step.title}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: "Step library", path: "/flows/library/steps" },
        ]}
        remark={`Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
      />
      <div className="max-w-260">
        {choices ? (
          <>
            <StepForm
              key={`${step.id} ${stamp.version}`}
              values={stepFormValues(step)}
              version={actionData?.version ?? stamp.version}
              choices={choices}
              lastResult={actionData?.lastResult}
              conflict={actionData?.conflict}
              back="/flows/library/steps"
              next={null}
            />
            <details className="mt-4">
              <summary className="btn btn-remove list-none">Remove from the library</summary>
              <div className="mt-3 flex flex-wrap items-center gap-3">
                <p className="font-semibold">Remove it for the whole site? Flows that it was put into keep theirs.</p>
                <IntentForm intent="remove" busy="Removing" className="btn btn-remove">
                  Remove it
                </IntentForm>
              </div>
            </details>
          </>
        ) : (
          <StepReading step={step} />
        )}
      </div>
    </>
  );
}
