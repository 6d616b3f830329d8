import { redirect } from "react-router";
import { attachment } from "#app/lib/content-disposition.ts";
import { sheetPath } from "#app/lib/sheet-path.ts";
import { printFormSchema } from "#app/schemas/sheet-view.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { revisionPage } from "#app/services/sheets/revision-page.server.ts";
import { printSheet } from "#app/services/sheets/sheet-file.server.ts";
import type { Route } from "./+types/pdf";

/** A paper is taken out by the form of its page, which says for which place. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const { id } = await revisionPage(scopeOf(context), params.revisionId);
  throw redirect(sheetPath(id));
}

/** The stored PDF, and an entry of who took it out. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const { submission } = await readForm(request, printFormSchema);
  if (submission.status !== "success")
    throw problem(
      400,
      "Which paper was meant could not be read. Open the page of the sheet, choose paper and pages, and print from there.",
    );
  const { bytes, name } = await printSheet(scopeOf(context), params.revisionId, submission.value);
  return new Response(new Uint8Array(bytes), {
    headers: { "Content-Type": "application/pdf", "Content-Disposition": attachment(`${name}.pdf`) },
  });
}
