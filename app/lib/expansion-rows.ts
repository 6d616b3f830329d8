import { curveRange, curveStrain, type ExpansionCurve } from "#app/engine/laminate/expansion-curve.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { SourceKind } from "#app/engine/vocabulary.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { readQuantity, type QuantityRule } from "./read-quantity.ts";

/** How a carrier expands over temperature, with where that comes from; SI. */
export interface ExpansionRecord {
  /** K, rising */
  temperatures: number[];
  /** 1/K, one for each */
  coefficients: number[];
  /** half-width that holds for the whole curve, 1/K; null when nobody gave one */
  tolerance: number | null;
  source: SourceKind;
  note: string;
  on: string | null;
}

type Points = Pick<ExpansionRecord, "temperatures" | "coefficients">;
export type ReadRows = { ok: true; points: Points } | { ok: false; blank: boolean; message: string };

const LEAST_ROWS = 2;
const MOST_ROWS = 200;
/** Faults told at once. */
const TOLD = 3;
/** Temperature at which shapes are quoted, which a curve has to hold, K. */
const QUOTED_AT = 298.15;

const TEMPERATURE: QuantityRule = { ...RULES.temperature, dimension: "temperature" };

/**
 * Reads a curve of expansion as it is typed or pasted: a temperature in °C and a coefficient in ppm/K on each line, other units where
 * they are typed along. Columns are parted by a semicolon or a tab, by a comma where the decimal mark is a point, or by blanks. A
 * heading without figures and blank lines are passed over. What is wrong is told by row.
 */
export function readExpansionRows(text: string): ReadRows {
  const lines = text
    .split(/\r?\n/)
    .map((line, at) => ({ row: at + 1, line: line.trim() }))
    .filter(({ line }) => line !== "");
  if (lines[0] && !/\d/.test(lines[0].line)) lines.shift();
  if (lines.length === 0) return { ok: false, blank: true, message: "Type the curve, a temperature on each line." };
  if (lines.length < LEAST_ROWS || lines.length > MOST_ROWS)
    return refused([`A curve has ${LEAST_ROWS} to ${MOST_ROWS} rows, this one ${lines.length}.`]);
  const faults: string[] = [];
  const points: Points = { temperatures: [], coefficients: [] };
  for (const { row, line } of lines) {
    const read = readRow(line);
    if (typeof read === "string") {
      faults.push(`Row ${row}: ${read}`);
      continue;
    }
    const before = points.temperatures.at(-1);
    if (before !== undefined && read.temperature <= before)
      faults.push(`Row ${row}: ${celsius(read.temperature)} does not lie above ${celsius(before)} before it.`);
    points.temperatures.push(read.temperature);
    points.coefficients.push(read.coefficient);
  }
  const [first, last] = [points.temperatures[0], points.temperatures.at(-1)];
  if (faults.length === 0 && first !== undefined && last !== undefined && !(first <= QUOTED_AT && last >= QUOTED_AT))
    faults.push(`The curve runs from ${celsius(first)} to ${celsius(last)}: it has to hold ${celsius(QUOTED_AT)}.`);
  return faults.length > 0 ? refused(faults) : { ok: true, points };
}

function refused(faults: string[]): ReadRows {
  const more = faults.length > TOLD ? [`${faults.length - TOLD} more rows are wrong.`] : [];
  return { ok: false, blank: false, message: [...faults.slice(0, TOLD), ...more].join(" ") };
}

/** The two columns of a line, or what is wrong with it. */
function readRow(line: string): { temperature: number; coefficient: number } | string {
  const cells = columnsOf(line);
  if (cells.length !== 2)
    return cells.length > 2 && line.includes(",")
      ? "more than two columns. Part them by a semicolon where the decimal mark is a comma."
      : "type two columns, a temperature and a coefficient.";
  const [first = "", second = ""] = cells;
  const temperature = readQuantity(withUnit(first, "°C"), TEMPERATURE);
  if (!temperature.ok) return temperature.message;
  const coefficient = readQuantity(withUnit(second, "ppm/K"), RULES.expansion);
  if (!coefficient.ok) return coefficient.message;
  return { temperature: temperature.value, coefficient: coefficient.value };
}

function columnsOf(line: string): string[] {
  const mark = [";", "\t", ","].find((each) => line.includes(each));
  return (mark ? line.split(mark) : line.split(/\s+/)).map((cell) => cell.trim());
}

/** A bare figure has the unit of its column. */
const withUnit = (cell: string, unit: string) =>
  /^[-−+]?[\d.,]+(?:e[-−+]?\d+)?$/i.test(cell) ? `${cell} ${unit}` : cell;

const shown = (value: number, dimension: Dimension, unit: string) =>
  formatQuantity(value, dimension, { unit, significant: 12, trim: true });
const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C" });

/** A curve as the text of its field: '25; 3.2' on each line. */
export function expansionRowsText({ temperatures, coefficients }: Points): string {
  const bare = (text: string) => (text.split("\u00A0")[0] ?? "").replace("−", "-");
  return temperatures
    .map((temperature, at) =>
      [shown(temperature, "temperature", "°C"), shown(coefficients[at] ?? 0, "expansion", "ppm/K")]
        .map(bare)
        .join("; "),
    )
    .join("\n");
}

/** The curve as the engine integrates it. */
export const expansionCurveOf = ({ temperatures, coefficients }: Points): ExpansionCurve => ({
  kind: "points",
  temperatures,
  coefficients,
});

/** The curve's mean over its own range, with its tolerance and source: what stands for it where one value is asked. */
export function meanOfCurve(record: ExpansionRecord): Measured {
  const curve = expansionCurveOf(record);
  const { from, to } = curveRange(curve);
  const { tolerance, source, on } = record;
  const value = curveStrain(curve, from, to, "expansion curve") / (to - from);
  return { value, tolerance, source, note: record.note || "mean of its curve", on };
}

/** The range of a curve in words: '20 to 300 °C'. */
export function curveRangeWords(record: Points): string {
  const { from, to } = curveRange(expansionCurveOf(record));
  return `${celsius(from).replace("\u00A0°C", "")} to ${celsius(to)}`;
}
