import { randomBytes, randomUUID } from "node:crypto";
import { MikroORM } from "@mikro-orm/postgresql";
import { afterAll, beforeAll } from "vitest";
import { databaseOptions } from "#app/db/options.ts";
import { grantStatements } from "#app/db/grants.ts";
import { DemoSeeder } from "#app/db/seeders/demo-seeder.ts";

/** A database of a test file's own, a copy of the migrated template. */
export interface TestDatabase {
  /** connection as the owner, whom row-level security does not bind */
  ownerUrl: string;
  /** connection as the plain role that the server uses */
  appUrl: string;
  /** the owner's ORM, to look behind the walls */
  owner: MikroORM;
}

function requiredUrl(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run these tests through npm test.`);
  return value;
}

const withDatabase = (url: string, database: string) => Object.assign(new URL(url), { pathname: `/${database}` }).href;

async function administer(statement: string): Promise<void> {
  const orm = await MikroORM.init({
    ...databaseOptions(requiredUrl("TEST_DATABASE_ADMIN_URL")),
    pool: { min: 0, max: 1 },
  });
  try {
    await orm.em.fork().getConnection().execute(statement);
  } finally {
    await orm.close();
  }
}

/**
 * Gives the test file a database of its own and points the process at it before any server module is loaded, so those are to be
 * imported inside the tests. With `demo` the invented pilot line is in it.
 */
export function useDatabase({ demo = false }: { demo?: boolean } = {}): TestDatabase {
  const name = `test_${randomUUID().replaceAll("-", "")}`;
  const database = {} as TestDatabase;
  beforeAll(async () => {
    const template = process.env["TEST_DATABASE_TEMPLATE"] ?? "planeward_template";
    await administer(`create database "${name}" template "${template}" owner planeward_owner`);
    database.ownerUrl = withDatabase(requiredUrl("TEST_DATABASE_OWNER_URL"), name);
    database.appUrl = withDatabase(requiredUrl("TEST_DATABASE_APP_URL"), name);
    database.owner = await MikroORM.init(databaseOptions(database.ownerUrl));
    for (const statement of grantStatements(new URL(database.appUrl).username))
      await database.owner.em.fork().getConnection().execute(statement);
    if (demo) await database.owner.seeder.seed(DemoSeeder);
    process.env["DATABASE_URL"] = database.appUrl;
    process.env["SECRET_KEY"] = randomBytes(32).toString("base64url");
    process.env["LOG_LEVEL"] = "silent";
  });
  afterAll(async () => {
    const { closeOrm } = await import("#app/db/orm.server.ts");
    await closeOrm();
    await database.owner.close(true);
    await administer(`drop database "${name}" with (force)`);
  });
  return database;
}

/** Rows of a query that looks behind the walls. */
export async function asOwner<Row>({ owner }: TestDatabase, sql: string, params: unknown[] = []): Promise<Row[]> {
  return owner.em.fork().getConnection().execute<Row[]>(sql, params);
}
