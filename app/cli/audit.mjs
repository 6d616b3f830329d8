/**
 * `npm run audit-trail`: reads the audit trail again and compares it with its seals, of the database that the environment names or of this
 * copy's own while it runs. Ends with 1 where the two do not agree.
 */
import { spawnSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { databaseUrl } from "./database.mjs";
import { externalDatabase } from "./external-database.mjs";
import { ownFolder, root } from "./project.mjs";
import { keptPasswords } from "./secrets.mjs";
import { Sentence, printFailure } from "./sentence.mjs";

/** Where PostgreSQL writes the port that it listens on. */
const PORT_LINE = 3;

/** @returns {string} the owner's way into this copy's own database */
function ownDatabase() {
  try {
    const port = Number(readFileSync(join(ownFolder, "postgres", "postmaster.pid"), "utf8").split("\n")[PORT_LINE]);
    return databaseUrl({ port, passwords: keptPasswords() }, "owner", "planeward");
  } catch {
    throw new Sentence(
      "No database of this copy runs: npm start first, or name one by DATABASE_URL and DATABASE_OWNER_URL.",
    );
  }
}

try {
  const url = externalDatabase()?.ownerUrl ?? ownDatabase();
  const { status } = spawnSync(process.execPath, ["--import", "tsx", "app/db/verify-audit.ts"], {
    cwd: root,
    env: { ...process.env, DATABASE_OWNER_URL: url },
    stdio: "inherit",
  });
  process.exitCode = status ?? 1;
} catch (error) {
  printFailure(error);
  process.exitCode = 1;
}
