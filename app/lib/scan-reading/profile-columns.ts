import { behaviourOf, type Behaviour } from "./behaviour.ts";
import { columnName, type DescribedColumn } from "./columns.ts";
import type { Marks } from "./decimal-mark.ts";
import type { Ambiguity, ColumnPair, ColumnRole } from "./reading.ts";
import type { Split } from "./splits.ts";

/** Roles that a column of a profile can have; what a head names beside them is another file's. */
const OF_PROFILES: readonly (ColumnRole | null)[] = [
  "index",
  "time",
  "date",
  "position",
  "radius",
  "height",
  "levelled height",
  "slope",
  "y",
  "not read",
];

/**
 * Tells which columns are positions and which heights, and says what stays open. Changes the roles in place.
 * @param mapped whether the import profile has named the columns
 */
export function settleProfileColumns(
  columns: DescribedColumn[],
  split: Split,
  marks: Marks,
  mapped: boolean,
): Ambiguity | null {
  for (const column of columns) {
    if (column.role === "radius before" || column.role === "radius after") column.role = "radius";
    if (!OF_PROFILES.includes(column.role)) give(column, null, "");
  }
  const run = (column: DescribedColumn) => behaviourOf(split, column.index, marks);
  if (!mapped) {
    settleY(columns);
    const isData = ({ index }: DescribedColumn) => split.dataColumns.includes(index);
    const open = columns.filter((column) => column.role === null && isData(column));
    const positions = columns.filter(isPosition);
    const heights = columns.filter(({ role }) => role === "height");
    const [only] = open;
    if (positions.length > 0 && heights.length > 0) {
      // Both are named: what is left over is neither.
    } else if (positions.length > 0 && only && open.length === 1 && !columns.some(isNoHeight))
      give(only, "height", "the only column beside the position");
    else if (heights.length > 0 && only && open.length === 1)
      give(only, "position", "the only column beside the height");
    else if (positions.length === 0 && heights.length === 0 && open.length > 1) byBehaviour(open, run);
  }
  const ask = openColumns(columns, split, run);
  for (const column of columns)
    if (column.role === null && ask === null) give(column, "not read", "names neither position nor height");
  return ask;
}

const isPosition = ({ role }: DescribedColumn) => role === "position" || role === "radius";
const isNoHeight = ({ role }: DescribedColumn) => role === "levelled height" || role === "slope";

function give(column: DescribedColumn, role: ColumnRole | null, why: string): void {
  column.role = role;
  column.why = why;
}

/** 'x, y' are position and height; 'y, z' are so too. */
function settleY(columns: DescribedColumn[]): void {
  const named = (role: ColumnRole) => columns.some((column) => column.role === role);
  const along = columns.some(isPosition);
  for (const column of columns) {
    if (column.role !== "y") continue;
    if (along && !named("height") && !columns.some(isNoHeight))
      give(column, "height", "the only column beside the position");
    else if (!along) give(column, "position", "the only position");
  }
}

/** Columns without heads, by how their numbers run: a position runs steadily one way, heights do not. */
function byBehaviour(open: DescribedColumn[], run: (column: DescribedColumn) => Behaviour): void {
  const [first, ...rest] = open;
  if (!first) return;
  if (rest.length > 1 && run(first).counts) {
    const [second, ...others] = rest;
    if (second && run(second).steady && others.length === 1) {
      give(first, "index", "counts the rows");
      byBehaviour(rest, run);
    }
    return;
  }
  const [second] = rest;
  if (!second || rest.length > 1) return;
  const [one, two] = [run(first), run(second)];
  const firstIs = one.steady && (!two.steady || (one.even && !two.even));
  const secondIs = two.steady && (!one.steady || (two.even && !one.even));
  if (firstIs === secondIs) return;
  const why = (steady: boolean) => (steady ? "runs steadily one way" : "beside the column that runs steadily one way");
  give(first, firstIs ? "position" : "height", why(firstIs));
  give(second, secondIs ? "position" : "height", why(secondIs));
}

function openColumns(
  columns: DescribedColumn[],
  split: Split,
  run: (column: DescribedColumn) => Behaviour,
): Ambiguity | null {
  const positions = columns.filter(isPosition);
  const heights = columns.filter(({ role }) => role === "height");
  const across = columns.find(({ role }) => role === "y");
  const ask = (sentence: string): Ambiguity => ({
    what: "columns",
    column: null,
    choices: columns.map(columnName),
    chosen: null,
    blocks: true,
    sentence,
  });
  if (across && positions.length > 0 && heights.length > 0) {
    if (!run(across).constant)
      return ask(
        `both ${columnName(positions[0] ?? across)} and ${columnName(across)} change: say which runs along the scan.`,
      );
    give(across, "not read", "the same in every row");
  }
  if (positions.length > 0 && heights.length > 0) return null;
  const no = columns.find(isNoHeight);
  if (no && heights.length === 0 && positions.length > 0)
    return ask(
      `${columnName(no)} is ${no.role === "slope" ? "a slope" : "a height that was levelled already"}, and no column holds the height as it was measured.`,
    );
  const count = split.dataColumns.length;
  const missing =
    positions.length > 0
      ? "which column is the height"
      : heights.length > 0
        ? "which column is the position"
        : "which column is the position and which the height";
  return ask(
    `nothing tells ${missing}: row ${split.first + 1} holds ${count} numbers${columns.some(({ heading }) => heading !== "") ? "" : " and no head stands above them"}.`,
  );
}

/** Every height with the position that stands before it, or else the first one. */
export function pairsOf(columns: readonly DescribedColumn[]): ColumnPair[] {
  const positions = columns.filter(isPosition);
  return columns
    .filter(({ role }) => role === "height" || role === "levelled height" || role === "slope")
    .filter(({ role, why }) => role === "height" || why === "by the import profile")
    .flatMap((height) => {
      const position = positions.findLast(({ index }) => index < height.index) ?? positions[0];
      if (!position) return [];
      return {
        position: position.index,
        height: height.index,
        name: height.heading === "" ? `column ${height.index + 1}` : height.heading,
        along: position.role === "radius" ? ("radius" as const) : ("position" as const),
      };
    });
}
