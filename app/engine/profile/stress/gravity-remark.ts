import { gravitySag } from "../../gravity/gravity-sag.ts";
import { siliconSagConstants } from "../../gravity/silicon-sag-constants.ts";
import type { Support } from "../../gravity/support.ts";
import { SILICON_DENSITY } from "../../silicon/density.ts";
import type { Orientation } from "../../silicon/orientation.ts";
import { formatQuantity } from "../../units/format.ts";

export interface GravityRemark {
  /** peak to valley of the sag, between two bounds, m */
  sag: { low: number; high: number };
  /** the figure itself has the sag in it */
  included: boolean;
  sentence: string;
}

const ON: Record<Support["kind"], string> = {
  "edge-ring": "on a ring under the rim",
  ring: "on a ring",
  points: "on points",
  "centre-point": "on a point under its centre",
  "centre-cup": "on a cup under its centre",
  rails: "on two rails",
};

const length = (metres: number) =>
  formatQuantity(metres, "length", { unit: metres < 0.9995e-3 ? "µm" : "mm", significant: 2, trim: true });

/**
 * What the wafer's own weight does to a scan on its support. Two scans on the same support subtract most of it; a single one has it
 * in the figure; one turned over between two has none of it.
 * @throws EngineInputError for a wafer or support out of range
 */
export function gravityRemark(i: {
  radius: number;
  thickness: number;
  orientation: Orientation;
  support: Support;
  taken: "one scan" | "two scans on the same support" | "turned over and halved";
}): GravityRemark {
  const { peakToValley, linearValid, largeDeflection } = gravitySag({
    ...i,
    ...siliconSagConstants(i.orientation, i.support),
    density: SILICON_DENSITY,
  });
  const sag = linearValid
    ? { low: peakToValley, high: peakToValley }
    : (largeDeflection ?? { low: 0, high: peakToValley });
  const size = sag.low === sag.high ? length(sag.high) : `up to ${length(sag.high)}`;
  const weight = `Under its own weight the wafer sags ${size} ${ON[i.support.kind]}`;
  switch (i.taken) {
    case "one scan":
      return { sag, included: true, sentence: `${weight}: that is in this figure.` };
    case "turned over and halved":
      return { sag, included: false, sentence: `${weight}: turning it over and halving the difference took that out.` };
    case "two scans on the same support":
      return {
        sag,
        included: false,
        sentence: linearValid
          ? `${weight}: both scans have it, so the difference does not.`
          : `${weight}: both scans have it, but sag and bow of so thin a wafer do not add, so some of it stays in the difference.`,
      };
  }
}
