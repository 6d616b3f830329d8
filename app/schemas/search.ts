/** Something that a search found, or that was opened or marked before. */
export interface FoundRow {
  /** tells rows of one answer apart */
  key: string;
  name: string;
  /** what tells it from others of its name: program, kind, day */
  about: string;
  path: string;
}

/** What was found of one kind, the best first. */
export interface FoundGroup {
  kind: string;
  title: string;
  rows: FoundRow[];
  /** how many fit in all */
  total: number;
  /** address of the list with this search, where there is a list and it shows more */
  list: string | null;
}

/** The answer to a search; without a query, what the person marked and opened before. */
export interface SearchAnswer {
  query: string;
  groups: FoundGroup[];
  /** how many fit in all kinds together */
  total: number;
}
