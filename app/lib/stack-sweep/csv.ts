import { fromSi } from "#app/engine/units/convert.ts";
import { findUnit, type Dimension } from "#app/engine/units/dimensions.ts";
import type { DrawnAxis, DrawnCurve, DrawnMap, SweptView } from "#app/schemas/stack-sweep.ts";
import { csvOf, type CsvMark } from "../csv.ts";
import type { SweepAnswer } from "./answers.ts";
import { valueAt } from "./axis.ts";
import { placeState, STATE_WORDS } from "./place-words.ts";

/** Units of the answers in a file, by their dimension. */
const UNITS: Partial<Record<Dimension, string>> = { length: "µm", stress: "MPa", curvature: "1/m", fraction: "%" };

type Row = (string | number)[];

/**
 * A sweep as CSV: one row for each place of the curve or of the map, with how it lies. An answer that
 * there is not is left blank.
 */
export function sweepCsv({ drawn }: SweptView, answer: SweepAnswer, mark?: CsvMark): string {
  const unit = UNITS[answer.rule.dimension] ?? "";
  const of = (value: number | null) => (value === null ? "" : inUnit(value, answer.rule.dimension, unit));
  const head = `${answer.label}, ${unit}`;
  const rows = drawn.kind === "curve" ? curveRows(drawn, head, of) : mapRows(drawn, head, of);
  return csvOf(rows, mark);
}

type Of = (value: number | null) => string | number;

function curveRows({ x, points, curled }: DrawnCurve, head: string, of: Of): Row[] {
  const isCurled = (at: number) => curled.some(({ from, to }) => at >= from && at <= to);
  return [
    [headOf(x), head, "lies"],
    ...points.map((point): Row => [onAxis(x, point.x), of(point.y), STATE_WORDS[isCurled(point.x) ? "1" : "0"]]),
  ];
}

function mapRows({ x, y, cells, values, states }: DrawnMap, head: string, of: Of): Row[] {
  const side = cells + 1;
  return [
    [headOf(x), headOf(y), head, "lies"],
    ...values.map((value, n): Row => {
      const [column, row] = [n % side, Math.floor(n / side)];
      return [
        onAxis(x, valueAt(x, column / cells)),
        onAxis(y, valueAt(y, row / cells)),
        of(value),
        STATE_WORDS[placeState(states, n)],
      ];
    }),
  ];
}

const headOf = ({ label, unit }: DrawnAxis) => `${label}, ${unit}`;
const onAxis = ({ dimension, unit }: DrawnAxis, value: number) => inUnit(value, dimension, unit);

function inUnit(value: number, dimension: Dimension, symbol: string): number {
  const unit = findUnit(dimension, symbol);
  return Number((unit ? fromSi(value, unit, dimension) : value).toPrecision(12));
}
