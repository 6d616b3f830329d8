/** Letter by which the numbers of a kind of record are told apart. */
const LETTERS = { assessment: "A", sheet: "H", incident: "I" } as const;
type Numbered = keyof typeof LETTERS;

/** Number of a record as paper and lists show it, such as 'TERN-H003': the third sheet of program Tern. */
export function recordNumber(kind: Numbered, programSlug: string, number: number): string {
  return `${programSlug.toUpperCase()}-${LETTERS[kind]}${String(number).padStart(3, "0")}`;
}

/** What such a number says, whatever follows it; null where the text begins with none of that kind. */
export function readRecordNumber(kind: Numbered, text: string): { slug: string; number: number } | null {
  const found = new RegExp(`^\\s*([a-z0-9-]+)-${LETTERS[kind]}0*(\\d{1,6})\\b`, "i").exec(text);
  const [, slug, number] = found ?? [];
  return slug === undefined ? null : { slug: slug.toLowerCase(), number: Number(number) };
}

/** The same number in SQL, of a program called `p`. @param column the number itself */
export const recordNumberSql = (kind: Numbered, column: string): string =>
  `upper(p.slug) || '-${LETTERS[kind]}' || lpad(${column}::text, greatest(3, length(${column}::text)), '0')`;
