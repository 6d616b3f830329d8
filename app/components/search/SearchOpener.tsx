import { useEffect, type MouseEvent } from "react";
import { Link } from "react-router";
import { useOnDemand } from "#app/components/layout/use-on-demand.tsx";

const loadPalette = () => import("./Palette.tsx");

/** The way to the search from every page: a link to its page, which opens the palette instead where there are scripts. */
export function SearchOpener() {
  const { dialog, show } = useOnDemand(loadPalette, "/search");
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || event.shiftKey || event.key.toLowerCase() !== "k")
        return;
      event.preventDefault();
      show();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [show]);
  const click = (event: MouseEvent) => {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    show();
  };
  return (
    <>
      <Link
        to="/search"
        aria-keyshortcuts="Control+K Meta+K"
        onClick={click}
        className="flex min-h-8 shrink-0 items-center gap-2 rounded border border-edge bg-raised px-2 text-quiet no-underline hover:border-ink tablet:w-64"
      >
        <svg width="16" height="16" viewBox="0 0 16 16" fill="none" stroke="currentColor" strokeWidth="1.5" aria-hidden>
          <circle cx="6.5" cy="6.5" r="4.75" />
          <path d="M10 10l5 5" />
        </svg>
        <span className="max-tablet:sr-only">
          Search<span className="sr-only"> everything</span>
        </span>
        <span className="ml-auto text-label max-tablet:hidden" aria-hidden>
          Ctrl K
        </span>
      </Link>
      {dialog}
    </>
  );
}
