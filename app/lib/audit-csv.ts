import type { AuditRow } from "#app/schemas/audit.ts";
import { csvOf, type CsvMark } from "./csv.ts";

const HEAD = [
  "at_utc",
  "person",
  "program",
  "action",
  "kind",
  "object_id",
  "field",
  "from",
  "to",
  "request_id",
  "event_id",
];

/** Events of the audit trail as CSV; what a field was and became as JSON. */
export function auditCsv(rows: readonly AuditRow[], mark?: CsvMark): string {
  const cells = rows.map((row) => [
    row.at,
    row.actor ?? "",
    row.program ?? "",
    row.action,
    row.subject,
    row.subjectId ?? "",
    row.field ?? "",
    row.from ?? "",
    row.to ?? "",
    row.requestId,
    row.id,
  ]);
  return csvOf([HEAD, ...cells], mark);
}
