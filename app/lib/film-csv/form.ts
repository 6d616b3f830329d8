import { headOf, MEASURED_COLUMNS, PLAIN_COLUMNS } from "./columns.ts";

/** A film's columns as its form would send them; a column that is not there is sent blank. */
export function formOfCells(cells: ReadonlyMap<string, string>): Record<string, unknown> {
  const handling: Record<string, unknown> = {};
  const film: Record<string, unknown> = { handling };
  const said = (head: string) => cells.get(head) ?? "";
  for (const { property, handling: asked, head } of PLAIN_COLUMNS) (asked ? handling : film)[property] = said(head);
  for (const columns of MEASURED_COLUMNS) {
    const [value, tolerance, source, note, on] = (["value", "tolerance", "source", "note", "date"] as const).map(
      (part) => said(headOf(columns, part)),
    );
    // A source alone is none: a form that leaves the value out has no source either.
    const into = columns.handling ? handling : film;
    into[columns.property] = { value, tolerance, source: source === "" ? undefined : source, note, on };
  }
  return film;
}

/** What a path of a form's fault is called in a sentence: 'stress, tolerance'. */
export function faultPlace(path: readonly PropertyKey[]): string {
  const [first, ...rest] = path[0] === "handling" ? path.slice(1) : path;
  const asked = path[0] === "handling";
  const among = [...PLAIN_COLUMNS, ...MEASURED_COLUMNS];
  const column = among.find(({ property, handling }) => property === first && Boolean(handling) === asked);
  const part = rest.filter((each) => each !== "value").map(String);
  return [column?.label ?? String(first), ...part].join(", ");
}
