import { Link } from "react-router";
import type { FoundGroup } from "#app/schemas/search.ts";

/** What a person marked and opened last, as it stands beside the rest of Today. */
export function KeptSections({ groups }: { groups: FoundGroup[] }) {
  return groups.map(({ kind, title, rows, total, list }) => (
    <section key={kind} aria-labelledby={`kept-${kind}`} className="border-t border-ink pt-3">
      <h2 id={`kept-${kind}`} className="font-semibold">
        {title}
      </h2>
      <ul className="mt-1">
        {rows.map(({ key, name, about, path }) => (
          <li key={key} className="border-t border-line py-(--list-padding) first:border-0">
            <Link to={path} className="link wrap-anywhere">
              {name}
            </Link>
            <span className="block text-label text-quiet">{about}</span>
          </li>
        ))}
      </ul>
      {list && (
        <p className="border-t border-line pt-2">
          <Link to={list} className="link">
            All {total} in the list
          </Link>
        </p>
      )}
    </section>
  ));
}
