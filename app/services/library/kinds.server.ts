import type { InferEntity } from "@mikro-orm/core";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import type { SitePermission } from "#app/policies/permissions.ts";

/** SQL by which a list is sorted; values are columns of ours, never what somebody typed. */
const byValue = (column: string) => `(${column}->>'value')::double precision`;

/** What a library list needs to know of its kind of record. */
interface LibraryKind {
  what: string;
  edit: SitePermission;
  /** names used in the address, with the SQL that they sort by; the first is the default */
  sorts: Record<string, string>;
  /** columns that a filter of the same name narrows to one value */
  filters: readonly string[];
}

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
    filters: ["kind"],
  },
  silicon: {
    entity: Silicon,
    what: "silicon wafer",
    edit: "edit carriers, bonds and limits",
    sorts: { name: "lower(name)", diameter: "diameter" },
    filters: [],
  },
  carrier: {
    entity: Carrier,
    what: "carrier",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      diameter: "diameter",
      thickness: byValue("thickness"),
      modulus: byValue("youngs_modulus"),
      expansion: byValue("expansion"),
      limit: byValue("temperature_limit"),
    },
    filters: ["material"],
  },
  bondingMaterial: {
    entity: BondingMaterial,
    what: "bonding material",
    edit: "edit carriers, bonds and limits",
    sorts: {
      name: "lower(name)",
      softening: byValue("softening"),
      limit: byValue("temperature_limit"),
      modulus: byValue("effective_modulus"),
      release: "release",
    },
    filters: ["release"],
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
    },
    filters: [],
  },
} as const satisfies Record<string, LibraryKind & { entity: unknown }>;

export type LibraryKey = keyof typeof LIBRARY;
export type LibraryEntity<Key extends LibraryKey> = InferEntity<(typeof LIBRARY)[Key]["entity"]>;

/** Columns that are about the record, not about the thing. */
type RecordColumn = "createdAt" | "createdBy" | "updatedAt" | "updatedBy" | "version";

/** A record as it leaves the service: the columns of the thing itself, plain. */
export type LibraryRecord<Key extends LibraryKey> = {
  [Column in Exclude<keyof LibraryEntity<Key> & string, RecordColumn>]: LibraryEntity<Key>[Column];
};
