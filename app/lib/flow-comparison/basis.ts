import type { ComparedFlow } from "./figures.ts";

/** What the figures of a comparison are of: the flows as they stand now, and of which of them no stored assessment says the same. */
export function basisWords(flows: readonly Pick<ComparedFlow, "letter" | "assessed">[]): string {
  const none = flows.filter(({ assessed }) => assessed === null).map(({ letter }) => letter);
  const old = flows.filter(({ assessed }) => assessed?.outOfDate).map(({ letter }) => letter);
  const sentences = ["Each flow as it stands now, walked with the library and limits of now; nothing of it is stored."];
  if (old.length > 0)
    sentences.push(`The newest assessment of ${listed(old)} is out of date, so its figures are others.`);
  if (none.length > 0) sentences.push(`Not assessed yet: ${listed(none)}.`);
  return sentences.join(" ");
}

const listed = (letters: readonly string[]) =>
  letters.length === 1 ? (letters[0] ?? "") : `${letters.slice(0, -1).join(", ")} and ${letters.at(-1)}`;
