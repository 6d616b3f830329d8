import { data } from "react-router";
import { ChangeRequestPage } from "#app/components/assessments/ChangeRequestPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { changeRequestPage } from "#app/services/assessments/change-request-page.server.ts";
import type { Route } from "./+types/change-request";

export const meta: Route.MetaFunction = () => [{ title: "What would change? · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const page = await changeRequestPage(scopeOf(context), url.searchParams);
  return data(page, { status: Object.keys(page.form.errors).length > 0 ? 400 : 200 });
}

export default function ChangeRequest({ loaderData }: Route.ComponentProps) {
  return <ChangeRequestPage {...loaderData} />;
}
