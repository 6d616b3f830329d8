import { data, redirect } from "react-router";
import { FilmForm } from "#app/components/films/FilmForm.tsx";
import { filmFormValues } from "#app/components/films/film-form-values.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { filmSchema } from "#app/schemas/film.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import { getLibraryRecord, saveLibraryRecord } from "#app/services/library/library.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/edit";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Film"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit films");
  return getLibraryRecord(scope, "film", params.filmId);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { formData, submission } = await readForm(request, filmSchema);
  if (submission.status !== "success") return data(refusal(submission, null, "film"), { status: 400 });
  const saved = await saveLibraryRecord(scopeOf(context), "film", {
    id: idFrom(params.filmId, "film"),
    version: versionOf(formData),
    values: submission.value,
  });
  if (saved.outcome !== "saved") return data(refusal(submission, saved, "film"), { status: 409 });
  throw redirect(`/films/${saved.id}`);
}

export default function EditFilm({ loaderData, actionData }: Route.ComponentProps) {
  const { record, stamp } = loaderData;
  const back = `/films/${record.id}`;
  return (
    <>
      <PageHead
        title={record.name}
        crumbs={[{ name: "Films", path: "/films" }]}
        remark={`Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
      />
      <FilmForm
        values={filmFormValues(record)}
        version={actionData?.version ?? stamp.version}
        lastResult={actionData?.lastResult}
        back={back}
      />
    </>
  );
}
