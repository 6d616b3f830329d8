import { wordsOf } from "#app/lib/match-rank.ts";

/** Text for a LIKE pattern in which the reader's % and _ mean themselves. */
export function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, (sign) => `\\${sign}`);
}

/** A LIKE pattern for each word of a search: what fits has every one of them, in any order. */
export function wordPatterns(query: string): string[] {
  return wordsOf(query).map((word) => `%${escapeLike(word)}%`);
}

/** The condition that every word of a search is found. @param where the condition that one word is found, by its pattern */
export function everyWord<Condition>(query: string, where: (pattern: { $ilike: string }) => Condition) {
  return { $and: wordPatterns(query).map((pattern) => where({ $ilike: pattern })) };
}
