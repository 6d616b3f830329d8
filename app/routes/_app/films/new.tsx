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

export async function action({ request, context }: Route.ActionArgs) {
  return saveLibraryForm(request, scopeOf(context), "film", { id: null, list: "/films" });
}

export default function NewFilm({ actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New film" crumbs={[{ name: "Films", path: "/films" }]} />
      <FilmForm record={null} version={null} lastResult={actionData?.lastResult} back="/films" />
    </>
  );
}
