import { packTable, type SmoothTable } from "../smooth-table.ts";
import { places, POINT_GRID, RAIL_GRID, RATIO_GRID, RING_GRID } from "../table-grid.ts";
import { edgeRingCurve } from "./edge-ring-curve.ts";
import { threePointRatios } from "./points-ritz.ts";
import { railsContact, type RailsSag } from "./rails-contact.ts";

const RATIOS = places(RATIO_GRID);

/** Columns of every table. */
const COLUMNS = RATIOS.length;

/** Rails are fine to 0.00002 q a⁴/D; ratios of large deflection to some 0.0001. Neither is what rounding shows in. */
const RAILS_PER_UNIT = 1e7;
const RATIOS_PER_UNIT = 1e6;

/** Characters of packed text in a line. */
const WIDTH = 100;

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
    ...HEAD,
    "/** Sag on two rails in units of q a⁴/D: for each angle, for each Poisson's ratio, the value. */",
    ...RAIL_VALUES.map((name) =>
      constant(
        `RAILS_${snake(name)}`,
        rows.map((row) => row.map((sag) => sag[name])),
        RAILS_PER_UNIT,
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
    ...HEAD,
    "/** Edge ring: logarithm of the sag over that of small deflections; for each load, for each Poisson's ratio. */",
    constant(
      "RING_LOGARITHMS",
      loads.map((load, k) => RATIOS.map((nu, n) => Math.log(over(ring[n]?.[k], ((5 + nu) / (64 * (1 + nu))) * load)))),
      RATIOS_PER_UNIT,
    ),
    "",
    "/** Three points at the rim: peak to valley over that of small deflections; for each load, for each Poisson's ratio. */",
    constant(
      "POINT_RATIOS",
      pointLoads.map((_, k) => RATIOS.map((_nu, n) => points[n]?.[k] ?? NaN)),
      RATIOS_PER_UNIT,
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

const HEAD = [
  'import { unpackTable } from "../smooth-table.ts";',
  "",
  "/* Made by `npm run gravity-table` from app/engine/gravity/generator; not to be edited. */",
  "",
];

function constant(name: string, rows: SmoothTable, perUnit: number): string {
  const lines = packTable(rows, perUnit).match(new RegExp(`.{1,${WIDTH}}`, "g")) ?? [];
  const text = lines.map((line) => `  "${line}"`).join(" +\n");
  return `export const ${name} = /* @__PURE__ */ unpackTable(\n${text},\n  ${COLUMNS},\n  ${perUnit},\n);`;
}
