import type { ReducedStress } from "#app/lib/scan-reading/reduced-stress.ts";
import type { Summary } from "#app/lib/scan-reading/summary.ts";
import type { MapSite, ThicknessMap } from "#app/lib/scan-reading/thickness-map.ts";

/** Whether a wafer was measured before its film or after it. */
export const WAFER_SCAN_SIDES = ["before", "after"] as const;
export type WaferScanSide = (typeof WAFER_SCAN_SIDES)[number];

/** What was said of a scan when it came, SI; null where nobody has said. Two scans that meet need both thicknesses. */
export interface WaferScanSubject {
  /** id of a film of the library */
  film: string | null;
  filmThickness: number | null;
  filmThicknessTolerance: number | null;
  siliconThickness: number | null;
  siliconThicknessTolerance: number | null;
  /** missing from before it was asked, as is the next */
  siliconThicknessFrom?: "measured" | "nominal" | null;
  /** from the end of the film's cure to the scan after it, s */
  sinceCure?: number | null;
  diameter: number;
  edgeExclusion: number;
  orientation: "100" | "111";
}

/** What a table says of one wafer, SI, with how it was measured. */
export type WaferMeasurementContent =
  | {
      kind: "summary";
      /** each column of the table with this wafer's value, null where it has none */
      figures: (Summary["figures"][number] & { value: number | null })[];
      measured: Summary["measured"];
    }
  | { kind: "thickness map"; sites: Omit<MapSite, "wafer">[]; underneath: ThicknessMap["underneath"] }
  | {
      kind: "reduced stress";
      /** the rows of the wafer, in the order of the file */
      stresses: Omit<ReducedStress, "lot" | "slot" | "wafer">[];
    };
