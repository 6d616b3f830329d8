/** What a table of films would do to the library. */
export interface FilmImportPlan {
  /** the table as it was read, to be sent along when it is applied */
  text: string;
  added: { row: number; name: string }[];
  changed: { row: number; id: string; name: string; version: number; changes: FilmChange[]; uses: number }[];
  /** rows that say what the library says */
  same: number;
  refused: { row: number; name: string; reasons: string[] }[];
  /** heads that name nothing of a film */
  unread: string[];
}

/** A property of a film, before and after. */
export interface FilmChange {
  label: string;
  from: string;
  to: string;
}

export type FilmImported =
  | { outcome: "plan"; plan: FilmImportPlan; conflict: string | null }
  | { outcome: "refused"; reason: string }
  | { outcome: "done"; added: number; changed: number };
