import { data, Link, redirect } from "react-router";
import { IntentForm } from "#app/components/flows/IntentForm.tsx";
import { StepForm } from "#app/components/flows/StepForm.tsx";
import { StepReading } from "#app/components/flows/StepReading.tsx";
import { WaferBeforePane } from "#app/components/flows/WaferBeforePane.tsx";
import { stepFormValues } from "#app/components/flows/step-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { stepSchema } from "#app/schemas/flow.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, statusOf, versionOf } from "#app/server/form.server.ts";
import { stepRefusal } from "#app/services/flows/step-refusal.server.ts";
import { stepPage } from "#app/services/flows/step-page.server.ts";
import { saveStep } from "#app/services/flows/steps.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/step";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: loaderData ? `Step ${loaderData.number}, ${loaderData.step.title} · Planeward` : "Step · Planeward" },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return stepPage(scopeOf(context), params);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const flowId = idFrom(params.flowId, "flow");
  const stepId = idFrom(params.stepId, "step");
  const { formData, submission } = await readForm(request, stepSchema);
  if (submission.status !== "success") return data(stepRefusal(submission), { status: statusOf(submission) });
  const place = { flowId, stepId, position: 0, version: versionOf(formData) };
  const saved = await saveStep(scope, place, submission.value);
  if (saved.outcome !== "saved") return data(stepRefusal(submission, saved), { status: 409 });
  if (formData.get("then") === "next") {
    const { next } = await stepPage(scope, params);
    if (next) throw redirect(`/flows/${flowId}/steps/${next}`);
  }
  throw redirect(`/flows/${flowId}?step=${saved.id}`);
}

export default function StepRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { flow, step, removed, number, of, previous, next, before, choices, mayKeep } = loaderData;
  const back = `/flows/${flow.id}?step=${step.id}`;
  return (
    <>
      <PageHead
        title={`Step ${number}, ${step.title}`}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: back },
        ]}
        remark={removed ? "removed" : `${number} of ${of}`}
        actions={
          <>
            {mayKeep && (
              <IntentForm
                intent="keep step"
                action="/flows/library/steps"
                fields={{ flow: flow.id, step: step.id }}
                busy="Keeping"
                className="btn"
              >
                Keep in the step library
              </IntentForm>
            )}
            {previous && (
              <Link to={`/flows/${flow.id}/steps/${previous}`} className="btn" rel="prev">
                Step {number - 1}
              </Link>
            )}
            {next && (
              <Link to={`/flows/${flow.id}/steps/${next}`} className="btn" rel="next">
                Step {number + 1}
              </Link>
            )}
          </>
        }
      />
      {removed && (
        <Notice kind="caution" title="This step has been removed from the flow">
          It is shown as it last was. Saving puts it back as step {number}.
        </Notice>
      )}
      <div className="grid gap-4 wide:grid-cols-[minmax(0,1fr)_320px]">
        {choices ? (
          <StepForm
            key={`${step.id} ${flow.version}`}
            values={stepFormValues(step)}
            version={actionData?.version ?? flow.version}
            choices={choices}
            lastResult={actionData?.lastResult}
            conflict={actionData?.conflict}
            back={back}
            next={next ? `Save and open step ${number + 1}` : null}
          />
        ) : (
          <StepReading step={step} />
        )}
        <WaferBeforePane wafer={before} number={number} />
      </div>
    </>
  );
}
