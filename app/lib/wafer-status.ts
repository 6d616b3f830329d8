/** Where a wafer of a lot stands. */
export const WAFER_STATUSES = ["in line", "held", "broken", "scrapped", "done"] as const;
export type WaferStatus = (typeof WAFER_STATUSES)[number];
