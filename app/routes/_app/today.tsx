import { TodayForGuest } from "#app/components/today/TodayForGuest.tsx";
import { TodayPage } from "#app/components/today/TodayPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { todayView } from "#app/services/today.server.ts";
import type { Route } from "./+types/today";

export const meta: Route.MetaFunction = () => [{ title: "Today · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return { view: await todayView(scopeOf(context)), told: url.searchParams.get("demo") };
}

export default function Today({ loaderData }: Route.ComponentProps) {
  const { view, told } = loaderData;
  return view.works ? <TodayPage view={view} told={told} /> : <TodayForGuest view={view} />;
}
