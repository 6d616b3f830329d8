import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** A profilometer file exactly as it came. */
export const ScanFile = defineEntity({
  name: "ScanFile",
  tableName: "scan_file",
  uniques: [{ properties: ["program", "hash"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    name: p.text(),
    /** SHA-256, hex */
    hash: p.text(),
    size: p.integer(),
    bytes: p.blob().lazy(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type ScanFile = InferEntity<typeof ScanFile>;
