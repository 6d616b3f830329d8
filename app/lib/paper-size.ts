/** Papers that a sheet prints on, portrait, mm. The frame keeps 20 to the left to be filed, 10 elsewhere. */
export const PAPERS = {
  a4: { name: "A4", width: 210, height: 297, page: "page-a4" },
  letter: { name: "Letter", width: 215.9, height: 279.4, page: "page-letter" },
} as const;

export type Paper = keyof typeof PAPERS;

export const FILING_MARGIN = 20;
export const MARGIN = 10;

/** The paper that an address asks for; null when it asks for none that there is. */
export function paperAskedFor(asked: string | null): Paper | null {
  const name = asked?.toLowerCase();
  return name === "a4" || name === "letter" ? name : null;
}
