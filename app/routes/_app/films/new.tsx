import { FilmForm } from "#app/components/films/FilmForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { saveLibraryForm } from "#app/services/library/library-form.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New film · Planeward" }];

export function loader({ context }: Route.LoaderArgs) {
  requireOnSite(scopeOf(context), "edit films");
  return null;
}

/** With `?stay` the form of a film stands beside something else, which it must not lead away from. */
export async function action({ request, context, url }: Route.ActionArgs) {
  const stay = url.searchParams.has("stay");
  return saveLibraryForm(request, scopeOf(context), "film", { id: null, list: "/films", stay });
}

export default function NewFilm({ actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New film" crumbs={[{ name: "Films", path: "/films" }]} />
      <FilmForm record={null} version={null} lastResult={actionData?.lastResult} back="/films" />
    </>
  );
}
