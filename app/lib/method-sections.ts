/** The sections of the method page, in their order; the id is the anchor. */
export const METHOD_SECTIONS = [
  { id: "model", title: "What is computed" },
  { id: "conventions", title: "Signs and words" },
  { id: "rules", title: "Handling rules" },
  { id: "equations", title: "Equations" },
  { id: "left-out", title: "What is left out" },
  { id: "cautions", title: "Cautions" },
  { id: "glossary", title: "Glossary" },
  { id: "keys", title: "Keys" },
  { id: "sources", title: "Sources" },
] as const;

/** Anchor of a term of the conventions or the glossary. */
export const termAnchor = (term: string): string => `term-${term.toLowerCase().replace(/[^a-z0-9]+/g, "-")}`;
