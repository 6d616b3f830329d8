/** The beginning of a text for a sentence: control characters become blanks, no character is cut in half. */
export function excerpt(text: string, longest: number): string {
  const plain = [...text.replace(/\p{Cc}+/gu, " ").trim()];
  return plain.length > longest ? `${plain.slice(0, longest - 1).join("")}…` : plain.join("");
}
