import { Link, redirect } from "react-router";
import { flowTemplateColumns, stepTemplateColumns } from "#app/components/flows/template-columns.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { FLOW_TEMPLATE_SORTS, listFlowTemplates } from "#app/services/flows/flow-templates.server.ts";
import { keepStep, listStepTemplates, STEP_TEMPLATE_SORTS } from "#app/services/flows/step-library.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/library";

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.kind === "steps" ? "Step library" : "Flow templates"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const mayEdit = mayOnSite(scope.actor, "edit the step library");
  if (params.kind === "flows") {
    const list = readListParams(url.searchParams, { sorts: FLOW_TEMPLATE_SORTS });
    return { kind: "flows" as const, page: await listFlowTemplates(scope, list), mayEdit };
  }
  if (params.kind !== "steps") throw notFound("library");
  const list = readListParams(url.searchParams, { sorts: STEP_TEMPLATE_SORTS });
  return { kind: "steps" as const, page: await listStepTemplates(scope, list), mayEdit };
}

/** Keeps a step of a flow in the library. */
export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const formData = await postedForm(request);
  const flowId = idFrom(String(formData.get("flow") ?? ""), "flow");
  switch (formData.get("intent")) {
    case "keep step":
      throw redirect(
        `/flows/library/steps/${await keepStep(scope, flowId, idFrom(String(formData.get("step") ?? ""), "step"))}`,
      );
    default:
      throw problem(400, "That is nothing that can be kept in the library.");
  }
}

const WORDS = {
  flows: {
    title: "Flow templates",
    one: "template",
    belongs:
      "A flow that the site uses again and again belongs here, with its films and tools. Open a flow and keep it as a template.",
  },
  steps: {
    title: "Step library",
    one: "step",
    belongs:
      "A step with its temperature, tool, exposures and films belongs here, to be put into flows. Keep one from a flow, or add one.",
  },
};

export default function FlowLibrary({ loaderData }: Route.ComponentProps) {
  const { kind, page, mayEdit } = loaderData;
  const { title, one, belongs } = WORDS[kind];
  const searched = page.params.query !== "";
  return (
    <>
      <PageHead
        title={title}
        crumbs={[{ name: "Flows", path: "/flows" }]}
        remark={`${page.total} ${searched ? "found" : page.total === 1 ? one : `${one}s`}`}
        actions={
          <>
            <Link to={kind === "flows" ? "/flows/library/steps" : "/flows/library/flows"} className="btn">
              {kind === "flows" ? WORDS.steps.title : WORDS.flows.title}
            </Link>
            {mayEdit && kind === "steps" && (
              <Link to="/flows/library/steps/new" className="btn btn-primary">
                Add a step
              </Link>
            )}
          </>
        }
      />
      <ListHead what={`${one}s`} />
      {page.rows.length === 0 ? (
        <EmptyState
          title={
            page.total > 0 ? `There is no page ${page.params.page}` : searched ? `No ${one} fits` : `No ${one} yet`
          }
        >
          {searched ? "Change the search." : belongs}
        </EmptyState>
      ) : loaderData.kind === "flows" ? (
        <DataTable caption={title} columns={flowTemplateColumns} page={loaderData.page} rowKey={({ id }) => id} />
      ) : (
        <DataTable caption={title} columns={stepTemplateColumns} page={loaderData.page} rowKey={({ id }) => id} />
      )}
    </>
  );
}
