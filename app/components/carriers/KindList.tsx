import { LibraryList, type ListView } from "#app/components/library/LibraryList.tsx";
import type { KindSlug } from "#app/lib/library-kinds.ts";
import { bondingMaterialList } from "./bonding-material-view.tsx";
import { CARRIER_LIST } from "./carrier-view.tsx";
import { CarrierPlaces } from "./CarrierPlaces.tsx";
import type { KindListData, KindRecord, SiteFacts } from "#app/lib/kind-data.ts";
import { SILICON_LIST } from "./silicon-view.tsx";
import { TAPE_LIST } from "./tape-view.tsx";
import { TOOL_LIST } from "./tool-view.tsx";

const LISTS: { [Slug in KindSlug]: (site: SiteFacts) => ListView<KindRecord<Slug>> } = {
  carriers: () => CARRIER_LIST,
  "bonding-materials": bondingMaterialList,
  tapes: () => TAPE_LIST,
  silicon: () => SILICON_LIST,
  tools: () => TOOL_LIST,
};

/** The list of a kind. */
export function KindList<Slug extends KindSlug>({ slug, page, mayEdit, site }: KindListData<Slug>) {
  return (
    <>
      <CarrierPlaces />
      <LibraryList<KindRecord<Slug>> view={LISTS[slug](site)} page={page} mayEdit={mayEdit} />
    </>
  );
}
