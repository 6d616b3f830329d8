import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { fileURLToPath } from "node:url";
import { afterEach, expect } from "vitest";
import { asOwner, type TestDatabase } from "#tests/db/test-database.ts";
import type { Deed } from "./deed-in-process.ts";

const root = fileURLToPath(new URL("../..", import.meta.url));

export type WrittenTable = "floor_entry" | "lot_sheet" | "mail_outbox" | "step_stop";

/** Deeds in processes of their own: one that is killed before its end, and one that is done. */
export function useDeeds(database: TestDatabase) {
  const started: ChildProcess[] = [];
  afterEach(() => {
    for (const child of started.splice(0)) child.kill("SIGKILL");
  });

  function start(deed: Deed): ChildProcess {
    const child = spawn(
      process.execPath,
      ["--import", "tsx", "tests/services/deed-in-process.ts", JSON.stringify(deed)],
      {
        cwd: root,
        env: { ...process.env, DATABASE_URL: database.appUrl, NODE_ENV: "production", LOG_LEVEL: "silent" },
        stdio: ["ignore", "ignore", "inherit"],
      },
    );
    started.push(child);
    return child;
  }

  /** Does the deed in a process that is killed when it comes to write into a table, mail unless another is named, then waits until the database knows. */
  async function killedBeforeItsEnd(deed: Deed, table: WrittenTable = "mail_outbox"): Promise<void> {
    const em = database.owner.em.fork();
    await em.transactional(async (held) => {
      await held
        .getConnection()
        .execute(`lock table ${table} in exclusive mode`, [], "run", held.getTransactionContext());
      const child = start(deed);
      await expect
        .poll(
          async () => {
            const [row] = await asOwner<{ waiting: number }>(
              database,
              `select count(*)::int as waiting from pg_locks
             where relation = '${table}'::regclass and not granted and database = (select oid from pg_database where datname = current_database())`,
            );
            return row?.waiting;
          },
          { timeout: 60_000 },
        )
        .toBe(1);
      child.kill("SIGKILL");
      await once(child, "exit");
    });
    // The server of the database notices by itself that nobody is there any more.
    await expect
      .poll(
        async () =>
          asOwner(
            database,
            `select pid from pg_stat_activity where datname = current_database() and state = 'idle in transaction' and usename <> current_user`,
          ),
        { timeout: 30_000 },
      )
      .toEqual([]);
  }

  async function done(deed: Deed): Promise<void> {
    const [code] = (await once(start(deed), "exit")) as [number | null];
    expect(code).toBe(0);
  }

  return { done, killedBeforeItsEnd };
}
