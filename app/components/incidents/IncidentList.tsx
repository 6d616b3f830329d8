import { Link, useSearchParams } from "react-router";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { Option } from "#app/components/ui/SelectField.tsx";
import type { ListPage } from "#app/lib/list-params.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { INCIDENT_KINDS, INCIDENT_STATES, SEVERITIES, type IncidentRow } from "#app/schemas/incident.ts";
import { SEVERITY_CLASSES, STATE_CLASSES } from "./incident-words.ts";

const columns: Column<IncidentRow>[] = [
  {
    key: "number",
    head: "Incident",
    sortable: true,
    cell: ({ id, number }) => (
      <Link to={`/incidents/${id}`} className="link whitespace-nowrap">
        {number}
      </Link>
    ),
  },
  { key: "what", head: "What", sortable: true, cell: ({ kind }) => kind },
  {
    key: "severity",
    head: "How bad",
    sortable: true,
    cell: ({ severity }) => <span className={SEVERITY_CLASSES[severity]}>{severity}</span>,
  },
  {
    key: "state",
    head: "State",
    sortable: true,
    cell: ({ state }) => <span className={STATE_CLASSES[state]}>{state}</span>,
  },
  { key: "step", head: "Step", sortable: true, wide: true, cell: ({ step, stepTitle }) => `${step}, ${stepTitle}` },
  {
    key: "lot",
    head: "Lot, wafer",
    sortable: true,
    wide: true,
    cell: ({ lot, wafer }) => [lot, wafer].filter(Boolean).join(", "),
  },
  {
    key: "broken",
    head: "Broken",
    numeric: true,
    wide: true,
    cell: ({ broken, affected }) => `${broken} of ${affected}`,
  },
  { key: "happened", head: "Happened", sortable: true, wide: true, cell: ({ occurredAt }) => minuteOf(occurredAt) },
];

interface Props {
  page: ListPage<IncidentRow>;
  programs: readonly Option[];
  mayReport: boolean;
}

/** The review board's list: every incident of the reader's programs, the newest first. */
export function IncidentList({ page, programs, mayReport }: Props) {
  const [search] = useSearchParams();
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const report = mayReport && (
    <Link to="/incidents/new" className="btn btn-primary">
      Report an incident
    </Link>
  );
  return (
    <>
      <PageHead
        title="Incidents"
        remark={`${page.total} ${searched ? "found" : page.total === 1 ? "incident" : "incidents"}`}
        actions={
          <>
            <Link to="/incidents/rates" className="btn">
              Rates
            </Link>
            <Link to="/predictions" className="btn">
              Predicted against measured
            </Link>
            {page.total > 0 && (
              <a href={`/incidents/incidents.csv?${search.toString()}`} className="btn" download>
                Save as CSV
              </a>
            )}
            {page.total > 0 || searched ? report : null}
          </>
        }
      />
      <ListHead
        what="incidents"
        filters={[
          ...(programs.length > 1 ? [{ name: "program", label: "Program", options: [...programs] }] : []),
          { name: "what", label: "What", options: sameWords(INCIDENT_KINDS) },
          { name: "severity", label: "How bad", options: sameWords(SEVERITIES) },
          { name: "state", label: "State", options: sameWords(INCIDENT_STATES) },
        ]}
      />
      {page.rows.length > 0 ? (
        <DataTable caption="Incidents" columns={columns} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState title={searched ? "No incident fits" : "No incident reported yet"} actions={!searched && report}>
          {searched
            ? "Change the search, or take a filter away."
            : "Cracks, chips, delamination, voids, slips and drops belong here, near misses as well: each stands beside what the assessment expected of its step."}
        </EmptyState>
      )}
    </>
  );
}
