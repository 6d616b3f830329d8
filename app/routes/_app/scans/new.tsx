import { data, redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ScanForm } from "#app/components/scans/ScanForm.tsx";
import { LARGEST_ON_REQUEST, SCAN_FILE_LIMIT, tooLargeSentence } from "#app/lib/scan-file.ts";
import { scanSchema } from "#app/schemas/scan.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { readUpload, type Upload } from "#app/server/upload.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { uploadByJob } from "#app/services/scan-pair-job.server.ts";
import { uploadScan } from "#app/services/scan-upload.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "Upload scans · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const programs = scanPrograms(scope, "upload scans");
  const films = await allOfLibrary(scope, "film");
  return {
    programs: programs.map(({ programId, programName }) => ({ value: programId, label: programName })),
    films: films.map(({ id, name }) => ({ value: id, label: name })),
  };
}

type Which = "before" | "after";
const FILES: readonly Which[] = ["before", "after"];

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  scanPrograms(scope, "upload scans");
  const upload = await readUpload(request, FILES, SCAN_FILE_LIMIT);
  const submission = parseForm(upload.formData, scanSchema);
  const { before, after } = upload.files;
  if (submission.status !== "success" || !before || !after) {
    const status = Object.keys(upload.tooLarge).length > 0 ? 413 : 400;
    return data({ lastResult: submission.reply({ fieldErrors: fileFaults(upload) }) }, { status });
  }
  const isLarge = Math.max(before.bytes.length, after.bytes.length) > LARGEST_ON_REQUEST;
  const uploaded = await (isLarge ? uploadByJob : uploadScan)(scope, submission.value, { before, after });
  if (uploaded.outcome === "stored") throw redirect(`/scans/${uploaded.id}`);
  if (uploaded.outcome === "job") throw redirect("/jobs");
  const { field, reason } = uploaded;
  const lastResult =
    field === ""
      ? submission.reply({ formErrors: [reason] })
      : submission.reply({ fieldErrors: { [field]: [reason] } });
  return data({ lastResult }, { status: 400 });
}

/** What is wrong with the two files before anything in them is read. */
function fileFaults({ files, tooLarge }: Upload<Which>): Record<string, string[]> {
  const faults: Record<string, string[]> = {};
  for (const which of FILES) {
    const large = tooLarge[which];
    if (large) faults[which] = [tooLargeSentence(large.name, large.size)];
    else if (!files[which]) faults[which] = [`Choose the file ${which} the film.`];
  }
  return faults;
}

export default function NewScan({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Upload scans" crumbs={[{ name: "Scans", path: "/scans" }]} />
      <ScanForm {...loaderData} lastResult={actionData?.lastResult} />
    </>
  );
}
