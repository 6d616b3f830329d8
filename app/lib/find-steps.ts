import type { StepRow } from "./flow-rows.ts";

/** The rows in which every word of a search occurs: in what is done, its kind, tool, machine, recipe, films, holder or exposure. */
export function findSteps(rows: readonly StepRow[], query: string): StepRow[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  return rows.filter((row) => {
    const text = searched(row).join(" ").toLowerCase();
    return words.every((word) => text.includes(word));
  });
}

function searched({ title, kind, tool, run, sideUp, exposures, planned, bond, changes }: StepRow): string[] {
  const side = sideUp === null ? "" : `${sideUp} up`;
  return [
    title,
    kind,
    tool ?? "",
    run ?? "",
    side,
    ...exposures,
    planned,
    bond ?? "",
    ...changes.map(({ what }) => what),
  ];
}
