/** How far an entry of the bibliography was consulted. */
export type SourceBasis =
  | "read"
  | "abstract read"
  | "from memory of the named publication"
  | "common practice, no source"
  | "own derivation"
  | "own computation";

export interface Source {
  author: string;
  title: string;
  year: number | null;
  /** Journal with volume and page, publisher, or institution; never an access address. */
  place: string;
  basis: SourceBasis;
}

export const memory = "from memory of the named publication";
