export type Whose = "mine" | "theirs";
/** Whose is to stand, by the key of its row. */
export type MergeChoices = Readonly<Record<string, Whose>>;

/** Something that at least one of two people has changed in a stack. */
export interface MergeRow {
  key: string;
  label: string;
  /** as it was when this person opened the stack */
  opened: string;
  mine: string;
  theirs: string;
  /** who changed it: only what both have changed has to be decided */
  by: "you" | "them" | "both";
}

/** Whose stands; what both have changed and nobody has decided is mine as long. */
export const whoseOf = (row: Pick<MergeRow, "key" | "by">, choices: MergeChoices): Whose =>
  choices[row.key] ?? (row.by === "them" ? "theirs" : "mine");
