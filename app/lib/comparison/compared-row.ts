import type { ComparedRow } from "#app/schemas/comparison.ts";

/** What one member has in a row. `same`: what two must share to count as alike; the text where nothing is said. */
export interface RowCell {
  text: string;
  note?: string | null;
  same?: unknown;
}

/** A row over all members, with what is not as in the first of them marked. */
export function comparedRow<Member>(
  key: string,
  label: string,
  members: readonly Member[],
  cellOf: (member: Member, column: number) => RowCell,
): ComparedRow {
  const made = members.map((member, column) => cellOf(member, column));
  const keys = made.map(({ text, same = text }) => JSON.stringify(same));
  const cells = made.map(({ text, note = null }, column) => ({ text, note, differs: keys[column] !== keys[0] }));
  return { key, label, cells, differs: cells.some(({ differs }) => differs) };
}
