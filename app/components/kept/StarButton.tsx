import { useFetcher, useLocation } from "react-router";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { favouriteKey, type KeptKind } from "#app/lib/kept-kinds.ts";
import { useMine } from "./use-mine.ts";

interface Props {
  kind: KeptKind;
  id: string;
  /** what is marked, where several stars stand on a page */
  name?: string;
}

/** Marks a record as a favourite, or takes the mark away. */
export function StarButton({ kind, id, name }: Props) {
  const mine = useMine();
  const fetcher = useFetcher();
  const scripts = useInBrowser();
  const { pathname, search } = useLocation();
  if (!mine) return null;
  const sent = fetcher.formData?.get("marked");
  const marked = sent ? sent === "yes" : mine.favourites.includes(favouriteKey(kind, id));
  return (
    <fetcher.Form method="post" action="/favourites" className="screen-only">
      <input type="hidden" name="kind" value={kind} />
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="marked" value={marked ? "no" : "yes"} />
      {!scripts && <input type="hidden" name="back" value={pathname + search} />}
      <button
        type="submit"
        aria-pressed={marked}
        aria-label={name ? `Favourite: ${name}` : "Favourite"}
        title={marked ? "Take the mark away" : "Mark as a favourite"}
        className="grid size-8 cursor-pointer place-items-center rounded text-copper hover:bg-wash max-tablet:size-11"
      >
        <svg width="18" height="18" viewBox="0 0 20 20" stroke="currentColor" strokeWidth="1.4" aria-hidden>
          <path
            d="M10 1.8l2.5 5.3 5.8.8-4.2 4 1 5.8L10 14.9l-5.1 2.8 1-5.8-4.2-4 5.8-.8z"
            fill={marked ? "currentColor" : "none"}
            strokeLinejoin="round"
          />
        </svg>
      </button>
    </fetcher.Form>
  );
}
