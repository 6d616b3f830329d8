import { data, redirect } from "react-router";
import { StepForm } from "#app/components/flows/StepForm.tsx";
import { newStepValues } from "#app/components/flows/step-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { stepSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, statusOf } from "#app/server/form.server.ts";
import { libraryStepChoices } from "#app/services/flows/step-choices.server.ts";
import { saveStepTemplate } from "#app/services/flows/step-library.server.ts";
import { templateRefusal } from "#app/services/flows/template-refusal.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/new-step-template";

export const meta: Route.MetaFunction = () => [{ title: "New step of the library · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit the step library");
  return { choices: await libraryStepChoices(scope) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, stepSchema);
  if (submission.status !== "success") return data(templateRefusal(submission), { status: statusOf(submission) });
  const saved = await saveStepTemplate(scopeOf(context), { id: null, version: null, step: submission.value });
  if (saved.outcome !== "saved") return data(templateRefusal(submission, saved), { status: 409 });
  throw redirect("/flows/library/steps");
}

export default function NewStepTemplate({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title="New step of the library"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: "Step library", path: "/flows/library/steps" },
        ]}
      />
      <div className="max-w-260">
        <StepForm
          values={newStepValues("bare")}
          version={0}
          choices={loaderData.choices}
          lastResult={actionData?.lastResult}
          back="/flows/library/steps"
          next={null}
        />
      </div>
    </>
  );
}
