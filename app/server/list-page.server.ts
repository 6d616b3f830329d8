import { redirect } from "react-router";
import { PAGE_SIZE, withParams, type ListPage } from "#app/lib/list-params.ts";

/**
 * The page of a list that was asked for. One past the last, from an old link or after a narrower search, leads to the last: a place
 * with something in it must not look empty.
 */
export function withinPages<Page extends ListPage<unknown>>(url: URL, page: Page): Page {
  const last = Math.max(1, Math.ceil(page.total / PAGE_SIZE));
  if (page.params.page > last) throw redirect(`${url.pathname}${withParams(url.searchParams, { page: String(last) })}`);
  return page;
}
