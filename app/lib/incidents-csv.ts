import type { IncidentRow } from "#app/schemas/incident.ts";
import { csvOf, type CsvMark } from "./csv.ts";

const HEAD = [
  "number",
  "program",
  "happened_utc",
  "what",
  "severity",
  "state",
  "lot",
  "wafer",
  "step",
  "step_title",
  "planned_support",
  "silicon_um",
  "films",
  "affected",
  "broken",
  "through",
  "reported_by",
  "words",
];

/** Incidents as CSV. Blank where nobody knows. */
export function incidentsCsv(rows: readonly IncidentRow[], mark?: CsvMark): string {
  const cells = rows.map((row) => [
    row.number,
    row.program,
    row.occurredAt,
    row.kind,
    row.severity,
    row.state,
    row.lot,
    row.wafer ?? "",
    row.step,
    row.stepTitle,
    row.support,
    Number((row.silicon * 1e6).toPrecision(12)),
    row.films,
    row.affected,
    row.broken,
    row.through ?? "",
    row.reportedBy,
    row.words,
  ]);
  return csvOf([HEAD, ...cells], mark);
}
