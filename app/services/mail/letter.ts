/** A mail before it is set as text and as HTML: the same words in both. */
export interface Letter {
  subject: string;
  /** one part for each thing told; a digest has several */
  parts: LetterPart[];
  /** stands above the parts; null where the only part says it all */
  opening: string | null;
  /** why the reader gets it, and what they can do about that */
  foot: { why: string; links: { words: string; address: string }[] };
}

export interface LetterPart {
  heading: string;
  sentence: string;
  facts: { label: string; value: string }[];
  said: { heading: string; lines: string[] } | null;
  mind: string | null;
  link: { words: string; address: string };
}
