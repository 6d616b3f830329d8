import { Migrator } from "@mikro-orm/migrations";
import { defineConfig, UnderscoreNamingStrategy } from "@mikro-orm/postgresql";
import { SeedManager } from "@mikro-orm/seeder";
import { AuditSubscriber } from "#app/server/audit.server.ts";
import { entities } from "./entities/entities.ts";
import { QUEUE_SCHEMA } from "./queue-schema.ts";
import { migrations } from "./migrations/migrations.ts";

/** How the ORM talks to a database; the same for the server, migrations, seeds and tests. */
export function databaseOptions(clientUrl: string) {
  return defineConfig({
    clientUrl,
    entities,
    namingStrategy: UnderscoreNamingStrategy,
    subscribers: [new AuditSubscriber()],
    extensions: [Migrator, SeedManager],
    forceUtcTimezone: true,
    discovery: { checkDuplicateTableNames: true },
    pool: { min: 1, max: 12 },
    driverOptions: { connection: { application_name: "planeward" } },
    migrations: {
      migrationsList: migrations,
      path: "app/db/migrations",
      snapshot: false,
      transactional: true,
      disableForeignKeys: false,
      allOrNothing: true,
    },
    schemaGenerator: { ignoreSchema: [QUEUE_SCHEMA] },
    // Unscoped work on the shared manager is always a mistake here.
    allowGlobalContext: false,
    debug: false,
  });
}
