import { useCallback, useEffect, useState, type ComponentType, type MouseEvent } from "react";
import { Link } from "react-router";

type PaletteView = ComponentType<{ onClose: () => void }>;

/** The way to the search from every page: a link to its page, which opens the palette instead where there are scripts. */
export function SearchOpener() {
  // The palette is loaded when it is first asked for.
  const [Palette, setPalette] = useState<PaletteView | null>(null);
  const [open, setOpen] = useState(false);
  const begin = useCallback(() => {
    setOpen(true);
    import("./Palette.tsx").then(
      (loaded) => setPalette(() => loaded.default),
      () => window.location.assign("/search"),
    );
  }, []);
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || event.shiftKey || event.key.toLowerCase() !== "k")
        return;
      event.preventDefault();
      begin();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [begin]);
  const click = (event: MouseEvent) => {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    begin();
  };
  return (
    <>
      <Link
        to="/search"
        aria-label="Search everything"
        aria-keyshortcuts="Control+K Meta+K"
        onClick={click}
        className="flex min-h-8 shrink-0 items-center gap-2 rounded border border-edge bg-raised px-2 text-quiet no-underline hover:border-ink tablet:w-64"
      >
        <svg width="16" height="16" viewBox="0 0 16 16" fill="none" stroke="currentColor" strokeWidth="1.5" aria-hidden>
          <circle cx="6.5" cy="6.5" r="4.75" />
          <path d="M10 10l5 5" />
        </svg>
        <span className="max-tablet:hidden">Search</span>
        <span className="ml-auto text-label max-tablet:hidden">Ctrl K</span>
      </Link>
      {open && Palette && <Palette onClose={() => setOpen(false)} />}
    </>
  );
}
