import { data, redirect } from "react-router";
import { StepForm } from "#app/components/flows/StepForm.tsx";
import { StepLibraryPane } from "#app/components/flows/StepLibraryPane.tsx";
import { WaferBeforePane } from "#app/components/flows/WaferBeforePane.tsx";
import { newStepValues, stepFormValues } from "#app/components/flows/step-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { stepSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, statusOf, versionOf } from "#app/server/form.server.ts";
import { stepRefusal } from "#app/services/flows/step-refusal.server.ts";
import { newStepPage } from "#app/services/flows/step-page.server.ts";
import { saveStep } from "#app/services/flows/steps.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/new-step";

export const meta: Route.MetaFunction = () => [{ title: "New step · Planeward" }];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return newStepPage(scopeOf(context), { flowId: params.flowId, search: url.searchParams });
}

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const flowId = idFrom(params.flowId, "flow");
  const { number } = await newStepPage(scope, { flowId, search: url.searchParams });
  const { formData, submission } = await readForm(request, stepSchema);
  if (submission.status !== "success") return data(stepRefusal(submission), { status: statusOf(submission) });
  const place = { flowId, stepId: null, position: number - 1, version: versionOf(formData) };
  const saved = await saveStep(scope, place, submission.value);
  if (saved.outcome !== "saved") return data(stepRefusal(submission, saved), { status: 409 });
  throw redirect(
    formData.get("then") === "next"
      ? `/flows/${flowId}/steps/new?at=${number + 1}`
      : `/flows/${flowId}?step=${saved.id}`,
  );
}

export default function NewStepRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { flow, number, of, planned, before, choices, library } = loaderData;
  const back = `/flows/${flow.id}`;
  return (
    <>
      <PageHead
        title={`New step ${number}`}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: back },
        ]}
        remark={number > of ? "at the end of the flow" : `before what is step ${number} now`}
      />
      <div className="grid gap-4 wide:grid-cols-[minmax(0,1fr)_320px]">
        <StepForm
          key={`${number} ${flow.version} ${library.chosen?.id ?? ""}`}
          values={library.chosen ? stepFormValues(library.chosen.step) : newStepValues(planned)}
          version={actionData?.version ?? flow.version}
          choices={choices}
          lastResult={actionData?.lastResult}
          conflict={actionData?.conflict}
          back={back}
          next="Save and add another"
        />
        <div className="space-y-4">
          <StepLibraryPane library={library} number={number} />
          <WaferBeforePane wafer={before} number={number} />
        </div>
      </div>
    </>
  );
}
