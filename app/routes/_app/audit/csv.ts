import { auditCsv } from "#app/lib/audit-csv.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { allAudit, AUDIT_FILTERS, AUDIT_SORTS } from "#app/services/audit/audit-list.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/csv";

/** The events of the trail as it is searched, every page of it. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: AUDIT_SORTS, filters: AUDIT_FILTERS, descending: true });
  return csvFile("Audit trail", auditCsv(await allAudit(scope, params), await csvMarkOf(scope)));
}
