import { data, Link } from "react-router";
import { z } from "zod";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ImportScreen } from "#app/components/scans/import/ImportScreen.tsx";
import { importProfileRecordSchema } from "#app/schemas/import-profile.ts";
import { profileText, type KeptAnswer } from "#app/schemas/scan-import.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { listImportProfiles, saveImportProfile } from "#app/services/import-profiles.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import type { Route } from "./+types/import";

export const meta: Route.MetaFunction = () => [{ title: "Import scans · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = scanPrograms(scope, "upload scans");
  const [films, profiles] = await Promise.all([allOfLibrary(scope, "film"), listImportProfiles(scope)]);
  return {
    programs: programs.map(({ programId, programName }) => ({ value: programId, label: programName })),
    films: films.map(({ id, name }) => ({ value: id, label: name })),
    profiles: profiles.map(({ id, name, profile }) => ({ id, name, profile })),
  };
}

const keptSchema = importProfileRecordSchema.extend({ profile: profileText });

/** Keeps how an instrument writes its files, under the instrument's name. */
export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const read = keptSchema.safeParse(Object.fromEntries(await request.formData()));
  if (!read.success) return refused(z.flattenError(read.error));
  const saved = await saveImportProfile(scope, { id: null, version: null, values: read.data });
  if (saved.outcome === "saved") return data<KeptAnswer>({ kept: { id: saved.id, name: read.data.name } });
  return data<KeptAnswer>({ fault: "An instrument of that name has a profile already. Choose another name." }, 409);
}

function refused({ fieldErrors, formErrors }: z.core.$ZodFlattenedError<z.output<typeof keptSchema>>) {
  const [fault = "This profile cannot be kept."] = [
    ...(fieldErrors.name ?? []),
    ...(fieldErrors.profile ?? []),
    ...formErrors,
  ];
  return data<KeptAnswer>({ fault }, 400);
}

export default function ImportScans({ loaderData }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title="Import scans"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        actions={
          <Link to="/import-profiles" className="btn">
            Import profiles
          </Link>
        }
      />
      <ImportScreen {...loaderData} />
    </>
  );
}
