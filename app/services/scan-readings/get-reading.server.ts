import { ScanReading } from "#app/db/entities/scan-reading.ts";
import type { ScanReadingDetail } from "#app/schemas/scan-reading.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * What a file says, as it was stored.
 * @throws 404 for a reading that is not there or of another program
 */
export async function getReading(scope: ActorScope, id: string | undefined): Promise<ScanReadingDetail> {
  return inScope(scope, async (em) => {
    const found = await em.findOne(
      ScanReading,
      { id: idFrom(id, "scan") },
      { populate: ["program", "file", "createdBy", "result"] },
    );
    if (!found) throw notFound("scan");
    const { program, file, settings, engineVersion, createdAt, createdBy } = found;
    requireInProgram(scope, "see the work", program.id, "scan");
    return {
      id: found.id,
      program: { id: program.id, name: program.name, slug: program.slug },
      file: { id: file.id, name: file.name, size: file.size, hash: file.hash },
      settings,
      ...found.result.get(),
      engineVersion,
      createdAt: createdAt.toISOString(),
      createdBy: createdBy.name,
    };
  });
}
