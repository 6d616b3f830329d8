import { log } from "#app/server/log.server.ts";
import { inScope } from "#app/server/scope.server.ts";

/** Whether a query gets through. */
export async function databaseAnswers(): Promise<boolean> {
  try {
    await inScope({ personId: null, requestId: "readiness" }, (em) => em.execute("select 1"));
    return true;
  } catch (error) {
    log.error({ error: String(error) }, "the database does not answer");
    return false;
  }
}
