/* Writes the table of unit factors: npm run unit-table. */
import { mkdirSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { factorsText } from "./factors-text.ts";

const folder = fileURLToPath(new URL("../table/", import.meta.url));
mkdirSync(folder, { recursive: true });
writeFileSync(`${folder}factors.ts`, factorsText());
