import type { StressValueRow } from "#app/schemas/film-stress.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "./list-params.ts";

/** Names of the columns that the history of a film's stress sorts by; the first is the default. */
export const STRESS_SORTS = ["measured", "value", "thickness", "instrument", "state", "accepted"] as const;

/** What stands for an instrument that nobody named. */
export const UNNAMED = "instrument not named";

const keyOf = (row: StressValueRow, sort: string): number | string => {
  switch (sort) {
    case "value":
      return row.value;
    case "thickness":
      return row.filmThickness ?? Number.POSITIVE_INFINITY;
    case "instrument":
      return row.instrument.toLowerCase();
    case "state":
      return row.state;
    case "accepted":
      return row.acceptedAt;
    default:
      return row.measuredAt;
  }
};

/** Words of a row as its reader sees them, to be searched. */
function wordsOf({ origin, instrument, reason, acceptedBy, setAside }: StressValueRow): string {
  const from = origin.kind === "scan" ? [origin.label, origin.program] : [origin.kind === "typed" ? origin.source : ""];
  return [...from, instrument || UNNAMED, reason, acceptedBy, setAside?.reason, setAside?.by]
    .filter(Boolean)
    .join("\n")
    .toLowerCase();
}

/** The rows that a search, filters and a sort leave, in their order. Only what the reader may see of a row is searched. */
export function chosenValues(rows: readonly StressValueRow[], params: ListParams): StressValueRow[] {
  const query = params.query.toLowerCase();
  const { state } = params.filters;
  const direction = params.descending ? -1 : 1;
  return rows
    .filter((row) => (!state || row.state === state) && (!query || wordsOf(row).includes(query)))
    .toSorted((a, b) => {
      const [left, right] = [keyOf(a, params.sort), keyOf(b, params.sort)];
      return (left < right ? -direction : left > right ? direction : 0) || a.id.localeCompare(b.id);
    });
}

/** One page of them. */
export function pageOfValues(rows: readonly StressValueRow[], params: ListParams): ListPage<StressValueRow> {
  const chosen = chosenValues(rows, params);
  const from = (params.page - 1) * PAGE_SIZE;
  return { rows: chosen.slice(from, from + PAGE_SIZE), total: chosen.length, params };
}
