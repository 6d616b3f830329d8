import { data, redirect } from "react-router";
import { LotTryPage } from "#app/components/lot/LotTryPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { answerLotForm } from "#app/services/assessments/lot-form.server.ts";
import { lotPage } from "#app/services/assessments/lot.server.ts";
import type { Route } from "./+types/lot";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `This lot · ${loaderData?.page.flow.name ?? "Assessment"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { page: await lotPage(scopeOf(context), params.assessmentId) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const answer = await answerLotForm(request, scopeOf(context), params.assessmentId);
  if ("path" in answer) throw redirect(answer.path);
  return data(answer.body, { status: answer.status });
}

export default function Lot({ loaderData, actionData }: Route.ComponentProps) {
  return <LotTryPage page={loaderData.page} answer={actionData} />;
}
