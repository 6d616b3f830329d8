import { MeasuredPage } from "#app/components/predictions/MeasuredPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { measuredForm } from "#app/services/predictions/measured-form.server.ts";
import { stepMeasurements } from "#app/services/predictions/step-measurements.server.ts";
import type { Route } from "./+types/measured";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Measured after a step · ${loaderData?.page.flow.name ?? "Assessment"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { page: await stepMeasurements(scopeOf(context), params.assessmentId) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return measuredForm(request, scopeOf(context), params.assessmentId);
}

export default function Measured({ loaderData, actionData }: Route.ComponentProps) {
  return <MeasuredPage page={loaderData.page} answer={actionData ?? null} />;
}
