import type { ComparedGroup } from "#app/schemas/comparison.ts";

/** Only the rows that differ; groups of which nothing is left go. */
export function onlyDifferences(groups: readonly ComparedGroup[]): ComparedGroup[] {
  return groups
    .map((group) => ({ ...group, rows: group.rows.filter(({ differs }) => differs) }))
    .filter(({ rows }) => rows.length > 0);
}
