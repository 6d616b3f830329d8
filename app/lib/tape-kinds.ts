/** What a tape is for. */
export const TAPE_KINDS = ["grinding tape", "dicing tape"] as const;
export type TapeKind = (typeof TAPE_KINDS)[number];
