import { Link, useSearchParams } from "react-router";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { Option } from "#app/components/ui/SelectField.tsx";
import { auditValue } from "#app/lib/audit-value.ts";
import type { ListPage } from "#app/lib/list-params.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { AUDIT_ACTIONS, type AuditRow } from "#app/schemas/audit.ts";

const columns: Column<AuditRow>[] = [
  {
    key: "at",
    head: "When",
    sortable: true,
    cell: ({ at }) => minuteOf(at),
  },
  { key: "who", head: "Who", cell: ({ actor }) => actor ?? <span className="text-quiet">nobody signed in</span> },
  { key: "what", head: "What", cell: ({ action, subject, field }) => <What {...{ action, subject, field }} /> },
  { key: "program", head: "Program", wide: true, cell: ({ program }) => program ?? "site" },
  { key: "from", head: "From", wide: true, cell: ({ from }) => <Value json={from} /> },
  { key: "to", head: "To", cell: ({ to }) => <Value json={to} /> },
  {
    key: "of",
    head: "All of it",
    wide: true,
    cell: ({ subjectId, subject }) =>
      subjectId && (
        <Link to={`/audit?q=${subjectId}`} className="link" aria-label={`All events of this ${subject}`}>
          events
        </Link>
      ),
  },
];

interface Props {
  page: ListPage<AuditRow>;
  choices: { programs: readonly Option[]; subjects: readonly string[] };
}

/** Who changed what, from what to what, when: never changed, sealed, the newest first. */
export function AuditList({ page, choices }: Props) {
  const [search] = useSearchParams();
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  return (
    <>
      <PageHead
        title="Audit trail"
        remark={`${page.total} ${page.total === 1 ? "event" : "events"}${searched ? " found" : ""}`}
        actions={
          <>
            <Link to="/audit/seals" className="btn">
              Check the seals
            </Link>
            {page.total > 0 && (
              <a href={`/audit/trail.csv?${search.toString()}`} className="btn" download>
                Save as CSV
              </a>
            )}
          </>
        }
      />
      <ListHead
        what="person, kind, field or id"
        filters={[
          { name: "program", label: "Program", options: [...choices.programs] },
          { name: "subject", label: "Kind", options: sameWords(choices.subjects) },
          { name: "action", label: "Done", options: sameWords(AUDIT_ACTIONS) },
        ]}
      >
        {(["since", "until"] as const).map((name) => (
          <label key={name} className="field">
            <span>{name === "since" ? "From day, UTC" : "To day, UTC"}</span>
            <input type="date" name={name} defaultValue={search.get(name) ?? ""} />
          </label>
        ))}
      </ListHead>
      {page.rows.length > 0 ? (
        <DataTable caption="Events of the audit trail" columns={columns} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title={searched ? "No event fits" : "Nothing has happened yet"}>
          {searched
            ? "Change the search, or take a filter away. An id is found whole."
            : "Every field that somebody changes, and every sign-in, will stand here."}
        </EmptyState>
      )}
    </>
  );
}

function What({ action, subject, field }: Pick<AuditRow, "action" | "subject" | "field">) {
  return (
    <>
      {subject} {action}
      {field !== null && (
        <>
          : <b className="font-semibold">{field}</b>
        </>
      )}
    </>
  );
}

/** A value in one line; a long one folds out. */
const SHORT = 60;

function Value({ json }: { json: string | null }) {
  if (json === null) return <span className="text-quiet">–</span>;
  const text = auditValue(json);
  if (text.length <= SHORT) return <span className="wrap-anywhere">{text}</span>;
  return (
    <details>
      <summary className="cursor-pointer wrap-anywhere">{text.slice(0, SHORT)} …</summary>
      <span className="wrap-anywhere">{text}</span>
    </details>
  );
}
