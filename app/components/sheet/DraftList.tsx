import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { Option } from "#app/components/ui/SelectField.tsx";
import { OUTCOMES } from "#app/engine/vocabulary.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { ListPage } from "#app/lib/list-params.ts";
import type { AssessmentRow } from "#app/schemas/assessment-row.ts";

const columns: Column<AssessmentRow>[] = [
  {
    key: "number",
    head: "Number",
    wide: true,
    cell: ({ programSlug, documentNumber }) => recordNumber("assessment", programSlug, documentNumber),
  },
  { key: "revision", head: "Revision", wide: true, cell: ({ number }) => revisionLetters(number) },
  {
    key: "flow",
    head: "Flow",
    sortable: true,
    cell: ({ id, flow, outOfDate }) => (
      <>
        <Link to={`/assessments/${id}`} className="link">
          {flow}
        </Link>
        {outOfDate ? <span className="block text-label text-caution">out of date: inputs have changed</span> : null}
      </>
    ),
  },
  { key: "program", head: "Program", wide: true, cell: ({ program }) => program },
  { key: "outcome", head: "Outcome", sortable: true, cell: ({ outcome }) => <FindingTag outcome={outcome} /> },
  { key: "run", head: "Assessed", sortable: true, wide: true, cell: ({ createdAt }) => createdAt.slice(0, 10) },
  { key: "by", head: "By", wide: true, cell: ({ createdBy }) => createdBy },
  {
    key: "print",
    head: "Sheet",
    cell: ({ id, flow }) => (
      <Link to={`/sheets/${id}`} className="link">
        Print<span className="sr-only"> the sheet of {flow}</span>
      </Link>
    ),
  },
];

const outcomeOptions = OUTCOMES.map((outcome) => ({ value: outcome, label: OUTCOME_SIGNS[outcome].word }));

/** Drafts to print: the newest assessment of each flow. */
export function DraftList({ page, programs }: { page: ListPage<AssessmentRow>; programs: readonly Option[] }) {
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  return (
    <>
      <PageHead
        title="Draft sheets"
        crumbs={[{ name: "Sheets", path: "/sheets" }]}
        remark={`${page.total} ${searched ? "found" : "to print"}: the newest assessment of each flow, not for the floor`}
        actions={
          <Link to="/assessments/change-request" className="btn">
            What would change?
          </Link>
        }
      />
      <ListHead
        what="flows"
        filters={[
          { name: "program", label: "Program", options: [...programs] },
          { name: "outcome", label: "Outcome", options: outcomeOptions },
        ]}
      />
      {page.rows.length > 0 ? (
        <DataTable caption="Drafts to print" columns={columns} page={page} rowKey={({ id }) => id} />
      ) : (
        <EmptyState
          title={searched ? "No draft fits" : "No draft yet"}
          actions={
            searched ? null : (
              <Link to="/flows" className="btn btn-primary">
                Go to the flows
              </Link>
            )
          }
        >
          {searched
            ? "Change the search, or take a filter away."
            : "A sheet is printed from an assessment. Assess a flow first; its newest assessment then stands here."}
        </EmptyState>
      )}
    </>
  );
}
