import { Form, Link, useNavigation, useSearchParams } from "react-router";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import type { StepRow } from "#app/lib/flow-rows.ts";
import { withParams } from "#app/lib/list-params.ts";
import { StepActions } from "./StepActions.tsx";
import { StepTable } from "./StepTable.tsx";

const FORM = "change-steps";

interface Props {
  flowId: string;
  version: number;
  rows: StepRow[];
  mayEdit: boolean;
  /** why the assessment could not be computed, at the step (from 1) that causes it */
  fault: { step: number; reason: string } | null;
}

/** The steps with all that can be done to them. Changes go through one form, whose buttons stand in the rows. */
export function FlowSteps({ flowId, version, rows, mayEdit, fault }: Props) {
  const [search] = useSearchParams();
  const busy = useNavigation().state !== "idle";
  const current = rows.find(({ id }) => id === search.get("step"));
  const moved = search.get("moved");
  const openOrClose = ({ id }: StepRow) =>
    withParams(search, { step: id === current?.id ? null : id, moved: null, remove: null });
  const add = (
    <Link to={`/flows/${flowId}/steps/new?at=${rows.length + 1}`} className="btn">
      {rows.length === 0 ? "Add the first step" : "Add a step at the end"}
    </Link>
  );
  if (rows.length === 0)
    return (
      <div className="p-4 tablet:p-6">
        <EmptyState title="No steps yet" actions={mayEdit && add}>
          What is done to the wafer, from the incoming wafer to dicing, belongs here: one step a row.
        </EmptyState>
      </div>
    );
  return (
    <>
      <p role="status" className="sr-only">
        {current && moved && `Moved ${moved}: ${current.title} is now step ${current.number}.`}
      </p>
      {mayEdit && (
        <Form
          id={FORM}
          method="post"
          preventScrollReset
          // A second press before the answer to the first would be judged against a flow that has already changed.
          onSubmit={(event) => busy && event.preventDefault()}
        >
          <input type="hidden" name="version" value={version} />
        </Form>
      )}
      <StepTable
        caption="Steps of the flow"
        rows={rows}
        href={(row) => `/flows/${flowId}/steps/${row.id}`}
        current={current?.id}
        actions={mayEdit ? (row) => <StepActions row={row} of={rows.length} form={FORM} /> : undefined}
        more={mayEdit ? openOrClose : undefined}
        below={(row) =>
          fault?.step === row.number ? (
            <p className="font-semibold text-stop">Cannot be computed: {fault.reason}</p>
          ) : mayEdit && search.get("remove") === row.id ? (
            <RemoveStep row={row} />
          ) : null
        }
      />
      {mayEdit && <div className="border-t border-ink p-4 tablet:px-6">{add}</div>}
    </>
  );
}

function RemoveStep({ row }: { row: StepRow }) {
  const [search] = useSearchParams();
  return (
    <div className="flex flex-wrap items-center gap-2 py-1">
      <p className="mr-2 font-semibold">
        Remove step {row.number}, {row.title}
        {row.changes.length > 0 && ", with what it adds and removes"}?
      </p>
      <button type="submit" form={FORM} name="change" value={`remove ${row.id}`} className="btn btn-remove" autoFocus>
        Remove it
      </button>
      <Link to={withParams(search, { remove: null, step: row.id })} className="btn" preventScrollReset>
        Keep it
      </Link>
    </div>
  );
}
