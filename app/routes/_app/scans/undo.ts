import { postedForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { removeWaiting, undoScan, undoTable, type Undone } from "#app/services/wafers/undo-import.server.ts";
import type { Route } from "./+types/undo";

/** What is undone is sent by the list of an import; there is nothing to look at. */
export function loader({ context }: Route.LoaderArgs): never {
  scanPrograms(scopeOf(context), "upload scans");
  throw problem(404, "Nothing is shown here. Open the scan to undo its import.");
}

/** Undoes what an import has just brought in. */
export async function action({ request, context }: Route.ActionArgs): Promise<Undone> {
  const scope = scopeOf(context);
  const form = await postedForm(request);
  const id = String(form.get("id") ?? "");
  switch (form.get("what")) {
    case "scan":
      return undoScan(scope, id, "leave");
    case "waiting":
      return removeWaiting(scope, id);
    case "table":
      return undoTable(scope, id);
    default:
      throw problem(400, "This form could not be read. Open the page again and send it once more.");
  }
}
