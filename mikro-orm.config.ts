import { databaseOptions } from "./app/db/options.ts";

/** For the ORM's command line, which creates and runs migrations as the owner of the database. */
export default databaseOptions(process.env.DATABASE_OWNER_URL ?? "");
