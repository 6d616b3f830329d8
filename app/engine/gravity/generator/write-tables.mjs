/* Writes the tables of the gravity sag: npm run gravity-table. Takes some minutes. */
import { mkdirSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { largeSagTables, railsTable } from "./tables.ts";

const folder = fileURLToPath(new URL("../table/", import.meta.url));
mkdirSync(folder, { recursive: true });
writeFileSync(`${folder}rails.ts`, railsTable());
writeFileSync(`${folder}large-sag.ts`, largeSagTables());
