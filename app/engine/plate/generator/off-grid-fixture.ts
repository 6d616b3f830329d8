import type { OffGridPoint, PointClass } from "./off-grid.ts";

/**
 * The points as JSON, one row each: class, material ('' isotropic, else the direction of the load's x axis on silicon (001)),
 * then the numbers in the order of `columns`, to six significant digits.
 */
interface Fixture {
  columns: readonly string[];
  rows: (string | number)[][];
}

const COLUMNS = [
  "class",
  "axes",
  "poissonsRatio",
  "loadX",
  "loadY",
  "bowX",
  "bowY",
  "centreX",
  "centreY",
  "parabolaX",
  "parabolaY",
  "rim",
  "sixfold",
  "warp",
  "turn",
] as const;

export function fixtureOf(points: readonly OffGridPoint[]): string {
  const rows = points.map(({ class: sort, kind, load, bow, centre, parabola, rim, sixfold, warp, turn }) => {
    const numbers = [load, bow, centre, parabola].flatMap(({ x, y }) => [x, y]);
    const axes = kind.crystal === "100" ? (kind.axes ?? "100") : "";
    return [sort, axes, ...[kind.poissonsRatio, ...numbers, rim, sixfold, warp, turn].map(short)];
  });
  const lines = rows.map((row) => JSON.stringify(row)).join(",\n");
  return `{"columns":${JSON.stringify(COLUMNS)},"rows":[\n${lines}\n]}\n`;
}

function short(value: number): number {
  return Number(value.toPrecision(6)) + 0;
}

/** The points of a fixture. */
export function pointsOf(text: string): OffGridPoint[] {
  const { rows } = JSON.parse(text) as Fixture;
  return rows.map((row) => {
    const [sort, axes] = row;
    const [poissonsRatio, ...numbers] = row.slice(2).map(Number);
    const pair = (n: number) => ({ x: numbers[n] ?? Number.NaN, y: numbers[n + 1] ?? Number.NaN });
    const one = (n: number) => numbers[n] ?? Number.NaN;
    return {
      class: sort as PointClass,
      kind: {
        poissonsRatio: poissonsRatio ?? Number.NaN,
        ...(axes === "" ? {} : { crystal: "100", axes: axes === "110" ? "110" : "100" }),
      },
      load: pair(0),
      bow: pair(2),
      centre: pair(4),
      parabola: pair(6),
      rim: one(8),
      sixfold: one(9),
      warp: one(10),
      turn: one(11),
    };
  });
}
