import { PredictionsPage } from "#app/components/predictions/PredictionsPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { predictionsPage } from "#app/services/predictions/predictions.server.ts";
import type { Route } from "./+types/predictions";

export const meta: Route.MetaFunction = () => [{ title: "Predicted against measured · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const predictions = await predictionsPage(scopeOf(context), url.searchParams);
  withinPages(url, predictions.page);
  return { predictions };
}

export default function Predictions({ loaderData }: Route.ComponentProps) {
  return <PredictionsPage predictions={loaderData.predictions} />;
}
