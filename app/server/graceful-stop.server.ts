import { closeOrm } from "#app/db/orm.server.ts";
import { stopHearing } from "./changes.server.ts";
import { log } from "./log.server.ts";

const LONGEST_WAIT = 10_000;
const kept = globalThis as { planewardStops?: boolean };

/**
 * The web server closes its listener on SIGTERM and lets requests finish; this closes the pool afterwards and ends the process,
 * at the latest after ten seconds.
 */
export function stopGracefully(): void {
  if (kept.planewardStops) return;
  kept.planewardStops = true;
  const stop = (signal: NodeJS.Signals) => {
    log.info({ signal }, "stopping");
    setTimeout(() => process.exit(0), LONGEST_WAIT).unref();
    // Who listens for changes would hold a request for minutes.
    void stopHearing();
    // Requests under way hold the pool until they are done, so closing it waits for them.
    void closeOrm().finally(() => setTimeout(() => process.exit(0), 100));
  };
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
}
