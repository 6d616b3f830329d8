/** Paths of lists whose searches can be kept: those of a place, not the ones on the page of a record. */
const LIST = /^\/[a-z][a-z-]*(?:\/[a-z][a-z-]*){0,2}$/;

export const keepsSearches = (path: string): boolean => LIST.test(path);

/** The part of a list's address that is kept: search, filters and order, without the page and what is left blank. */
export function keptQuery(search: URLSearchParams): string {
  const kept = [...search].filter(([name, value]) => name !== "page" && value !== "");
  return new URLSearchParams(kept).toString();
}
