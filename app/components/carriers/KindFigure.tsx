import { Link } from "react-router";
import { softensAt } from "#app/lib/adhesive-bands.ts";
import type { KindPageData } from "#app/lib/kind-data.ts";
import { ExpansionCurveSection } from "./ExpansionCurveSection.tsx";
import { PairTrialSection } from "./PairTrialSection.tsx";
import { TemperatureBand } from "./TemperatureBand.tsx";

/** What a kind is drawn as on its own page: a carrier as a pair, a bonding material on a scale of temperature. */
export function KindFigure(data: KindPageData) {
  switch (data.slug) {
    case "carriers":
      return (
        <>
          {data.trial && <PairTrialSection trial={data.trial} />}
          {data.record.expansionCurve && (
            <ExpansionCurveSection curve={data.record.expansionCurve} expansion={data.record.expansion} />
          )}
        </>
      );
    case "bonding-materials": {
      const { flows, temperatureLimit, bondTemperature, releaseTemperature } = data.record;
      return (
        <>
          <p className="px-4 pb-4 tablet:px-6">
            <Link to={`/carriers/bonding-materials/${data.record.id}/calibrate`} className="link">
              Calibrate on measured pairs
            </Link>
          </p>
          <div className="px-6 pb-6 max-tablet:hidden">
            <TemperatureBand
              temperatures={{
                softening: softensAt(data.record),
                flows,
                limit: temperatureLimit.value,
                margin: data.site.adhesiveMargin,
              }}
              bond={bondTemperature.value}
              release={releaseTemperature.value}
            />
          </div>
        </>
      );
    }
    case "tapes":
    case "silicon":
    case "tools":
      return null;
  }
}
