import { execFileSync } from "node:child_process";
import { existsSync, readdirSync } from "node:fs";
import { join } from "node:path";
import { installDebianPackages, withoutDebiansCluster } from "./debian.mjs";
import { Sentence } from "./sentence.mjs";

/** The oldest PostgreSQL whose defaults the roles rely on: from here on only its owner may create in schema public. */
const oldestMajor = 15;

/**
 * @typedef {{ folder: string, major: number }} PostgresPrograms folder: where initdb, postgres and psql lie
 */

/** @param {string} folder */
function isComplete(folder) {
  return ["initdb", "postgres", "psql"].every((program) => existsSync(join(folder, program)));
}

/**
 * @param {string} program
 * @param {string} argument
 * @returns {string} what the program prints, nothing where it isn't there
 */
function ask(program, argument) {
  try {
    return execFileSync(program, [argument], { encoding: "utf8", stdio: ["ignore", "pipe", "ignore"] }).trim();
  } catch {
    return "";
  }
}

/**
 * All PostgreSQL versions on this machine that can be used, the newest first.
 *
 * @returns {PostgresPrograms[]}
 */
function installedPostgres() {
  const debian = "/usr/lib/postgresql";
  const folders = existsSync(debian) ? readdirSync(debian).map((major) => join(debian, major, "bin")) : [];
  return [...folders, ask("pg_config", "--bindir")]
    .filter((folder) => folder && isComplete(folder))
    .map((folder) => ({ folder, major: Number(/\d+/.exec(ask(join(folder, "postgres"), "--version"))?.[0]) }))
    .filter(({ major }) => major >= oldestMajor)
    .sort((left, right) => right.major - left.major);
}

/**
 * Finds PostgreSQL's programs, and installs Debian's where there are none.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {number | undefined} major the version that existing data were made with; the newest when undefined
 * @returns {Promise<PostgresPrograms>}
 */
export async function ensurePostgres(keeper, major) {
  const choose = () => installedPostgres().find((programs) => major === undefined || programs.major === major);
  const found = choose();
  if (found) return found;
  const packages = [major === undefined ? "postgresql" : `postgresql-${major}`];
  await withoutDebiansCluster(() => installDebianPackages(keeper, "PostgreSQL", packages));
  const installed = choose();
  if (!installed)
    throw new Sentence(`Debian's package ${packages[0]} brought no PostgreSQL from version ${oldestMajor} on.`);
  return installed;
}
