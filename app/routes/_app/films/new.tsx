import { data, redirect } from "react-router";
import { FilmForm } from "#app/components/films/FilmForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { filmSchema } from "#app/schemas/film.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, refusal } from "#app/server/form.server.ts";
import { saveLibraryRecord } from "#app/services/library/library.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New film · Planeward" }];

export function loader({ context }: Route.LoaderArgs) {
  requireOnSite(scopeOf(context), "edit films");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, filmSchema);
  if (submission.status !== "success") return data(refusal(submission, null, "film"), { status: 400 });
  const saved = await saveLibraryRecord(scopeOf(context), "film", {
    id: null,
    version: null,
    values: submission.value,
  });
  if (saved.outcome !== "saved") return data(refusal(submission, saved, "film"), { status: 409 });
  throw redirect(`/films/${saved.id}`);
}

export default function NewFilm({ actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New film" crumbs={[{ name: "Films", path: "/films" }]} />
      <FilmForm values={{}} version={null} lastResult={actionData?.lastResult} back="/films" />
    </>
  );
}
