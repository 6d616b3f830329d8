import { data, redirect } from "react-router";
import { AssessmentPage } from "#app/components/assessments/AssessmentPage.tsx";
import { recordNumber } from "#app/lib/record-number.ts";
import { assessmentView } from "#app/lib/assessment-view.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { getAssessment, runAgain } from "#app/services/assessments/assessments.server.ts";
import { whatChanged } from "#app/services/assessments/what-changed.server.ts";
import type { Route } from "./+types/assessment";

export const meta: Route.MetaFunction = ({ loaderData }) => {
  const head = loaderData?.view.head;
  return [
    {
      title: `${head ? recordNumber("assessment", head.program.slug, head.documentNumber) : "Assessment"} · Planeward`,
    },
  ];
};

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { result, ...head } = await getAssessment(scope, params.assessmentId);
  return {
    view: assessmentView(head, result, url.searchParams.get("step"), url.searchParams.get("leg")),
    changed: head.outOfDate ? await whatChanged(scope, head.lot?.of.id ?? head.id) : null,
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  // A body that is no form asks for nothing.
  const form = await request.formData().catch(() => null);
  if (form?.get("intent") !== "run")
    throw problem(400, "An assessment can be run again, and nothing else can be done with it here.");
  const ran = await runAgain(scopeOf(context), params.assessmentId);
  if (ran.outcome === "not computable") return data(ran, { status: 409 });
  throw redirect(`/assessments/${ran.id}`);
}

export default function Assessment({ loaderData, actionData }: Route.ComponentProps) {
  return <AssessmentPage {...loaderData} refused={actionData} />;
}
