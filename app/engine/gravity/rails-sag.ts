import { tableValue } from "./interpolate.ts";
import type { SmoothTable } from "./smooth-table.ts";
import { RAIL_GRID } from "./table-grid.ts";
import { RAILS_CENTRE, RAILS_HIGH, RAILS_RIM_ACROSS, RAILS_RIM_ALONG, RAILS_RIM_HIGH } from "./table/rails.ts";

/**
 * A plate of radius 1 under its own weight on two rails at x = ±`at`, which push and never pull, small deflections, in units of
 * q a⁴/D, up positive, zero at the rails.
 *
 * From a table of contact solutions (`generator/rails-contact.ts`, fine to 0.00002 q a⁴/D) by cubics. Against the same solution
 * at 160 random places between its rows: within 0.0005 q a⁴/D and 0.2 % of the peak to valley, 2 % near at = 0.47, where that
 * is smallest (0.008). Rails beyond 0.88 carry the wafer on their four ends alone, and it sags by up to a tenth more than if
 * it were pinned along them. Source: own computation ('plate-gravity').
 */
export function railsSag(at: number, nu: number) {
  const value = (table: SmoothTable) => tableValue(table, RAIL_GRID, Math.acos(at), nu);
  const centre = value(RAILS_CENTRE);
  const [across, along] = [value(RAILS_RIM_ACROSS), value(RAILS_RIM_ALONG)];
  const rimHigh = Math.max(value(RAILS_RIM_HIGH), across, along);
  const rimLow = Math.min(across, along);
  const high = Math.max(value(RAILS_HIGH), rimHigh, centre, 0);
  return { centre, rimHigh, rimLow, peakToValley: high - Math.min(rimLow, centre, 0) };
}
