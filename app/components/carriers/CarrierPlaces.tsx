import { NavLink } from "react-router";
import { KINDS, kindPath, type KindSlug } from "#app/lib/library-kinds.ts";

const PLACES = [
  ...(Object.keys(KINDS) as KindSlug[]).map((slug) => ({ name: KINDS[slug].title, path: kindPath(slug) })),
  { name: "Limits", path: "/carriers/limits" },
];

/** What is kept in the place Carriers & bonds: a second, quiet row of links. */
export function CarrierPlaces() {
  return (
    <nav aria-label="Carriers and bonds" className="screen-only overflow-x-auto border-b border-line">
      <ul className="flex gap-6">
        {PLACES.map(({ name, path }) => (
          <li key={path}>
            <NavLink
              to={path}
              className="block py-2 whitespace-nowrap text-quiet no-underline aria-[current=page]:font-semibold aria-[current=page]:text-ink"
            >
              {name}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
