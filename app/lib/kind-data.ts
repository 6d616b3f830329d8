import type { LibraryRecords, LibraryUse } from "#app/schemas/library-records.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import type { CarrierUnits } from "./carrier-units.ts";
import type { KIND_KEYS, KindSlug } from "./library-kinds.ts";
import type { ListPage } from "./list-params.ts";
import type { PairTrial } from "./pair-trial.ts";

/** What of the site's limits the records of Carriers & bonds are shown with. */
export interface SiteFacts {
  /** margin asked below a bonding material's temperature limit, K */
  adhesiveMargin: number;
}

/** A record of the kind that an address names. */
export type KindRecord<Slug extends KindSlug> = LibraryRecords[(typeof KIND_KEYS)[Slug]];

/** A page of a kind's list; `slug` tells what its rows are. */
export type KindListData<Slug extends KindSlug = KindSlug> = {
  [S in Slug]: { slug: S; page: ListPage<KindRecord<S>>; mayEdit: boolean; site: SiteFacts };
}[Slug];

/** A record of a kind; `slug` tells what it is. */
export type KindRecordData<Slug extends KindSlug = KindSlug> = {
  [S in Slug]: {
    slug: S;
    record: KindRecord<S>;
    stamp: RecordStamp;
    mayEdit: boolean;
  };
}[Slug];

/** A record with everything else that its page shows. */
export type KindPageData = KindRecordData & {
  uses: LibraryUse[];
  site: SiteFacts;
  /** of a carrier */
  trial: PairTrial | null;
  /** of a carrier */
  units: CarrierUnits | null;
};
