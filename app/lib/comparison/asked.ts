/** Fewest and most of one comparison: with more, neither lines nor columns can be told apart. */
export const LEAST_COMPARED = 2;
export const MOST_COMPARED = 6;
/** In the place of a tool: no limit of one is drawn. */
export const NO_TOOL = "none";
/** What an address may hold before the rest is left unread. */
const MOST_READ = 40;
const LONGEST = 60;

/** Which stacks or flows are compared, and how: all of it in the address, so that every comparison can be linked. */
export interface ComparisonAsked {
  /** in the order of their columns */
  ids: string[];
  /** of stacks: temperature as it was typed, blank for 25 °C */
  at: string;
  /** of flows: what their warp is drawn along, blank for their steps */
  along: "" | "thickness" | "steps";
  /** blank for what suits the chart */
  scale: "" | "log" | "linear";
  /** thickness range as it was typed, blank for all of it */
  from: string;
  to: string;
  /** id of the tool whose limits are drawn, 'none', or blank for the usual ones */
  tool: string;
  /** only rows that differ */
  only: boolean;
  /** what is searched for to be added */
  query: string;
}

const oneOf = <Word extends string>(words: readonly Word[], typed: string | null) =>
  words.find((word) => word === typed) ?? "";

/** Reads a comparison from its address. Ids come as one list with commas, or one by one as a form sends them. */
export function readComparison(search: URLSearchParams): ComparisonAsked {
  const text = (name: string) => (search.get(name) ?? "").replaceAll("\0", "").trim().slice(0, LONGEST);
  const ids = search.getAll("of").flatMap((list) => list.split(","));
  const named = ids.map((id) => id.trim().toLowerCase()).filter((id) => id !== "");
  return {
    ids: [...new Set(named)].slice(0, MOST_READ),
    at: text("at"),
    along: oneOf(["thickness", "steps"], search.get("along")),
    scale: oneOf(["log", "linear"], search.get("scale")),
    from: text("from"),
    to: text("to"),
    tool: text("tool"),
    only: search.get("only") === "differences",
    query: text("q"),
  };
}

/** The fields of a comparison besides its members, as address and forms have them; blank ones are left out. */
export function comparisonFields({ ids: _, only, query, ...fields }: ComparisonAsked): [name: string, value: string][] {
  return Object.entries({ ...fields, only: only ? "differences" : "", q: query }).filter(([, value]) => value !== "");
}

/** The search part of a comparison's address, without what is as it is by itself. */
export function comparisonSearch(asked: ComparisonAsked, changes: Partial<ComparisonAsked> = {}): string {
  const changed = { ...asked, ...changes };
  const rest = new URLSearchParams(comparisonFields(changed)).toString();
  return `?of=${changed.ids.map(encodeURIComponent).join(",")}${rest === "" ? "" : `&${rest}`}`;
}

/** The list with one of its members a place earlier or later. */
export function moved(ids: readonly string[], id: string, by: -1 | 1): string[] {
  const from = ids.indexOf(id);
  const to = from + by;
  if (from < 0 || to < 0 || to >= ids.length) return [...ids];
  const rest = ids.filter((other) => other !== id);
  return [...rest.slice(0, to), id, ...rest.slice(to)];
}
