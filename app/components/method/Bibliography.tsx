import { SOURCES, type Source } from "#app/engine/sources.ts";

/** Every source of the engine and how far it was consulted. */
export function Bibliography() {
  const entries = Object.entries<Source>(SOURCES).toSorted(([, a], [, b]) => a.author.localeCompare(b.author, "en"));
  return (
    <ul>
      {entries.map(([id, { author, title, year, place, basis }]) => (
        <li
          key={id}
          id={`source-${id}`}
          className="scroll-mt-4 border-t border-line py-2 first:border-0 target:bg-wash"
        >
          {author}
          {year === null ? "" : ` (${year})`}: <cite>{title}</cite>. {place}.{" "}
          <span className="text-quiet">{basis.charAt(0).toUpperCase() + basis.slice(1)}.</span>
        </li>
      ))}
    </ul>
  );
}
