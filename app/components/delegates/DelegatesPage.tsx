import type { SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { DelegatesView, DelegationRow } from "#app/schemas/delegation.ts";
import { NameDelegate } from "./NameDelegate.tsx";

interface Props extends DelegatesView {
  done: "named" | "ended" | null;
  lastResult: SubmissionResult<string[]> | undefined;
}

const DONE = { named: "It is written down who stands in for you.", ended: "The delegation is ended." };

/** Who stands in for a process owner, and the form to name somebody. */
export function DelegatesPage({ rows, choices, done, lastResult }: Props) {
  return (
    <>
      <PageHead title="Delegates" remark="Who releases sheets while a process owner is away" />
      {done && !lastResult && <Notice kind="done" title={DONE[done]} />}
      <p className="max-w-160 pb-4">
        Whoever stands in for a process owner releases, returns and withdraws sheets of that program, signs deviations,
        holds lots and clears holds and stops, and nothing else of theirs. Never one’s own work, nor that of the person
        stood in for.
      </p>
      <div className="grid items-start gap-6 wide:grid-cols-[minmax(0,1fr)_480px]">
        {choices.length > 0 && <NameDelegate key={rows.length} choices={choices} lastResult={lastResult} />}
        <div className="min-w-0 wide:-order-1">
          {rows.length === 0 ? (
            <EmptyState title="Nobody stands in for anybody">
              A process owner who will be away names somebody of the program here, with the first and the last day.
            </EmptyState>
          ) : (
            <Delegations rows={rows} />
          )}
        </div>
      </div>
    </>
  );
}

function Delegations({ rows }: { rows: DelegationRow[] }) {
  const sending = useNavigation().state === "submitting";
  return (
    <section aria-labelledby="delegations" className="frame">
      <h2 id="delegations" className="px-4 pt-3 pb-2 font-semibold">
        Who stands in
      </h2>
      <ul>
        {rows.map(({ id, program, owner, delegate, from, until, reason, state, endedAt, mayEnd }) => (
          <li
            key={id}
            className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-t border-line px-4 py-3 tablet:grid tablet:grid-cols-[minmax(0,1fr)_220px_96px]"
          >
            <div className="min-w-0 basis-full">
              <p className="wrap-anywhere">
                <span className="font-semibold">{delegate}</span> for {owner}, {program}
              </p>
              <p className="wrap-anywhere text-quiet">{reason}</p>
            </div>
            <p>
              {from} to {until}
              <span className={`block text-label ${state === "running" ? "font-semibold text-clear" : "text-quiet"}`}>
                {state === "ended" ? `ended early, ${endedAt}` : STATES[state]}
              </span>
            </p>
            {mayEnd && (
              <Form method="post" className="tablet:text-right">
                <input type="hidden" name="delegation" value={id} />
                <button
                  type="submit"
                  name="intent"
                  value="end"
                  className="btn"
                  disabled={sending}
                  aria-label={`End it: ${delegate} for ${owner}, ${program}`}
                >
                  End it
                </button>
              </Form>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

const STATES = { running: "runs now", coming: "to come", over: "over" };
