import type { SearchAnswer } from "#app/schemas/search.ts";

/** A line of the palette that can be opened. */
export interface PaletteOption {
  key: string;
  name: string;
  about: string;
  path: string;
  /** title of its group */
  group: string;
}

/** Everything of an answer that can be opened, in the order in which it stands: the rows of each group, then its list. */
export function optionsOf(answer: SearchAnswer | null): PaletteOption[] {
  return (answer?.groups ?? []).flatMap(({ kind, title, rows, total, list }) => [
    ...rows.map((row) => ({ ...row, group: title })),
    ...(list ? [{ key: `${kind} list`, name: `All ${total} in the list`, about: "", path: list, group: title }] : []),
  ]);
}
