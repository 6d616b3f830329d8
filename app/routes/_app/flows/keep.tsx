import { data, redirect } from "react-router";
import { KeepFlow } from "#app/components/flows/KeepFlow.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { keepFlow, keepFlowPage, replaceFlowTemplate } from "#app/services/flows/keep-flow.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/keep";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `Keep ${loaderData.flow.name} as a template` : "Flow"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return keepFlowPage(scopeOf(context), params.flowId);
}

/** Keeps the flow as a new template, or asks once more before it takes the place of one that is there. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const flowId = idFrom(params.flowId, "flow");
  const formData = await postedForm(request);
  const template = String(formData.get("template") ?? "");
  if (template === "") throw redirect(`/flows/library/flows/${await keepFlow(scope, flowId)}`);
  const templateId = idFrom(template, "flow template");
  if (formData.get("sure") !== templateId) return data({ asked: templateId });
  await replaceFlowTemplate(scope, flowId, templateId);
  throw redirect(`/flows/library/flows/${templateId}`);
}

export default function Keep({ loaderData, actionData }: Route.ComponentProps) {
  const { flow } = loaderData;
  return (
    <>
      <PageHead
        title="Keep as a template"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: `/flows/${flow.id}` },
        ]}
        remark={`${flow.name}, ${flow.steps} steps`}
      />
      <KeepFlow key={actionData?.asked} {...loaderData} asked={actionData?.asked ?? null} />
    </>
  );
}
