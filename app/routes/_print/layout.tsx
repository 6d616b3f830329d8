import { isRouteErrorResponse, Outlet } from "react-router";
import { ErrorPage } from "#app/components/layout/ErrorPage.tsx";
import { signedIn } from "#app/middleware/signed-in.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { preferencesFor } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [signedIn];

/** A layout without a loader would let a navigation in the browser pass the door. */
export async function loader({ context }: Route.LoaderArgs) {
  return { mine: { preferences: await preferencesFor(scopeOf(context)) } };
}

export default function PrintLayout() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return (
    <main className="mx-auto max-w-page p-6">
      <ErrorPage status={isRouteErrorResponse(error) ? error.status : 500} error={error} />
    </main>
  );
}
