/** How well a name fits a search: 0 is it, 1 begins with it, 2 has a word that begins with it, 3 has it anywhere. */
export type MatchRank = 0 | 1 | 2 | 3;

/** The words of a search; what fits has each of them, in any order. */
export const wordsOf = (query: string): string[] => query.split(/\s+/).filter(Boolean);

/** A text in which every sign of a regular expression means itself, for JavaScript's and for PostgreSQL's. */
export const escapeRegex = (text: string): string => text.replace(/[\\^$.*+?()[\]{}|]/g, "\\$&");

/**
 * How well something fits a search, or null when it does not.
 * @param also further text in which the words may stand, without a say in how well it fits
 */
export function matchRank(query: string, name: string, also = ""): MatchRank | null {
  const [asked, called] = [query.toLowerCase(), name.toLowerCase()];
  const text = `${called} ${also.toLowerCase()}`;
  if (!wordsOf(asked).every((word) => text.includes(word))) return null;
  if (called === asked) return 0;
  if (called.startsWith(asked)) return 1;
  return new RegExp(`(?<![\\p{L}\\p{N}])${escapeRegex(asked)}`, "u").test(called) ? 2 : 3;
}
