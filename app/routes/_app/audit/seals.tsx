import { AuditSeals } from "#app/components/audit/AuditSeals.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { auditState } from "#app/services/audit/seal.server.ts";
import type { Route } from "./+types/seals";

export const meta: Route.MetaFunction = () => [{ title: "Seals of the audit trail · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return auditState(scopeOf(context));
}

export default function Seals({ loaderData }: Route.ComponentProps) {
  return <AuditSeals state={loaderData} />;
}
