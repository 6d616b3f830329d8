import { randomUUID } from "node:crypto";
import { Program } from "#app/db/entities/program.ts";
import type { PrintRetention, PrintRetentionValues } from "#app/schemas/print-retention.ts";
import { log } from "#app/server/log.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";

/** How long each program keeps who printed its sheets. */
export async function printRetention(scope: ActorScope): Promise<PrintRetention[]> {
  requireOnSite(scope, "edit site settings");
  return inScope(scope, async (em) => {
    const programs = await em.findAll(Program, { orderBy: { name: "asc" } });
    return programs.map(({ id, name, printsKeptYears }) => ({ id, name, years: printsKeptYears ?? null }));
  });
}

/** Says so for the programs that are named; those that are not known are passed over. */
export async function savePrintRetention(scope: ActorScope, values: PrintRetentionValues): Promise<void> {
  requireOnSite(scope, "edit site settings");
  await inScope(scope, async (em) => {
    const years = new Map(values.map((value) => [value.program, value.years]));
    for (const program of await em.find(Program, { id: [...years.keys()] }))
      program.printsKeptYears = years.get(program.id) ?? null;
    await em.flush();
  });
}

/** Takes out what is older than its program keeps; the trail keeps how many went. */
export async function forgetOldPrints(): Promise<number> {
  const requestId = randomUUID();
  const work = { personId: null, atWork: true, requestId };
  const [row] = await inScope(work, (em) =>
    em.execute<{ gone: number }[]>("select forget_old_prints(?) as gone", [requestId]),
  );
  const gone = row?.gone ?? 0;
  if (gone > 0) log.info({ gone, requestId }, "prints beyond their retention were taken out");
  return gone;
}
