import { useEffect, useRef } from "react";
import { Form, Link, useLocation } from "react-router";
import { Mark } from "#app/components/drawings/Mark.tsx";
import { KeysOpener } from "#app/components/keyboard/KeysOpener.tsx";
import { useMine } from "#app/components/kept/use-mine.ts";
import { SearchOpener } from "#app/components/search/SearchOpener.tsx";
import { liesIn } from "#app/lib/current-place.ts";
import type { Place } from "#app/policies/places.ts";

interface Props {
  person: { name: string; role: string };
  places: Place[];
  /** names of the programs that the person belongs to */
  programs: string[];
}

/** Mark, program, search, who am I, and the places in the order of the job. */
export function TopBar({ person, places, programs }: Props) {
  const { pathname } = useLocation();
  const mine = useMine();
  const row = useRef<HTMLElement>(null);
  const begun = useRef(false);
  useEffect(() => {
    // A browser that begins at the current place by itself has done so, and the reader may have moved the row since.
    const shown = !begun.current && CSS.supports("scroll-initial-target", "nearest");
    begun.current = true;
    if (row.current && !shown) showCurrent(row.current);
  }, [pathname]);
  return (
    <header className="screen-only mx-auto max-w-page px-4 tablet:px-6">
      <a href="#main" className="btn btn-primary absolute top-2 left-2 z-10 -translate-y-20 focus:translate-y-0">
        Skip to content
      </a>
      <div className="flex min-h-12 items-center gap-x-4 py-1 tablet:gap-x-6">
        <Link
          to="/"
          className="flex items-center gap-2 text-lead font-semibold no-underline"
          aria-label="Planeward, Today"
        >
          <Mark />
          <span>Planeward</span>
        </Link>
        {programs.length > 0 && (
          <Link to="/#programs" className="truncate text-quiet no-underline hover:underline max-wide:hidden">
            {programs.length === 1 ? programs[0] : `${programs.length} programs`}
          </Link>
        )}
        <div className="ml-auto">
          <SearchOpener />
        </div>
        <Link to="/preferences" className="relative min-w-0 truncate py-1 text-quiet no-underline hover:underline">
          {person.name}
          <span className="max-tablet:sr-only">, {person.role}</span>
          <span className="sr-only">: preferences</span>
        </Link>
        <Form method="post" action="/sign-out">
          <button type="submit" className="link min-h-8 cursor-pointer whitespace-nowrap">
            Sign out
          </button>
        </Form>
      </div>
      <nav ref={row} aria-label="Places" className="overflow-x-auto border-b border-ink">
        <ul className="flex gap-7">
          {places.map(({ name, path }) => (
            <li key={path}>
              <Link
                to={path}
                // A document of its own, which alone may use the camera.
                reloadDocument={path === "/floor"}
                aria-current={liesIn(path, pathname) ? "page" : undefined}
                className="block py-2 whitespace-nowrap text-quiet no-underline aria-[current=page]:border-b-4 aria-[current=page]:border-ink aria-[current=page]:pb-1 aria-[current=page]:font-semibold aria-[current=page]:text-ink aria-[current=page]:[scroll-initial-target:nearest]"
              >
                {name}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      {mine && <KeysOpener singleKeys={mine.preferences.singleKeys} />}
    </header>
  );
}

/** Room between the current place and the edge of the row, px. */
const BESIDE = 16;

/** Scrolls the row of places, and nothing but the row, until the current one is in it. */
function showCurrent(row: HTMLElement): void {
  const place = row.querySelector("[aria-current]")?.getBoundingClientRect();
  if (!place) return;
  const { left, right } = row.getBoundingClientRect();
  if (place.left < left) row.scrollLeft -= left - place.left + BESIDE;
  else if (place.right > right) row.scrollLeft += place.right - right + BESIDE;
}
