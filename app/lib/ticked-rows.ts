/** A row that was ticked, with what would become of it or what has. */
export interface TickedRow {
  id: string;
  name: string;
  program: string;
  /** its page, while it has one */
  path: string | null;
  /** version that it was looked at in */
  version: number;
  /** `left`: nothing is done with it, and `words` say why */
  state: "to do" | "done" | "left";
  words: string;
}

/** All that were ticked. */
export interface TickedRows {
  rows: TickedRow[];
  /** how many more were ticked that are gone, or not the person's to see */
  hidden: number;
}

export const countOf = ({ rows }: TickedRows, state: TickedRow["state"]) =>
  rows.filter((row) => row.state === state).length;

/** '2 stacks', '1 stack' */
export const some = (number: number, [one, many]: readonly [string, string]) =>
  `${number} ${number === 1 ? one : many}`;
