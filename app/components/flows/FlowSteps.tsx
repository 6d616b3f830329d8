import { useRef, type KeyboardEvent } from "react";
import { Form, Link, useNavigation, useSearchParams, useSubmit } from "react-router";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { findSteps } from "#app/lib/find-steps.ts";
import type { StepRow } from "#app/lib/flow-rows.ts";
import { withParams } from "#app/lib/list-params.ts";
import type { FlowHistory } from "#app/schemas/flow-plan.ts";
import { FlowHistoryBar } from "./FlowHistoryBar.tsx";
import { StepActions } from "./StepActions.tsx";
import { StepTable } from "./StepTable.tsx";
import { useStepDrag } from "./use-step-drag.ts";

/** Id of the form through which every change of the steps goes; its buttons stand in the rows. */
export const STEPS_FORM = "change-steps";

/** A flow of fewer steps is seen at a glance. */
const SEARCHED_FROM = 8;

interface Props {
  flowId: string;
  version: number;
  rows: StepRow[];
  /** null for those who may only read */
  history: FlowHistory | null;
  mayEdit: boolean;
  /** why the assessment could not be computed, at the step (from 1) that causes it */
  fault: { step: number; reason: string } | null;
}

/** The steps with all that can be done to them: by buttons without scripts, by drag and by keys with them. */
export function FlowSteps({ flowId, version, rows, history, mayEdit, fault }: Props) {
  const [search] = useSearchParams();
  const form = useRef<HTMLFormElement>(null);
  const submit = useSubmit();
  const busy = useNavigation().state !== "idle";
  const query = search.get("q")?.trim() ?? "";
  const found = query === "" ? rows : findSteps(rows, query);
  const current = rows.find(({ id }) => id === search.get("step"));
  const openOrClose = ({ id }: StepRow) => withParams(search, { step: id === current?.id ? null : id, done: null });
  const { drag, handle } = useStepDrag((id, number) => {
    if (busy) return;
    const change = new FormData(form.current ?? undefined);
    change.set("change", `to ${id} ${number}`);
    void submit(change, { method: "post", preventScrollReset: true });
  });
  return (
    <>
      {mayEdit && (
        <Form
          ref={form}
          id={STEPS_FORM}
          method="post"
          preventScrollReset
          // A second press before the answer to the first would be judged against a flow that has already changed.
          onSubmit={(event) => busy && event.preventDefault()}
        >
          <input type="hidden" name="version" value={version} />
        </Form>
      )}
      {mayEdit && history && <FlowHistoryBar history={history} form={STEPS_FORM} />}
      {rows.length === 0 ? (
        <div className="p-4 tablet:p-6">
          <EmptyState title="No steps yet" actions={mayEdit && <AddStep flowId={flowId} rows={rows} />}>
            What is done to the wafer, from the incoming wafer to dicing, belongs here: one step a row.
          </EmptyState>
        </div>
      ) : (
        <div onKeyDown={mayEdit ? moveByKey : undefined}>
          {(rows.length > SEARCHED_FROM || query !== "") && (
            <div className="px-4 pt-4 tablet:px-6">
              <ListHead what="steps">
                {query !== "" && (
                  <p className="py-1.5 text-quiet" role="status">
                    {found.length} of {rows.length} steps.{" "}
                    <Link to={withParams(search, { q: null })} preventScrollReset className="link">
                      Show all
                    </Link>
                  </p>
                )}
              </ListHead>
            </div>
          )}
          <StepTable
            caption="Steps of the flow"
            rows={found}
            href={(row) => `/flows/${flowId}/steps/${row.id}`}
            current={current?.id}
            actions={mayEdit ? (row) => <StepActions row={row} of={rows.length} form={STEPS_FORM} /> : undefined}
            more={mayEdit ? openOrClose : undefined}
            drag={mayEdit && query === "" ? { handle, id: drag?.id ?? null, before: drag?.before ?? null } : undefined}
            below={(row) =>
              fault?.step === row.number && (
                <p className="font-semibold text-stop">Cannot be computed: {fault.reason}</p>
              )
            }
          />
          {mayEdit && (
            <div className="screen-only flex flex-wrap items-center gap-x-4 gap-y-2 border-t border-ink p-4 tablet:px-6">
              <AddStep flowId={flowId} rows={rows} />
              <p className="text-label text-quiet max-tablet:hidden">
                In a row: Alt with an arrow moves the step. Control or command with Z takes back, with shift does it
                again.
              </p>
            </div>
          )}
        </div>
      )}
    </>
  );
}

function AddStep({ flowId, rows }: Pick<Props, "flowId" | "rows">) {
  return (
    <Link to={`/flows/${flowId}/steps/new?at=${rows.length + 1}`} className="btn">
      {rows.length === 0 ? "Add the first step" : "Add a step at the end"}
    </Link>
  );
}

/** Alt with an arrow presses the button of the row that the focus is in. */
function moveByKey(event: KeyboardEvent<HTMLElement>): void {
  const direction = event.key === "ArrowUp" ? "up" : event.key === "ArrowDown" ? "down" : null;
  if (!direction || !event.altKey || !(event.target instanceof HTMLElement)) return;
  const id = event.target.closest("tr")?.id.replace(/^step-/, "");
  const button = id && document.querySelector<HTMLButtonElement>(`button[value="${direction} ${CSS.escape(id)}"]`);
  if (!button) return;
  event.preventDefault();
  button.click();
}
