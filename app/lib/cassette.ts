/** A cassette has that many slots, and a lot at most as many wafers. */
export const SLOTS = 25;
