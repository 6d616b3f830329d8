import { TodayForGuest } from "#app/components/today/TodayForGuest.tsx";
import { TodayPage } from "#app/components/today/TodayPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { todayView } from "#app/services/today.server.ts";
import type { Route } from "./+types/today";

export const meta: Route.MetaFunction = () => [{ title: "Today · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { view: await todayView(scopeOf(context)) };
}

export default function Today({ loaderData }: Route.ComponentProps) {
  const { view } = loaderData;
  return view.works ? <TodayPage view={view} /> : <TodayForGuest view={view} />;
}
