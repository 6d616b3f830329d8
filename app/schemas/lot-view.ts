import type { WaferStatus } from "#app/lib/wafer-status.ts";
import type { WaferFigures } from "#app/lib/wafer-figures.ts";

/** A lot as a list shows it. */
export interface LotRow {
  id: string;
  name: string;
  program: string;
  wafers: number;
  /** ISO; the last that came in of one of its wafers, null before anything has */
  lastAt: string | null;
  createdAt: string;
  createdBy: string;
}

/** Wafers that belong to no lot, the newest of them, and how many there are in all. */
export interface LooseWafers {
  rows: { id: string; name: string; program: string; createdAt: string }[];
  total: number;
}

/** A wafer of a lot, with the newest of each figure. */
export interface LotWafer {
  id: string;
  name: string;
  slot: number | null;
  status: WaferStatus;
  figures: WaferFigures;
  scans: number;
  /** files that wait for their partner */
  waiting: number;
}

/** A table of an instrument that says something of the lot's wafers. */
export interface LotTable {
  reading: string;
  file: { id: string; name: string };
  kind: string;
  wafers: number;
  createdAt: string;
  createdBy: string;
}

/** A thickness map to draw, m. */
export interface WaferMap {
  wafer: { id: string; name: string; slot: number | null };
  sites: { x: number; y: number; thickness: number }[];
  underneath: string | null;
  file: string;
  on: string;
}

export interface LotDetail {
  id: string;
  name: string;
  note: string;
  /** its wafers measure `diameter`, m */
  program: { id: string; name: string; diameter: number };
  createdAt: string;
  createdBy: string;
  wafers: LotWafer[];
  tables: LotTable[];
  /** the newest of each wafer that has one */
  maps: WaferMap[];
  mayUpload: boolean;
}
