import { data, redirect } from "react-router";
import { ReviewPage } from "#app/components/review/ReviewPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { publicOrigin } from "#app/server/public-origin.server.ts";
import { takeReviewForm } from "#app/services/sheets/review-form.server.ts";
import { reviewPage } from "#app/services/sheets/review-page.server.ts";
import type { Route } from "./+types/review";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Review of ${loaderData?.view.assessment.name ?? "an assessment"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { view: await reviewPage(scopeOf(context), params.assessmentId) };
}

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const refused = await takeReviewForm(request, scopeOf(context), params.assessmentId, publicOrigin(url));
  if (refused) return data(refused, { status: 400 });
  throw redirect(`/assessments/${params.assessmentId}/review`);
}

export default function Review({ loaderData, actionData }: Route.ComponentProps) {
  return <ReviewPage view={loaderData.view} answer={actionData} />;
}
