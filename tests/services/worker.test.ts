import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { fileURLToPath } from "node:url";
import { afterEach, beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const root = fileURLToPath(new URL("../..", import.meta.url));
const workers: ChildProcess[] = [];

/** The real worker, on this file's database. */
function startWorker(): ChildProcess {
  const env = { ...process.env, DATABASE_URL: database.appUrl, NODE_ENV: "production", LOG_LEVEL: "silent" };
  const worker = spawn(process.execPath, ["--import", "tsx", "app/jobs/worker.ts"], {
    cwd: root,
    env,
    stdio: "ignore",
  });
  workers.push(worker);
  return worker;
}

afterEach(() => {
  for (const worker of workers.splice(0)) worker.kill("SIGKILL");
});

let technician: ActorScope;

beforeAll(async () => {
  await import("#app/services/scan-readings/import-files.server.ts");
  technician = await scopeOfPerson(database, "technician");
}, 60_000);

/** A job of two files, one of them some 16 MB large. */
async function startJob(): Promise<string> {
  const { importScanFiles } = await import("#app/services/scan-readings/import-files.server.ts");
  const program = technician.actor.memberships[0]?.programId ?? "";
  const text = (rows: number) =>
    `Position [mm],Height [um]\n${Array.from({ length: rows }, (_, n) => `${(n / rows).toFixed(8)},${((n / rows) ** 2).toFixed(9)}\n`).join("")}`;
  const files = [700_000, 1_000].map((rows) => ({ name: `${rows}.csv`, bytes: new TextEncoder().encode(text(rows)) }));
  const imported = await importScanFiles(technician, { program, files, settings: { profile: {}, edgeExclusion: 0 } });
  if (imported.outcome !== "job") throw new Error("A batch is read by a job.");
  return imported.job;
}

async function stateOf(id: string): Promise<string | undefined> {
  const [row] = await asOwner<{ state: string }>(database, "select state from job where id = ?", [id]);
  return row?.state;
}

test(
  "a worker that is killed in the middle of a job leaves it to the next one, which ends when it is told",
  { timeout: 90_000 },
  async () => {
    const killed = startWorker();
    const id = await startJob();
    await expect.poll(() => stateOf(id), { timeout: 30_000, interval: 10 }).toBe("running");
    killed.kill("SIGKILL");
    await once(killed, "exit");
    expect(await stateOf(id)).toBe("running");

    const next = startWorker();
    await expect.poll(() => stateOf(id), { timeout: 45_000, interval: 100 }).toBe("done");
    const readings = await asOwner(
      database,
      "select 1 from scan_reading reading join scan_file file on file.id = reading.file_id where file.name ~ '^[0-9]+\\.csv$'",
    );
    expect(readings).toHaveLength(2);
    next.kill("SIGTERM");
    const [code] = (await once(next, "exit")) as [number | null];
    expect(code).toBe(0);
  },
);
