import { join } from "node:path";
import { administrator, postgresEnvironment } from "./cluster.mjs";
import { loopback } from "./ports.mjs";

/** The role that owns the tables and migrates them; row-level security is not for it. */
const owner = "planeward_owner";

/** The plain role that the server connects with, under row-level security. */
const appRole = "planeward_app";

/**
 * A running cluster of our own and how to get into it.
 *
 * @typedef {object} Database
 * @property {import("./postgres-programs.mjs").PostgresPrograms} programs
 * @property {number} port
 * @property {import("./secrets.mjs").DatabasePasswords} passwords
 */

/**
 * @param {Pick<Database, "port" | "passwords">} database
 * @param {keyof import("./secrets.mjs").DatabasePasswords} who
 * @param {string} name the database's
 * @returns {string}
 */
export function databaseUrl({ port, passwords }, who, name) {
  const role = { administrator, owner, app: appRole }[who];
  return `postgresql://${role}:${passwords[who]}@${loopback}:${port}/${name}`;
}

/**
 * Has the cluster's administrator run SQL in psql's dialect.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {Database} database
 * @param {string} sql
 */
async function administer(keeper, database, sql) {
  await keeper.run(
    join(database.programs.folder, "psql"),
    ["--no-psqlrc", "--quiet", "--set=ON_ERROR_STOP=1", "--file=-"],
    {
      cwd: "/",
      env: postgresEnvironment({
        PGHOST: loopback,
        PGPORT: String(database.port),
        PGUSER: administrator,
        PGPASSWORD: database.passwords.administrator,
        PGDATABASE: "postgres",
      }),
      input: sql,
      failure: "The database refused its administrator; does .planeward/secrets.json belong to another copy?",
    },
  );
}

/**
 * Makes the two roles, or sets again what they may do.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {Database} database
 */
export async function makeRoles(keeper, database) {
  const plain = "login nosuperuser nocreatedb nocreaterole noreplication nobypassrls";
  const role = (/** @type {string} */ name, /** @type {string} */ password) => `
    select 'create role ${name}' where not exists (select from pg_roles where rolname = '${name}') \\gexec
    alter role ${name} with ${plain} password '${password}';`;
  await administer(keeper, database, role(owner, database.passwords.owner) + role(appRole, database.passwords.app));
}

/**
 * Makes a database of the owner's, when it isn't there, that nobody but the owner and the server's role may enter.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {Database} database
 * @param {string} name
 * @param {string} [template] an existing database to copy
 */
export async function makeDatabase(keeper, database, name, template = "template0") {
  await administer(
    keeper,
    database,
    `
    select 'create database ${name} owner ${owner} template ${template}'
      where not exists (select from pg_database where datname = '${name}') \\gexec
    revoke all on database ${name} from public;
    grant connect on database ${name} to ${appRole};`,
  );
}
