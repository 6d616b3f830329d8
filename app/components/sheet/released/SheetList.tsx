import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { Option } from "#app/components/ui/SelectField.tsx";
import type { ListPage } from "#app/lib/list-params.ts";
import { REVISION_STATES } from "#app/schemas/sheet-revision.ts";
import type { SheetRow } from "#app/schemas/sheet-view.ts";
import { REVISION_CLASSES, revisionState } from "./revision-state.ts";

const columns: Column<SheetRow>[] = [
  {
    key: "sheet",
    head: "Sheet",
    sortable: true,
    cell: ({ id, sheet, letter, assessmentId }) => (
      <Link to={letter === null ? `/assessments/${assessmentId}/review` : `/sheets/revisions/${id}`} className="link">
        {sheet} {letter}
      </Link>
    ),
  },
  { key: "flow", head: "Flow", sortable: true, cell: ({ flow }) => flow },
  { key: "program", head: "Program", wide: true, cell: ({ program }) => program },
  {
    key: "state",
    head: "State",
    sortable: true,
    cell: ({ state, supersededBy }) => (
      <span className={REVISION_CLASSES[state]}>{revisionState(state, supersededBy)}</span>
    ),
  },
  { key: "date", head: "Since", sortable: true, wide: true, cell: ({ at }) => at.slice(0, 10) },
];

interface Props {
  page: ListPage<SheetRow>;
  programs: readonly Option[];
  /** the reader sees the work, and so the drafts and what is in review */
  staff: boolean;
}

/** Sheets by their revisions: what waits for a decision first, then what is in force. */
export function SheetList({ page, programs, staff }: Props) {
  const searched = page.params.query !== "" || Object.values(page.params.filters).some(Boolean);
  const drafts = staff && (
    <Link to="/sheets/drafts" className="btn">
      Drafts
    </Link>
  );
  return (
    <>
      <PageHead
        title="Sheets"
        remark={`${page.total} ${searched ? "found" : page.total === 1 ? "revision" : "revisions"}`}
        actions={
          staff && (
            <>
              <Link to="/assessments/change-request" className="btn">
                What would change?
              </Link>
              {drafts}
            </>
          )
        }
      />
      <ListHead
        what="sheets"
        filters={[
          ...(programs.length > 1 ? [{ name: "program", label: "Program", options: [...programs] }] : []),
          ...(staff
            ? [
                {
                  name: "state",
                  label: "State",
                  options: REVISION_STATES.map((state) => ({ value: state, label: revisionState(state, null) })),
                },
              ]
            : []),
        ]}
      />
      {page.rows.length > 0 ? (
        <DataTable caption="Sheets" columns={columns} page={page} rowKey={({ id }) => id} />
      ) : searched ? (
        <EmptyState title="No sheet fits">Change the search, or take a filter away.</EmptyState>
      ) : staff ? (
        <EmptyState title="No sheet has been released yet" actions={drafts}>
          A sheet is released from an assessment: open one, ask for its review, and a process owner releases it. Until
          then there are drafts, which are not for the floor.
        </EmptyState>
      ) : (
        <EmptyState title="No sheet has been released to you yet">
          Handling-risk sheets of your programs appear here once they are checked and released.
        </EmptyState>
      )}
    </>
  );
}
