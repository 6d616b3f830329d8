import { FilmForm } from "#app/components/films/FilmForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { saveLibraryForm } from "#app/services/library/library-form.server.ts";
import { getLibraryRecord } from "#app/services/library/library.server.ts";
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
  return saveLibraryForm(request, scopeOf(context), "film", { id: idFrom(params.filmId, "film"), list: "/films" });
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
        record={record}
        version={actionData?.version ?? stamp.version}
        lastResult={actionData?.lastResult}
        conflict={actionData?.conflict}
        back={back}
      />
    </>
  );
}
