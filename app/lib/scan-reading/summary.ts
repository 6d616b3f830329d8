import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { ColumnRole, Fault } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import type { TableRows } from "./table-rows.ts";
import { slotOf } from "./wafer-names.ts";

const QUANTITIES = ["bow", "warp", "sori", "thickness variation", "thickness"] as const;
type Quantity = (typeof QUANTITIES)[number];

/** What one column of a summary gives for each wafer, as its head says it. */
export interface SummaryFigure {
  column: number;
  heading: string;
  quantity: Quantity;
  statistic: "centre" | "mean" | "least" | "greatest" | "spread" | null;
  /** plane that it is measured from */
  reference: "best fit" | "three-point" | null;
  /** width left out at the edge, m */
  edgeExclusion: number | null;
}

export interface SummaryWafer {
  row: number;
  lot: string | null;
  slot: number | null;
  wafer: string | null;
  /** SI, in the order of the figures; null where the file has none */
  values: (number | null)[];
}

export interface Summary {
  figures: SummaryFigure[];
  wafers: SummaryWafer[];
  /** how it was measured, as a person has said */
  measured: ImportProfile["measured"] | null;
  faults: Fault[];
  footerLines: number;
}

/**
 * One row for each wafer of a lot.
 * @throws ScanFileError when no row can be told by a slot or a wafer's name
 */
export function summaryOf(table: TableRows, measured: ImportProfile["measured"]): Summary {
  const figures = table.reading.columns.flatMap(({ role, index, heading }) => {
    const quantity = QUANTITIES.find((one) => one === role);
    return quantity ? { column: index, heading, quantity, ...figureOfHead(heading) } : [];
  });
  const [lot, slot, wafer] = (["lot", "slot", "wafer"] as ColumnRole[]).map((role) => table.columnsOf(role)[0]);
  if (!slot && !wafer)
    throw new ScanFileError(
      `${table.name} has one row a wafer but neither a slot nor a wafer’s name. Export one of them too, or say which column it is.`,
    );
  const wafers = table.rows.map((row) => ({
    row: row.row,
    lot: table.text(row, lot),
    slot: slotOf(table, row, slot),
    wafer: table.text(row, wafer),
    values: figures.map(({ column }) => table.number(row, table.reading.columns[column])),
  }));
  noteTwice(table, wafers);
  const nameless = wafers.filter((one) => one.slot === null && one.wafer === null);
  for (const { row } of nameless) table.faults.add("neither slot nor wafer", row, null, "");
  const kept = wafers.filter((one) => !nameless.includes(one) && one.values.some((value) => value !== null));
  if (kept.length === 0) throw new ScanFileError(`${table.name} has no wafer with a figure.`, table.list());
  return { figures, wafers: kept, measured: measured ?? null, faults: table.list(), footerLines: table.footerLines };
}

function noteTwice(table: TableRows, wafers: readonly SummaryWafer[]): void {
  const seen = new Set<string>();
  for (const { lot, slot, wafer, row } of wafers) {
    const name = `${lot ?? ""}\n${slot ?? ""}\n${wafer ?? ""}`;
    if (seen.has(name)) table.faults.add("wafer listed twice", row, null, wafer ?? `slot ${slot}`);
    seen.add(name);
  }
}

const EDGE = /(?:\b|_)(?:ee|edge\s*excl\w*|excl\w*)?[\s_=-]*(\d+(?:[.,]\d+)?)\s*mm\b/i;
const BARE_EDGE = /(?:\b|_)ee[\s_=-]*(\d+(?:[.,]\d+)?)(?=\b|_)/i;

const STATISTICS: readonly (readonly [NonNullable<SummaryFigure["statistic"]>, RegExp])[] = [
  ["centre", /\bct?re?\b|\bcent(?:er|re)\b/],
  ["mean", /\bavg\b|\bmean\b|\baverage\b/],
  ["least", /\bmin(?:imum)?\b/],
  ["greatest", /\bmax(?:imum)?\b/],
  ["spread", /\bstd\b|\bsigma\b|\bstdev\b/],
];

/** What the suffixes of a head say: 'Bow_3pt_EE3', 'Warp-bf (µm)', 'Thk_ctr'. */
export function figureOfHead(heading: string): Pick<SummaryFigure, "statistic" | "reference" | "edgeExclusion"> {
  const edge = (EDGE.exec(heading) ?? BARE_EDGE.exec(heading))?.[1];
  const words = heading
    .replace(EDGE, " ")
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, " ");
  return {
    statistic: STATISTICS.find(([, pattern]) => pattern.test(words))?.[0] ?? null,
    reference: /\b(?:bf|best ?fit|ls|lsq)\b/.test(words)
      ? "best fit"
      : /\b(?:3 ?pt?s?|3 ?points?|three ?points?|tp)\b/.test(words)
        ? "three-point"
        : null,
    edgeExclusion: edge === undefined ? null : Number(edge.replace(",", ".")) / 1e3,
  };
}
