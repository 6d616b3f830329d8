/** What holds a wafer while it is measured: only like is compared with like. */
export const MEASURED_ON = ["three pins", "table or chuck, vacuum off", "film frame", "carrier, as a pair"] as const;
export const MEASURED_SIDES = ["device side", "back side"] as const;
/** What became of the wafer's own weight in the reading. */
export const GRAVITY = ["taken out", "left in", "not known"] as const;
