/** How far a revision is: the first two are of a review, the others of what was released. */
export const REVISION_STATES = ["in review", "returned", "released", "superseded", "withdrawn"] as const;
export type RevisionState = (typeof REVISION_STATES)[number];

export const SHEET_FORMATS = ["pdf", "html"] as const;
export type SheetFormat = (typeof SHEET_FORMATS)[number];

/** Both pages, or the page for hands alone, which is all that a guest sees. */
export const SHEET_PAGES = ["all", "hands"] as const;
export type SheetPages = (typeof SHEET_PAGES)[number];
