import { places, POINT_GRID, RAIL_GRID, RATIO_GRID, RING_GRID } from "../table-grid.ts";
import { edgeRingCurve } from "./edge-ring-curve.ts";
import { threePointRatios } from "./points-ritz.ts";
import { railsContact, type RailsSag } from "./rails-contact.ts";

const RATIOS = places(RATIO_GRID);

const RAIL_VALUES = [
  "centre",
  "rimAcross",
  "rimAlong",
  "rimHigh",
  "high",
] as const satisfies readonly (keyof RailsSag)[];

/** Text of the table of rails, a TypeScript file. */
export function railsTable(): string {
  const rows = places(RAIL_GRID).map((angle) => RATIOS.map((nu) => railsContact(Math.cos(angle), nu)));
  return [
    "/* Made by `npm run gravity-table` from app/engine/gravity/generator; not to be edited. */",
    "",
    "/** Sag on two rails in units of q a⁴/D: for each angle, for each Poisson's ratio, the value. */",
    ...RAIL_VALUES.map((name) =>
      constant(
        `RAILS_${snake(name)}`,
        rows.map((row) => row.map((sag) => sag[name])),
      ),
    ),
    "",
  ].join("\n");
}

/** Text of the tables of large deflection, a TypeScript file. */
export function largeSagTables(): string {
  const loads = places(RING_GRID).map((power) => 10 ** power);
  const pointLoads = places(POINT_GRID).map(Math.exp);
  const ring = RATIOS.map((nu) => edgeRingCurve(nu, loads));
  const points = RATIOS.map((nu) => threePointRatios(nu, pointLoads));
  return [
    "/* Made by `npm run gravity-table` from app/engine/gravity/generator; not to be edited. */",
    "",
    "/** Edge ring: sag over thickness, divided by that of small deflections; for each load, for each Poisson's ratio. */",
    constant(
      "RING_RATIOS",
      loads.map((load, k) => RATIOS.map((nu, n) => over(ring[n]?.[k], ((5 + nu) / (64 * (1 + nu))) * load))),
    ),
    "",
    "/** Three points at the rim: peak to valley over that of small deflections; for each load, for each Poisson's ratio. */",
    constant(
      "POINT_RATIOS",
      pointLoads.map((_, k) => RATIOS.map((_nu, n) => points[n]?.[k] ?? NaN)),
    ),
    "",
  ].join("\n");
}

function over(value: number | undefined, linear: number): number {
  return (value ?? NaN) / linear;
}

function snake(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter}`).toUpperCase();
}

function constant(name: string, rows: readonly (readonly number[])[]): string {
  const text = (value: number) => String(Number(value.toPrecision(6)));
  const lines = rows.map((row) => `  [${row.map(text).join(", ")}],`);
  return [`export const ${name}: readonly (readonly number[])[] = [`, ...lines, "];"].join("\n");
}
