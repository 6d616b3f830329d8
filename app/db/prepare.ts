import { existsSync } from "node:fs";
import { readFile, writeFile } from "node:fs/promises";
import { MikroORM } from "@mikro-orm/postgresql";
import { z } from "zod";
import { grantStatements } from "./grants.ts";
import { prepareQueue } from "./queue.ts";
import { databaseOptions } from "./options.ts";
import { createDemoAccounts, demoAccountsSchema, setDemoPasswords } from "./seeders/demo-accounts.ts";
import { DemoSeeder } from "./seeders/demo-seeder.ts";
import { ReferenceSeeder } from "./seeders/reference-seeder.ts";

/**
 * Brings a database up to date before the server starts: migrations, rights of the plain role, the queue of jobs, reference data, and demo data
 * when asked and nobody is there yet. Run as its own process with the owner's connection.
 */
const environment = z
  .object({
    DATABASE_OWNER_URL: z.url(),
    APP_ROLE: z.string().min(1),
    DEMO: z.enum(["0", "1"]).default("0"),
    DEMO_ACCOUNTS_FILE: z.string().optional(),
  })
  .parse(process.env);

const orm = await MikroORM.init(databaseOptions(environment.DATABASE_OWNER_URL));
try {
  await orm.migrator.up();
  for (const statement of grantStatements(environment.APP_ROLE)) await orm.em.fork().getConnection().execute(statement);
  await prepareQueue(orm, environment.DATABASE_OWNER_URL, environment.APP_ROLE);
  await orm.seeder.seed(ReferenceSeeder);
  if (environment.DEMO === "1" && environment.DEMO_ACCOUNTS_FILE) await prepareDemo(environment.DEMO_ACCOUNTS_FILE);
} finally {
  await orm.close();
}

async function prepareDemo(file: string): Promise<void> {
  const [{ people } = { people: "0" }] = await orm.em
    .fork()
    .getConnection()
    .execute<{ people: string }[]>("select count(*) as people from person");
  const empty = people === "0";
  const known = existsSync(file);
  const accounts = known ? demoAccountsSchema.parse(JSON.parse(await readFile(file, "utf8"))) : createDemoAccounts();
  if (!known) await writeFile(file, JSON.stringify(accounts, null, 2), { mode: 0o600 });
  if (empty) await orm.seeder.seed(DemoSeeder);
  // The file is what people are shown: when it was lost and made anew, the passwords follow it.
  if (empty || !known) await setDemoPasswords(orm, accounts);
}
