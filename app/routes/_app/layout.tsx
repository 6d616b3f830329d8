import { isRouteErrorResponse, Outlet } from "react-router";
import { ErrorPage } from "#app/components/layout/ErrorPage.tsx";
import { Footer } from "#app/components/layout/Footer.tsx";
import { TopBar } from "#app/components/layout/TopBar.tsx";
import { OwnUnitsProvider } from "#app/components/units/own-units-context.ts";
import { roleInWords } from "#app/policies/role-words.ts";
import { placesFor } from "#app/policies/places.ts";
import { DEFAULT_PREFERENCES } from "#app/lib/preferences.ts";
import { visits } from "#app/middleware/visits.server.ts";
import { signedIn } from "#app/middleware/signed-in.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { mineOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/layout";

export const middleware: Route.MiddlewareFunction[] = [signedIn, visits];

/** Title of what has none of its own: a refusal inside. */
export const meta: Route.MetaFunction = () => [{ title: "Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { actor } = scope;
  return {
    person: { name: actor.name, role: roleInWords(actor) },
    places: placesFor(actor),
    programs: actor.memberships.map(({ programName }) => programName),
    mine: await mineOf(scope),
  };
}

export default function AppLayout({ loaderData }: Route.ComponentProps) {
  return (
    <OwnUnitsProvider value={loaderData.mine.preferences}>
      <TopBar {...loaderData} />
      <main id="main" className="mx-auto max-w-page px-4 pb-6 tablet:px-6" tabIndex={-1}>
        <Outlet />
      </main>
      <Footer />
    </OwnUnitsProvider>
  );
}

/** A refusal inside keeps the frame of the application, so the way out is where it always is. */
export function ErrorBoundary({ error, loaderData }: Route.ErrorBoundaryProps) {
  return (
    <OwnUnitsProvider value={loaderData?.mine.preferences ?? DEFAULT_PREFERENCES}>
      {loaderData && <TopBar {...loaderData} />}
      <main id="main" className="mx-auto max-w-page px-4 py-6 tablet:px-6">
        <ErrorPage status={isRouteErrorResponse(error) ? error.status : 500} error={error} />
      </main>
    </OwnUnitsProvider>
  );
}
