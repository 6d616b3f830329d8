import { randomUUID } from "node:crypto";
import type { AuditState } from "#app/schemas/audit.ts";
import { log } from "#app/server/log.server.ts";
import { inScope, type ActorScope, type Scope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";

/** Gives what was written since the last time its place and its hash in the chain of its program. */
export async function sealAudit(): Promise<number> {
  const work: Scope = { personId: null, atWork: true, requestId: randomUUID() };
  const [row] = await inScope(work, (em) => em.execute<{ sealed: number }[]>("select seal_audit() as sealed"));
  return row?.sealed ?? 0;
}

/** Reads the whole trail again and compares it with its seals. Whoever keeps the newest hashes elsewhere can tell as well that none were cut off. */
export async function auditState(scope: ActorScope): Promise<AuditState> {
  requireOnSite(scope, "see the audit trail");
  return inScope(scope, async (em) => {
    const chains = await em.execute<{ program: string | null; count: number; hash: string; at: Date | string }[]>(
      `select program.name as program, s.number as count, s.hash, s.sealed_at as at
         from (select distinct on (chain) chain, number, hash, sealed_at from audit_seal order by chain, number desc) s
         left join program on program.id = s.chain order by program.name nulls first`,
    );
    const faults = await em.execute<AuditState["faults"]>(
      `select program.name as program, f.number, f.event_id as "eventId", f.fault
         from audit_faults() f left join program on program.id = f.chain limit 100`,
    );
    if (faults.length > 0) log.error({ faults: faults.length }, "the audit trail does not agree with its seals");
    return {
      sealed: chains.reduce((sum, { count }) => sum + count, 0),
      chains: chains.map((chain) => ({ ...chain, at: new Date(chain.at).toISOString() })),
      faults,
    };
  });
}
