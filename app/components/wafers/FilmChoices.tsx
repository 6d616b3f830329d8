import { Link } from "react-router";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { FilmChoice } from "#app/schemas/wafer-page.ts";

/** The films that were measured on a wafer, where there are several. */
export function FilmChoices({ films, chosen }: { films: FilmChoice[]; chosen: string }) {
  if (films.length < 2) return null;
  return (
    <nav aria-label="Films on this wafer" className="screen-only mb-4 flex flex-wrap gap-2">
      {films.map(({ key, name, thickness, scans }) => (
        <Link
          key={key}
          to={`?film=${encodeURIComponent(key)}`}
          preventScrollReset
          className="btn"
          aria-current={key === chosen ? "page" : undefined}
        >
          {name}, {formatQuantity(thickness, "length", { significant: 3, trim: true })},{" "}
          {scans === 1 ? "1 scan" : `${scans} scans`}
          {key === chosen && ", shown"}
        </Link>
      ))}
    </nav>
  );
}
