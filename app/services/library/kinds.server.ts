import type { InferEntity } from "@mikro-orm/core";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import { Tape } from "#app/db/entities/tape.ts";
import type { SitePermission } from "#app/policies/permissions.ts";
import type { LibraryKey, LibraryRecords } from "#app/schemas/library-records.ts";

/** SQL by which a list is sorted; values are columns of ours, never what somebody typed. */
const byValue = (column: string) => `(${column}->>'value')::double precision`;

/** What a library list needs to know of its kind of record. */
interface LibraryKind {
  what: string;
  edit: SitePermission;
  /** names used in the address, with the SQL that they sort by; the first is the default */
  sorts: Record<string, string>;
  /** names of the filters in the address, with the condition that a chosen value stands for; null for one that means nothing */
  filters: Record<string, (value: string) => Record<string, unknown> | null>;
}

/** A filter that narrows a column to one value. */
const equals = (column: string) => (value: string) => ({ [column]: value });

export const LIBRARY = {
  film: {
    entity: Film,
    what: "film",
    edit: "edit films",
    sorts: {
      name: "lower(name)",
      kind: "kind",
      stress: byValue("stress"),
      modulus: byValue("youngs_modulus"),
      expansion: byValue("expansion"),
      limit: byValue("temperature_limit"),
      source: "stress->>'source'",
    },
    filters: { kind: equals("kind") },
  },
  silicon: {
    entity: Silicon,
    what: "silicon wafer",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      orientation: "orientation",
      diameter: "diameter",
      thickness: byValue("thickness"),
    },
    filters: { orientation: equals("orientation") },
  },
  carrier: {
    entity: Carrier,
    what: "carrier",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      material: "material",
      diameter: "diameter",
      thickness: byValue("thickness"),
      modulus: byValue("youngs_modulus"),
      expansion: byValue("expansion"),
      variation: byValue("thickness_variation"),
      limit: byValue("temperature_limit"),
      reuse: "reuse_limit",
    },
    filters: { material: equals("material") },
  },
  bondingMaterial: {
    entity: BondingMaterial,
    what: "bonding material",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      class: "flows",
      softening: byValue("softening"),
      limit: byValue("temperature_limit"),
      bond: byValue("bond_temperature"),
      thickness: "least_thickness",
      modulus: byValue("effective_modulus"),
      release: "release",
    },
    filters: {
      class: (value) => (value === "flows" || value === "cross-linked" ? { flows: value === "flows" } : null),
      release: equals("release"),
    },
  },
  tape: {
    entity: Tape,
    what: "tape",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      kind: "kind",
      limit: byValue("temperature_limit"),
      embedding: byValue("embedding_depth"),
      thickness: byValue("thickness"),
      time: byValue("longest_time"),
    },
    filters: { kind: equals("kind") },
  },
  equipment: {
    entity: Equipment,
    what: "tool",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      up: byValue("warp_limit_edges_up"),
      down: byValue("warp_limit_edges_down"),
      least: byValue("least_unsupported_thickness"),
      hot: "at_peak",
      diameter: byValue("largest_diameter"),
    },
    filters: { hot: equals("atPeak") },
  },
} as const satisfies Record<LibraryKey, LibraryKind & { entity: unknown }>;

type Entity<Key extends LibraryKey> = InferEntity<(typeof LIBRARY)[Key]["entity"]>;

/** The columns of an entity; one that may be null is never left out. */
type Columns<Key extends LibraryKey> = {
  [Column in keyof Entity<Key> & string]: Exclude<Entity<Key>[Column], undefined>;
};

/** Kinds whose columns are what their schema gives: all of them, or this does not compile. */
type Sound = { [Key in LibraryKey]: Columns<Key> extends LibraryRecords[Key] ? Key : never }[LibraryKey];

/** A record as it leaves the service: the columns of the thing itself, plain. */
export type LibraryRecord<Key extends Sound> = LibraryRecords[Key];
