import { isRouteErrorResponse, Outlet } from "react-router";
import { FloorRefused } from "#app/components/floor/FloorRefused.tsx";
import { OwnUnitsProvider } from "#app/components/units/own-units-context.ts";
import { DEFAULT_PREFERENCES } from "#app/lib/preferences.ts";
import { signedIn } from "#app/middleware/signed-in.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { mineOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [signedIn];

export const meta: Route.MetaFunction = () => [{ title: "Floor · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { mine: await mineOf(scopeOf(context)) };
}

/** The floor has the whole screen: one lot, one step, no search and no places. */
export default function FloorLayout({ loaderData }: Route.ComponentProps) {
  return (
    <OwnUnitsProvider value={loaderData.mine.preferences}>
      <Outlet />
    </OwnUnitsProvider>
  );
}

export function ErrorBoundary({ error, loaderData }: Route.ErrorBoundaryProps) {
  return (
    <OwnUnitsProvider value={loaderData?.mine.preferences ?? DEFAULT_PREFERENCES}>
      <FloorRefused status={isRouteErrorResponse(error) ? error.status : 500} error={error} />
    </OwnUnitsProvider>
  );
}
