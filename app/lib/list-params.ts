/** Search, sort and page of a list, all of them in the address, so that every view can be linked. */
export interface ListParams {
  query: string;
  sort: string;
  descending: boolean;
  /** from 1 */
  page: number;
  /** further filters by name */
  filters: Record<string, string>;
}

export const PAGE_SIZE = 25;

/** Text of a search for the database, which knows no NUL; a Greek mu is the sign that units are written with. */
export const searchText = (text: string | null): string =>
  (text ?? "").replaceAll("\0", "").replaceAll("\u03bc", "\u00b5").trim().slice(0, 100);

/** Reads a list's parameters; anything not understood falls back to the first of `sorts`, ascending, first page. */
export function readListParams(
  search: URLSearchParams,
  {
    sorts,
    filters = [],
    descending = false,
  }: { sorts: readonly string[]; filters?: readonly string[]; descending?: boolean },
): ListParams {
  const asked = search.get("sort") ?? "";
  const name = asked.replace(/^-/, "");
  const known = sorts.includes(name);
  const page = Number.parseInt(search.get("page") ?? "", 10);
  return {
    query: searchText(search.get("q")),
    sort: known ? name : (sorts[0] ?? ""),
    descending: known ? asked.startsWith("-") : descending,
    page: Number.isInteger(page) && page > 0 ? Math.min(page, 100_000) : 1,
    filters: Object.fromEntries(filters.map((key) => [key, searchText(search.get(key))])),
  };
}

/** One page of a list with the number of all that match. */
export interface ListPage<Row> {
  rows: Row[];
  total: number;
  params: ListParams;
}

/** The address's search part with some parameters replaced; empty ones and the first page are left out. */
export function withParams(search: URLSearchParams, changes: Record<string, string | null>): string {
  const next = new URLSearchParams(search);
  for (const [key, value] of Object.entries(changes))
    if (value === null || value === "" || (key === "page" && value === "1")) next.delete(key);
    else next.set(key, value);
  const text = next.toString();
  return text ? `?${text}` : "?";
}
