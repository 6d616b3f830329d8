import { noBreak } from "#app/components/drawings/no-break.ts";
import type { AssessmentHead } from "#app/lib/assessment-view.ts";
import { movementSentence, outOfDateTitle } from "#app/lib/out-of-date-words.ts";
import type { OutOfDate } from "#app/schemas/assessment-changes.ts";
import { ChangeTable } from "./ChangeTable.tsx";
import { ComparisonTable } from "./ComparisonTable.tsx";
import { RunAgain } from "./RunAgain.tsx";

interface Props {
  head: AssessmentHead;
  /** null when the details could not be told any more: somebody has put things back meanwhile */
  changed: OutOfDate | null;
}

/** That the answer above is of then: what has changed since, how far the answer moves, and running again. */
export function OutOfDateSection({ head, changed }: Props) {
  const title = outOfDateTitle(changed, head.createdAt);
  const moved = changed?.movement.outcome === "computed" ? changed.movement.moved : [];
  return (
    <section
      className="border-t border-l-4 border-t-ink border-l-caution p-4 tablet:pl-5"
      aria-labelledby="out-of-date"
    >
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="min-w-0 flex-1 basis-96">
          <h2 id="out-of-date" className="font-semibold">
            {noBreak(title)}
          </h2>
          <p className="mt-1 max-w-[60em]">
            {changed ? `${noBreak(movementSentence(changed.movement))} ` : ""}
            <span className="text-quiet">What stands on this page is as it was assessed.</span>
          </p>
        </div>
        {head.mayAssess && head.lot === null ? (
          <div className="screen-only">
            <RunAgain primary />
          </div>
        ) : null}
      </div>
      {changed && changed.changes.length + moved.length > 0 ? (
        <details className="mt-2">
          <summary className="link w-fit cursor-pointer">What has changed</summary>
          {changed.changes.length > 0 ? (
            <ChangeTable changes={changed.changes} caption="Inputs that have changed" />
          ) : null}
          {moved.length > 0 ? (
            <>
              <h3 className="mt-4 font-semibold">Steps that the change reaches</h3>
              <ComparisonTable
                rows={moved}
                before="As assessed"
                after="As it is now"
                caption="Steps whose finding or support changes"
              />
            </>
          ) : null}
        </details>
      ) : null}
    </section>
  );
}
