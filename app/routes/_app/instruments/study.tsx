import { data, redirect } from "react-router";
import { StudyForm } from "#app/components/instruments/StudyForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { fileSize } from "#app/lib/file-size.ts";
import { MOST_REPEAT_FILES, REPEAT_FILE } from "#app/lib/repeat-files.ts";
import { studySchema } from "#app/schemas/instrument.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { readUploads } from "#app/server/upload.server.ts";
import { addStudy } from "#app/services/instruments/add-study.server.ts";
import { referenceForm } from "#app/services/instruments/reference-readings.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/study";

export const meta: Route.MetaFunction = () => [{ title: "New repeatability study · Planeward" }];

export async function loader({ context, params }: Route.LoaderArgs) {
  const { instrument } = await referenceForm(scopeOf(context), params.instrumentId);
  return { instrument };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "check instruments");
  const { formData, files, tooLarge } = await readUploads(request, "files", MOST_REPEAT_FILES, REPEAT_FILE);
  const submission = parseForm(formData, studySchema);
  const fault = filesFault(files.length + tooLarge.length, tooLarge[0]);
  if (submission.status !== "success" || fault !== null)
    return data({ lastResult: submission.reply(fault ? { fieldErrors: { files: [fault] } } : {}) }, { status: 400 });
  const added = await addStudy(scope, params.instrumentId, submission.value, files);
  if (added.outcome === "stored") throw redirect(`/instruments/${params.instrumentId}`);
  return data({ lastResult: submission.reply({ fieldErrors: { [added.field]: [added.reason] } }) }, { status: 400 });
}

function filesFault(count: number, large: { name: string; size: number } | undefined): string | null {
  if (large) return `${large.name} has ${fileSize(large.size)}; a file may have up to ${REPEAT_FILE.words}.`;
  return count > MOST_REPEAT_FILES ? `${count} files are more than a study takes, ${MOST_REPEAT_FILES}.` : null;
}

export default function NewStudy({ loaderData: { instrument }, actionData }: Route.ComponentProps) {
  const back = `/instruments/${instrument.id}`;
  return (
    <>
      <PageHead
        title="New repeatability study"
        crumbs={[
          { name: "Instruments", path: "/instruments" },
          { name: instrument.name, path: back },
        ]}
      />
      <StudyForm lastResult={actionData?.lastResult} back={back} />
    </>
  );
}
