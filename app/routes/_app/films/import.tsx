import { data, redirect } from "react-router";
import { FilmImport } from "#app/components/films/FilmImport.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { filmImportForm } from "#app/services/films/import-form.server.ts";
import type { Route } from "./+types/import";

export const meta: Route.MetaFunction = () => [{ title: "Import films · Planeward" }];

export function loader({ context }: Route.LoaderArgs) {
  requireOnSite(scopeOf(context), "edit films");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const imported = await filmImportForm(request, scopeOf(context));
  if (imported.outcome === "done") throw redirect(`/films?imported=${imported.added + imported.changed}`);
  const refused = imported.outcome === "refused";
  return data(imported, { status: refused ? 400 : imported.conflict === null ? 200 : 409 });
}

export default function ImportFilms({ actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Import films" crumbs={[{ name: "Films", path: "/films" }]} />
      <FilmImport imported={actionData ?? null} />
    </>
  );
}
