import type { ColumnRole, Fault, ReadColumn } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import type { TableRow, TableRows } from "./table-rows.ts";
import { slotOf } from "./wafer-names.ts";

/** A stress as its tool has given it, with what the tool reduced it by; SI, null where the file has none. */
export interface ReducedStress {
  row: number;
  lot: string | null;
  slot: number | null;
  wafer: string | null;
  stress: number | null;
  modulus: number | null;
  filmThickness: number | null;
  substrateThickness: number | null;
  /** 1/m, with the sign of the file's radius; 0 for a wafer that is flat */
  curvatureBefore: number | null;
  curvatureAfter: number | null;
}

export interface ReducedStresses {
  wafers: ReducedStress[];
  faults: Fault[];
  footerLines: number;
}

/**
 * Stresses that a tool has already reduced, one row each.
 * @throws ScanFileError when no row has a stress or both radii
 */
export function reducedStressOf(table: TableRows): ReducedStresses {
  const column = (role: ColumnRole) => table.columnsOf(role)[0];
  const wafers = table.rows.map((row) => ({
    row: row.row,
    lot: table.text(row, column("lot")),
    slot: slotOf(table, row, column("slot")),
    wafer: table.text(row, column("wafer")),
    stress: table.number(row, column("stress")),
    modulus: table.number(row, column("modulus")),
    filmThickness: table.number(row, column("film thickness")),
    substrateThickness: table.number(row, column("substrate thickness")),
    curvatureBefore: curvature(table, row, column("radius before")),
    curvatureAfter: curvature(table, row, column("radius after")),
  }));
  const kept = wafers.filter(
    ({ stress, curvatureBefore, curvatureAfter }) =>
      stress !== null || (curvatureBefore !== null && curvatureAfter !== null),
  );
  if (kept.length === 0)
    throw new ScanFileError(`${table.name} has no row with a stress or with both radii.`, table.list());
  return { wafers: kept, faults: table.list(), footerLines: table.footerLines };
}

/** A radius of a flat wafer is endless, and tools write it so. */
const FLAT = /^[+-]?(?:inf|infinity|∞|flat)$/i;

function curvature(table: TableRows, row: TableRow, column: ReadColumn | undefined): number | null {
  if (column && FLAT.test(row.cells[column.index] ?? "")) return 0;
  const radius = table.number(row, column);
  if (radius !== 0) return radius === null ? null : 1 / radius;
  table.faults.add("radius of nothing", row.row, column?.index ?? null, row.cells[column?.index ?? 0] ?? "");
  return null;
}
