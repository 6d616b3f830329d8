/** The pictograms of the cautions, by name. */
export const CAUTION_SIGNS = ["estimate", "shards", "blade", "heat", "solvent", "laser", "vacuum", "run card"] as const;
export type CautionSignName = (typeof CAUTION_SIGNS)[number];
