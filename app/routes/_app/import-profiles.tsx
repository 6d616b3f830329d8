import { data, Link, redirect } from "react-router";
import { ImportProfileList, type ProfileAnswer } from "#app/components/scans/ImportProfileList.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { matchRank } from "#app/lib/match-rank.ts";
import { importProfileRecordSchema } from "#app/schemas/import-profile.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm, saveProblem, versionOf } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { Saved } from "#app/services/record.server.ts";
import {
  getImportProfile,
  listImportProfiles,
  removeImportProfile,
  saveImportProfile,
} from "#app/services/import-profiles.server.ts";
import type { Route } from "./+types/import-profiles";

export const meta: Route.MetaFunction = () => [{ title: "Import profiles · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const { query } = readListParams(url.searchParams, { sorts: ["name"] });
  const profiles = await listImportProfiles(scopeOf(context));
  return { query, profiles: profiles.filter(({ name }) => matchRank(query, name) !== null) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const form = await postedForm(request);
  const id = String(form.get("id") ?? "");
  const version = versionOf(form);
  switch (form.get("intent")) {
    case "rename": {
      const name = importProfileRecordSchema.shape.name.safeParse(form.get("name"));
      if (!name.success) return fault(id, name.error.issues[0]?.message ?? "Name the instrument.");
      const profile = await getImportProfile(scope, id);
      return answer(id, await saveImportProfile(scope, { id, version, values: { name: name.data, profile } }));
    }
    case "remove":
      return answer(id, await removeImportProfile(scope, id, version));
    default:
      throw problem(400, "This form could not be read. Open the page again and send it once more.");
  }
}

function answer(id: string, saved: Saved) {
  const wrong = saveProblem(saved, "import profile");
  if (!wrong) throw redirect("/import-profiles");
  return fault(id, wrong.formErrors?.[0] ?? wrong.fieldErrors?.name[0] ?? "It is not saved.");
}

const fault = (id: string, sentence: string) => data<ProfileAnswer>({ id, sentence }, { status: 400 });

export default function ImportProfiles({ loaderData, actionData }: Route.ComponentProps) {
  const { profiles, query } = loaderData;
  return (
    <>
      <PageHead
        title="Import profiles"
        crumbs={[
          { name: "Scans", path: "/scans" },
          { name: "Import scans", path: "/scans/import" },
        ]}
        remark={profiles.length === 1 ? "1 instrument" : `${profiles.length} instruments`}
      />
      <p className="mb-4 max-w-160 text-quiet">
        How each instrument of the site writes its files, as somebody has confirmed it at an import. The next file of
        the instrument is read by it.
      </p>
      <ListHead what="instruments" />
      {profiles.length > 0 ? (
        <ImportProfileList profiles={profiles} answer={actionData ?? null} />
      ) : (
        <EmptyState
          title={query === "" ? "No profile is kept yet" : "No instrument fits"}
          actions={
            query === "" && (
              <Link to="/scans/import" className="btn">
                Import scans
              </Link>
            )
          }
        >
          {query === ""
            ? "When you import a file, keep how it was read under the name of its instrument."
            : "Change the search."}
        </EmptyState>
      )}
    </>
  );
}
