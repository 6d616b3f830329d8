import { p } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** What every editable record carries: who made and last changed it (null: delivered with Planeward), and the version that tells two editors apart. */
export const recordProperties = {
  version: p.integer().version(),
  createdAt: p.datetime(),
  createdBy: () => p.manyToOne(Person).nullable(),
  updatedAt: p.datetime(),
  updatedBy: () => p.manyToOne(Person).nullable(),
};
