/** Page of a released revision of a sheet. */
export const sheetPath = (revisionId: string): string => `/sheets/revisions/${revisionId}`;

/** The paper of it on the screen, as it was set. */
export const readPath = (revisionId: string, query = ""): string => `${sheetPath(revisionId)}/read${query}`;
