import type { TriedBond } from "#app/engine/finder/find-bonds.ts";
import type { FinderRow } from "#app/schemas/finder.ts";
import type { ListPage, ListParams } from "#app/lib/list-params.ts";
import { figureText, micrometres } from "./assessment-figure.ts";
import { PAGE_SIZE } from "./list-params.ts";
import { csvOf, type CsvMark } from "./csv.ts";

export const FINDER_SORTS = ["rank", "carrier", "material", "thickness", "margin"] as const;

/** A tried bond as a row of the finder. `from` is the step that makes the bond. */
export function finderRow(tried: TriedBond, from: number): FinderRow {
  const { carrier, material, thickness, planned, outcome, margin, misfit, atTarget } = tried;
  const at = misfit?.finding ?? null;
  const missed = misfit && !at && atTarget !== null;
  return {
    key: `${carrier.id} ${material.id} ${thickness}`,
    carrier: carrier.name,
    material: material.name,
    release: material.release,
    thickness,
    planned,
    fits: misfit === null,
    outcome,
    margin: margin?.value ?? null,
    tightest: margin && { step: margin.finding.step, rule: margin.finding.rule },
    reason: misfit && {
      step: misfit.step,
      rule: at?.rule ?? null,
      text: missed ? `It warps ${micrometres(atTarget)}, more than the target.` : misfit.reason,
      figure: at?.figures[0] ? figureText(at.figures[0]) : missed ? micrometres(atTarget) : null,
      limit: at?.limit ? figureText(at.limit) : null,
    },
    posted: planned
      ? null
      : JSON.stringify([{ quantity: "bond", step: from, carrier: carrier.id, material: material.id, thickness }]),
  };
}

/** 'step 15, rule 2' */
export const tightestWords = ({ step, rule }: NonNullable<FinderRow["tightest"]>) => `step ${step}, rule ${rule}`;

/** What of the rows a search, a filter and a sort leave, in order. `rank` keeps the finder's own order: what fits first. */
export function chosenRows(rows: readonly FinderRow[], { query, sort, descending, filters }: ListParams): FinderRow[] {
  const wanted = query.toLowerCase();
  const kept = rows.filter(
    (row) =>
      (filters["fits"] === "" || (filters["fits"] === "yes") === row.fits) &&
      `${row.carrier} ${row.material} ${row.release} ${row.reason?.text ?? ""}`.toLowerCase().includes(wanted),
  );
  const compare = ORDERS[sort];
  const sorted = compare ? kept.toSorted(compare) : kept;
  return descending ? sorted.toReversed() : sorted;
}

type Order = (a: FinderRow, b: FinderRow) => number;
const byText =
  (key: "carrier" | "material"): Order =>
  (a, b) =>
    a[key].localeCompare(b[key]);
const ORDERS: Record<string, Order> = {
  carrier: byText("carrier"),
  material: byText("material"),
  thickness: (a, b) => a.thickness - b.thickness,
  margin: (a, b) => (a.margin ?? -Infinity) - (b.margin ?? -Infinity),
};

/** One page of chosen rows. */
export function finderPage(rows: FinderRow[], params: ListParams): ListPage<FinderRow> {
  const from = (params.page - 1) * PAGE_SIZE;
  return { rows: rows.slice(from, from + PAGE_SIZE), total: rows.length, params };
}

const HEAD = [
  "carrier",
  "bonding_material",
  "release",
  "thickness_um",
  "planned",
  "fits",
  "margin",
  "tightest",
  "step",
  "rule",
  "reason",
  "figure",
  "limit",
];

/** The finder's rows as CSV with a point as decimal mark; text that a spreadsheet would run as a formula is defused. */
export function finderCsv(rows: readonly FinderRow[], mark?: CsvMark): string {
  const cells = rows.map(({ carrier, material, release, thickness, planned, fits, margin, tightest, reason }) => [
    carrier,
    material,
    release,
    Number((thickness * 1e6).toPrecision(12)),
    planned ? "yes" : "no",
    fits ? "yes" : "no",
    margin === null ? "" : Number(margin.toPrecision(6)),
    tightest ? tightestWords(tightest) : "",
    reason?.step ?? "",
    reason?.rule ?? "",
    reason?.text ?? "",
    reason?.figure ?? "",
    reason?.limit ?? "",
  ]);
  return csvOf([HEAD, ...cells], mark);
}
