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

/** What was done, with the rows that were ticked as well and left from the beginning, so that none goes without a word. */
export function withLeft(done: TickedRows, asked: TickedRows): TickedRows {
  const known = new Set(done.rows.map(({ id }) => id));
  return { ...done, rows: [...done.rows, ...asked.rows.filter(({ id, state }) => state === "left" && !known.has(id))] };
}

/** '2 stacks', '1 stack' */
export const some = (number: number, [one, many]: readonly [string, string]) =>
  `${number} ${number === 1 ? one : many}`;
