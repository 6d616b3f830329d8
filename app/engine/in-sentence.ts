/**
 * A name or sentence as it stands inside another sentence: 'Edge trimmer' as 'edge trimmer'. What starts with a capital and another
 * one, or a digit, is no ordinary word and keeps it: 'CMP tool', 'X2 coater'.
 */
export function inSentence(text: string): string {
  return /^\p{Lu}[\p{Lu}\d]/u.test(text) ? text : text.charAt(0).toLowerCase() + text.slice(1);
}
