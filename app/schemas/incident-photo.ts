/** What a picture of an incident is kept as. */
export const PHOTO_TYPES = ["image/jpeg", "image/png"] as const;
export type PhotoType = (typeof PHOTO_TYPES)[number];

/** Most pictures of one incident; the database holds it too. */
export const MOST_PHOTOS = 6;
/** Most of a picture as it comes from a camera. */
export const PHOTO_LIMIT = { bytes: 20 * 1024 * 1024, words: "20\u00A0MB" } as const;
