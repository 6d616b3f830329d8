/** More than anybody ticks; what is beyond is not looked at, and the page says so. */
export const MOST_TICKED = 100;

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/i;

/** Ids that were ticked, each once, in their order; what is none is passed over. */
export function tickedIds(sent: URLSearchParams | FormData): string[] {
  const ids = sent
    .getAll("of")
    .flatMap((text) => (typeof text === "string" && UUID.test(text) ? text.toLowerCase() : []));
  return [...new Set(ids)].slice(0, MOST_TICKED);
}

/** The same with the version that each was looked at in, as a page that asks once more sends them: 'id version'. */
export function tickedVersions(sent: FormData): Map<string, number> {
  const pairs = sent.getAll("of").flatMap((text): [string, number][] => {
    const [id = "", version = ""] = typeof text === "string" ? text.split(" ") : [];
    return UUID.test(id) && /^\d{1,9}$/.test(version) ? [[id.toLowerCase(), Number(version)]] : [];
  });
  return new Map(pairs.slice(0, MOST_TICKED));
}
