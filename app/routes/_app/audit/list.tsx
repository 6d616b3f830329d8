import { AuditList } from "#app/components/audit/AuditList.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { AUDIT_FILTERS, AUDIT_SORTS, auditChoices, listAudit } from "#app/services/audit/audit-list.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Audit trail · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: AUDIT_SORTS, filters: AUDIT_FILTERS, descending: true });
  return { page: withinPages(url, await listAudit(scope, params)), choices: await auditChoices(scope) };
}

export default function AuditTrail({ loaderData }: Route.ComponentProps) {
  return <AuditList {...loaderData} />;
}
