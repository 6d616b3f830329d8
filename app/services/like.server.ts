/** Text for a LIKE pattern in which the reader's % and _ mean themselves. */
export function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, (sign) => `\\${sign}`);
}
