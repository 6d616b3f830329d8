import { data, redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { NewLots } from "#app/components/lots/NewLots.tsx";
import { LOT_TABLE_LIMIT } from "#app/lib/lot-table-limit.ts";
import { newLotForm } from "#app/schemas/new-lot-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { makeLots } from "#app/services/wafers/new-lots.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New lots · Planeward" }];

export function loader({ context }: Route.LoaderArgs) {
  const programs = scanPrograms(scopeOf(context), "upload scans");
  return { programs: programs.map(({ programId, programName }) => ({ value: programId, label: programName })) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { formData, files, tooLarge } = await readUpload(request, ["file"], LOT_TABLE_LIMIT);
  const bytes = files.file?.bytes;
  if (bytes && bytes.length > 0) formData.set("wafers", new TextDecoder().decode(bytes));
  const submission = parseForm(formData, newLotForm);
  const refused = (wafers: string[]) => data(submission.reply({ fieldErrors: { wafers } }), { status: 400 });
  if (tooLarge.file) return refused([`${tooLarge.file.name} is larger than ${LOT_TABLE_LIMIT.words}.`]);
  if (submission.status !== "success") return data(submission.reply(), { status: 400 });
  const made = await makeLots(scopeOf(context), submission.value);
  if (made.outcome === "refused") return refused(made.faults);
  throw redirect(made.only === null ? "/lots" : `/lots/${made.only}`);
}

export default function NewLot({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title="New lots"
        crumbs={[
          { name: "Scans", path: "/scans" },
          { name: "Lots", path: "/lots" },
        ]}
      />
      <NewLots programs={loaderData.programs} answer={actionData} />
    </>
  );
}
