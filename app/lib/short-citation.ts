import { SOURCES, type Source, type SourceId } from "#app/engine/sources.ts";

/** A source as running text names it: family names and year, the work itself where it is our own or has no author. */
export function shortCitation(id: SourceId): string {
  const { author, title, year, basis }: Source = SOURCES[id];
  if (basis === "own derivation" || basis === "own computation")
    return `${basis}, ${title.charAt(0).toLowerCase()}${title.slice(1)}`;
  if (id === "common-practice") return "common practice, no source";
  if (author === "SEMI") return `SEMI ${title.slice(0, title.indexOf(","))}`;
  const names = author.replace(/\b\p{L}\.(?:-?\p{L}\.)* ?/gu, "").trim();
  return year === null ? `${names}, ${title}` : `${names} ${year}`;
}
