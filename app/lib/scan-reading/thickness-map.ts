import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { Fault } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import type { TableRows } from "./table-rows.ts";

const FEWEST_SITES = 5;

/** One site of a map, m from the centre and m thick. */
export interface MapSite {
  row: number;
  wafer: string | null;
  x: number;
  y: number;
  thickness: number;
}

export interface ThicknessMap {
  sites: MapSite[];
  /** whether the file gave radius and angle */
  polar: boolean;
  underneath: ImportProfile["underneath"] | null;
  faults: Fault[];
  footerLines: number;
}

/**
 * Thickness by place on the wafer, from x and y or from radius and angle.
 * @throws ScanFileError when fewer than five sites are whole
 */
export function thicknessMapOf(table: TableRows, underneath: ImportProfile["underneath"]): ThicknessMap {
  const column = (role: Parameters<TableRows["columnsOf"]>[0]) => table.columnsOf(role)[0];
  const [radius, angle, across, along] = [column("radius"), column("angle"), column("position"), column("y")];
  const [thickness, wafer] = [column("thickness"), column("wafer")];
  const polar = radius !== undefined && angle !== undefined && !(across && along);
  if (!thickness || !(polar || (across && along)))
    throw new ScanFileError(`${table.name} is no map: it needs a thickness, and x and y or a radius and an angle.`);
  const sites = table.rows.flatMap((row): MapSite[] => {
    const [one, two] = polar
      ? [table.number(row, radius), table.number(row, angle)]
      : [table.number(row, across), table.number(row, along)];
    const value = table.number(row, thickness);
    if (one === null || two === null || value === null) {
      if (row.cells.some((cell) => cell !== "")) table.faults.add("site not whole", row.row, null, row.cells.join(" "));
      return [];
    }
    const place = polar ? { x: one * Math.cos(two), y: one * Math.sin(two) } : { x: one, y: two };
    return [{ row: row.row, wafer: table.text(row, wafer), ...place, thickness: value }];
  });
  if (sites.length < FEWEST_SITES)
    throw new ScanFileError(
      `${table.name} has ${sites.length} whole ${sites.length === 1 ? "site" : "sites"}; a map needs at least ${FEWEST_SITES}.`,
      table.list(),
    );
  return { sites, polar, underneath: underneath ?? null, faults: table.list(), footerLines: table.footerLines };
}
