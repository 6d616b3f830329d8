/** Most of a table of lots. */
export const LOT_TABLE_LIMIT = { bytes: 96 * 1024, words: "96\u00A0kB" };
