import { data, Link, redirect, type ShouldRevalidateFunctionArgs } from "react-router";
import { ChangedNotice } from "#app/components/changes/ChangedNotice.tsx";
import { FlowAnswer } from "#app/components/flows/FlowAnswer.tsx";
import { FlowConflictNotice } from "#app/components/flows/FlowConflictNotice.tsx";
import { FlowFigures } from "#app/components/flows/FlowFigures.tsx";
import { FlowLots } from "#app/components/flows/FlowLots.tsx";
import { FlowPlan } from "#app/components/flows/FlowPlan.tsx";
import { FlowSteps, STEPS_FORM } from "#app/components/flows/FlowSteps.tsx";
import { IntentForm } from "#app/components/flows/IntentForm.tsx";
import { RemoveFlow } from "#app/components/flows/RemoveFlow.tsx";
import { WhatIf } from "#app/components/flows/WhatIf.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { flowFigures } from "#app/lib/flow-figures.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { doFlowIntent } from "#app/services/flows/flow-intent.server.ts";
import { flowPage } from "#app/services/flows/flow-page.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/flow";

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${loaderData?.name ?? "Flow"} · Planeward` }];

export async function loader({ context, params }: Route.LoaderArgs) {
  return flowPage(scopeOf(context), params.flowId);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const result = await doFlowIntent(scopeOf(context), idFrom(params.flowId, "flow"), await postedForm(request));
  if ("path" in result) throw redirect(result.path);
  return data(result, { status: result.status });
}

/** After a conflict the steps are to be seen as they are now. */
export function shouldRevalidate({ actionStatus, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  return actionStatus === 409 || defaultShouldRevalidate;
}

export default function FlowRoute({ loaderData: flow, actionData }: Route.ComponentProps) {
  const fault = actionData && "fault" in actionData ? actionData.fault : null;
  const conflicted = actionData && "conflict" in actionData ? actionData : null;
  const { stamp, mayEdit, mayAssess, assessments } = flow;
  return (
    <>
      <PageHead
        title={flow.name}
        crumbs={[{ name: "Flows", path: "/flows" }]}
        remark={`${flow.program}. Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
        actions={
          <>
            <Link to={`/flows/compare?of=${flow.id}`} className="btn">
              Compare
            </Link>
            {mayEdit && (
              <>
                <Link to="edit" className="btn">
                  Name and wafer
                </Link>
                {flow.mayKeep && (
                  <Link to="keep" className="btn">
                    Keep as template
                  </Link>
                )}
                <IntentForm intent="copy" busy="Copying" className="btn">
                  Copy
                </IntentForm>
              </>
            )}
            {mayAssess && (
              <IntentForm intent="assess" busy="Assessing" className="btn btn-primary">
                Assess
              </IntentForm>
            )}
          </>
        }
      />
      <ChangedNotice
        of={`flow:${flow.id}`}
        since={`${stamp.version} ${assessments.length}`}
        title="Somebody has changed or assessed this flow since you opened it."
      >
        What you do to its steps is refused until you have seen theirs.
      </ChangedNotice>
      {conflicted && (
        <FlowConflictNotice
          conflict={conflicted.conflict}
          again={conflicted.again}
          flowId={flow.id}
          form={STEPS_FORM}
        />
      )}
      {fault && (
        <Notice
          kind="error"
          title={
            fault.step === null ? "Nothing could be computed" : `Step ${fault.step} cannot be computed, so nothing is`
          }
        >
          {fault.reason}
        </Notice>
      )}
      <div className="frame">
        <FlowAnswer assessments={assessments} mayAssess={mayAssess} />
        <FlowLots lots={flow.lots} />
        <FlowFigures figures={flowFigures(flow)} />
        {flow.rows.length > 0 && (
          <div className="border-t border-ink max-tablet:hidden">
            <FlowPlan steps={flow.plan} />
          </div>
        )}
        {mayAssess && flow.rows.length > 0 && (
          <div className="screen-only border-t border-ink">
            <WhatIf flowId={flow.id} version={stamp.version} mayEdit={mayEdit} />
          </div>
        )}
        <section className="border-t border-ink" aria-labelledby="steps-head">
          <h2 id="steps-head" className="sr-only">
            Steps
          </h2>
          <FlowSteps
            flowId={flow.id}
            version={stamp.version}
            rows={flow.rows}
            history={flow.history}
            mayEdit={mayEdit}
            fault={fault && fault.step !== null ? { step: fault.step, reason: fault.reason } : null}
          />
        </section>
        {(flow.note || mayEdit) && (
          <div className="space-y-4 border-t border-ink p-4 tablet:px-6">
            {flow.note && <p className="max-w-160 whitespace-pre-line">{flow.note}</p>}
            {mayEdit && <RemoveFlow name={flow.name} assessed={assessments.length > 0} />}
          </div>
        )}
      </div>
    </>
  );
}
