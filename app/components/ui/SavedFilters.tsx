import { useId } from "react";
import { Link, useFetcher, useLocation, useSearchParams } from "react-router";
import { useMine } from "#app/components/kept/use-mine.ts";
import { keepsSearches, keptQuery } from "#app/lib/saved-list.ts";
import type { SavedFilterRow } from "#app/schemas/kept.ts";
import { useInBrowser } from "./use-in-browser.ts";

/** Searches of a list that its reader has kept, and a way to keep the one that is shown. */
export function SavedFilters() {
  const mine = useMine();
  const { pathname } = useLocation();
  const [search] = useSearchParams();
  if (!mine || !keepsSearches(pathname)) return null;
  const query = keptQuery(search);
  const kept = mine.filters.filter(({ list }) => list === pathname);
  const known = kept.some((filter) => filter.query === query);
  if (kept.length === 0 && query === "") return null;
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
      {kept.length > 0 && (
        <ul aria-label="Kept searches" className="flex flex-wrap gap-2">
          {kept.map((filter) => (
            <KeptSearch key={filter.id} filter={filter} current={filter.query === query} />
          ))}
        </ul>
      )}
      {query !== "" && !known && <KeepSearch key={query} list={pathname} query={query} />}
    </div>
  );
}

/** Where a form without scripts comes back to. */
function Back() {
  const scripts = useInBrowser();
  const { pathname, search } = useLocation();
  return scripts ? null : <input type="hidden" name="back" value={pathname + search} />;
}

function KeptSearch({ filter: { id, list, name, query }, current }: { filter: SavedFilterRow; current: boolean }) {
  const fetcher = useFetcher();
  return (
    <li className="flex items-center rounded border border-edge has-aria-[current]:border-ink has-aria-[current]:bg-wash">
      <Link
        to={`${list}?${query}`}
        aria-current={current ? "true" : undefined}
        className="px-2 py-1 text-inherit no-underline hover:underline max-tablet:py-3"
      >
        {name}
      </Link>
      <fetcher.Form method="post" action="/saved-filters" className="flex border-l border-line">
        <Back />
        <input type="hidden" name="id" value={id} />
        <button
          type="submit"
          name="intent"
          value="remove"
          aria-label={`Remove the kept search ${name}`}
          className="min-w-8 cursor-pointer px-2 py-1 hover:bg-wash max-tablet:min-w-11 max-tablet:py-3"
        >
          ×
        </button>
      </fetcher.Form>
    </li>
  );
}

function KeepSearch({ list, query }: { list: string; query: string }) {
  const id = useId();
  const fetcher = useFetcher<{ fault: string | null }>();
  const fault = fetcher.data?.fault ?? null;
  return (
    <details className="py-1">
      <summary className="link w-fit cursor-pointer">Keep this search</summary>
      <fetcher.Form method="post" action="/saved-filters" className="mt-2 flex flex-wrap items-end gap-2">
        <Back />
        <input type="hidden" name="list" value={list} />
        <input type="hidden" name="query" value={query} />
        <div className="field w-64">
          <label htmlFor={id}>Name of the search</label>
          <input
            id={id}
            name="name"
            maxLength={60}
            required
            autoComplete="off"
            aria-invalid={fault ? true : undefined}
            aria-describedby={fault ? `${id}-fault` : undefined}
          />
        </div>
        <button type="submit" name="intent" value="keep" className="btn" disabled={fetcher.state !== "idle"}>
          Keep
        </button>
        {fault && (
          <p id={`${id}-fault`} role="alert" className="w-full text-stop">
            {fault}
          </p>
        )}
      </fetcher.Form>
    </details>
  );
}
