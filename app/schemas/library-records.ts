import type { BondingMaterialValues } from "./bonding-material.ts";
import type { CarrierValues } from "./carrier.ts";
import type { EquipmentValues } from "./equipment.ts";
import type { FilmValues } from "./film.ts";
import type { SiliconValues } from "./silicon.ts";
import type { TapeValues } from "./tape.ts";

interface Identified {
  id: string;
}

/** What the site's library holds, kind by kind, as it leaves the services: what a form gives, with the record's id. SI units. */
export interface LibraryRecords {
  film: FilmValues & Identified;
  silicon: SiliconValues & Identified;
  carrier: CarrierValues & Identified;
  bondingMaterial: BondingMaterialValues & Identified;
  tape: TapeValues & Identified;
  equipment: EquipmentValues & Identified;
}
export type LibraryKey = keyof LibraryRecords;

/** Something that uses a record of the library. */
export interface LibraryUse {
  kind: "stack" | "flow";
  id: string;
  name: string;
}
