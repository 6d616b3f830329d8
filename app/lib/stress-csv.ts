import type { StressValueRow } from "#app/schemas/film-stress.ts";
import { csvOf, type CsvMark } from "./csv.ts";

const HEAD = [
  "measured",
  "stress_MPa",
  "standard_uncertainty_MPa",
  "film_thickness_um",
  "instrument",
  "state",
  "wafer",
  "program",
  "source",
  "reason",
  "accepted",
  "accepted_by",
  "set_aside_reason",
];

/** A film's history as CSV. Blank where the reader may not know, or nobody said. */
export function stressCsv(rows: readonly StressValueRow[], mark?: CsvMark): string {
  const cells = rows.map(({ origin, ...row }) => [
    row.measuredAt.slice(0, 10),
    scaled(row.value, 1e-6),
    scaled(row.standardUncertainty, 1e-6),
    row.filmThickness === null ? "" : scaled(row.filmThickness, 1e6),
    row.instrument,
    row.state === "set aside" ? "set aside" : "counts",
    origin.kind === "scan" ? origin.label : "",
    origin.kind === "scan" ? origin.program : origin.kind === "typed" ? "" : "another program",
    origin.kind === "typed" ? origin.source : "scan",
    row.reason ?? "",
    row.acceptedAt,
    row.acceptedBy,
    row.setAside?.reason ?? "",
  ]);
  return csvOf([HEAD, ...cells], mark);
}

const scaled = (value: number, by: number) => Number((value * by).toPrecision(12));
