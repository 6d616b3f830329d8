import { Wafer } from "#app/db/entities/wafer.ts";
import type { WaferStatusForm } from "#app/schemas/wafer-status-form.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * Says where wafers of a lot stand: in line, held, broken, scrapped or done. The audit trail keeps what they were.
 * @throws 404 for a lot or wafer that is not there or of another program, 403 for a role that may not
 */
export async function setWaferStatus(
  scope: ActorScope,
  lotId: string | undefined,
  { wafers, status }: Omit<WaferStatusForm, "intent">,
): Promise<void> {
  await inScope(scope, async (em) => {
    const found = await em.find(Wafer, { id: { $in: wafers }, lot: idFrom(lotId, "lot") });
    const [first] = found;
    if (!first || found.length !== new Set(wafers).size) throw notFound("wafer");
    requireInProgram(scope, "work on the floor", first.program.id, "wafer");
    for (const wafer of found) wafer.status = status;
    await em.flush();
  });
}
