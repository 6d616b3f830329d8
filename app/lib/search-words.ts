/** How many a search has found. */
export const countFound = (total: number): string => (total === 0 ? "Nothing found" : `${total} found`);

/** That a search has found nothing. */
export const nothingFound = (query: string): string => `Nothing is called “${query}”`;
