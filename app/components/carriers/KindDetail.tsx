import { Cut } from "#app/components/drawings/Cut.tsx";
import { LibraryDetail, type RecordView } from "#app/components/library/LibraryDetail.tsx";
import { KINDS, kindPath, type KindSlug } from "#app/lib/library-kinds.ts";
import { bondingMaterialView } from "./bonding-material-view.tsx";
import { carrierView } from "./carrier-view.tsx";
import { CarrierPlaces } from "./CarrierPlaces.tsx";
import type { KindPageData, KindRecord, KindRecordData, SiteFacts } from "#app/lib/kind-data.ts";
import { KindFigure } from "./KindFigure.tsx";
import { pairCut } from "./pair-cut.ts";
import { siliconView } from "./silicon-view.tsx";
import { tapeView } from "./tape-view.tsx";
import { toolView } from "./tool-view.tsx";

const VIEWS: { [Slug in KindSlug]: (record: KindRecord<Slug>, site: SiteFacts) => RecordView } = {
  carriers: carrierView,
  "bonding-materials": bondingMaterialView,
  tapes: tapeView,
  silicon: siliconView,
  tools: toolView,
};

const viewOf = <Slug extends KindSlug>({ slug, record }: KindRecordData<Slug>, site: SiteFacts): RecordView =>
  VIEWS[slug](record, site);

/** The page of one record of a kind. */
export function KindDetail(data: KindPageData) {
  const { slug, record, stamp, mayEdit, uses, site } = data;
  return (
    <>
      <CarrierPlaces />
      <LibraryDetail
        record={record}
        stamp={stamp}
        mayEdit={mayEdit}
        uses={uses}
        crumbs={[{ name: KINDS[slug].title, path: kindPath(slug) }]}
        view={viewOf(data, site)}
        drawing={data.slug === "carriers" && data.trial?.pair && <Cut {...pairCut(data.record, data.trial.pair)} />}
      >
        <KindFigure {...data} />
      </LibraryDetail>
    </>
  );
}
