import { z } from "zod";
import { scanSchema } from "./scan.ts";
import type { WaferScanSide, WaferScanSubject } from "./wafer.ts";

/** A file that waits for its partner, as a list shows it. */
export interface WaitingRow {
  id: string;
  wafer: { id: string; name: string; slot: number | null; lot: string | null };
  /** rad */
  azimuth: number;
  /** wafer and line in words */
  label: string;
  side: WaferScanSide;
  file: { id: string; name: string };
  program: { id: string; name: string };
  /** nothing where nobody said */
  instrumentName: string;
  measuredAt: string | null;
  createdAt: string;
  createdBy: string;
}

/** One of them with what was said of it and the files that may be its partner. */
export interface WaitingDetail extends WaitingRow {
  subject: WaferScanSubject;
  partners: (WaitingRow & { subject: WaferScanSubject })[];
}

/** Two files that a person puts together, and what the scan is computed with. */
export const handPairSchema = scanSchema
  .pick({
    film: true,
    orientation: true,
    filmThickness: true,
    filmThicknessTolerance: true,
    siliconThickness: true,
    siliconThicknessTolerance: true,
    siliconThicknessFrom: true,
    sinceCure: true,
    diameter: true,
    edgeExclusion: true,
  })
  .extend({ partner: z.uuid("Choose the partner.") });
export type HandPair = z.output<typeof handPairSchema>;
