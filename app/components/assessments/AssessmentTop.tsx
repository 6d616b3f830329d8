import { Link } from "react-router";
import { StarButton } from "#app/components/kept/StarButton.tsx";
import { MethodLink } from "#app/components/layout/MethodLink.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { AssessmentHead } from "#app/lib/assessment-view.ts";
import { AssessmentActions } from "./AssessmentActions.tsx";

/** Why running again came to nothing. */
export interface NotComputable {
  step: number | null;
  reason: string;
}

interface Props {
  head: AssessmentHead;
  /** number of the leg that is looked at, of a flow that parts by slot */
  leg: number | null;
  refused: NotComputable | undefined;
}

/** The way here and what can be done, then what has to be known before anything below is believed. */
export function AssessmentTop({ head, leg, refused }: Props) {
  return (
    <>
      <div className="screen-only flex min-h-14 flex-wrap items-center gap-x-4 gap-y-2 py-3">
        <nav aria-label="Path">
          <Link to="/flows" className="link text-quiet">
            Flows
          </Link>
          <span aria-hidden="true"> / </span>
          <Link to={`/flows/${head.flow.id}`} className="link text-quiet">
            {head.flow.name}
          </Link>
          <span aria-hidden="true"> / </span>
          {head.lot ? (
            <>
              <Link to={`/assessments/${head.lot.of.id}`} className="link text-quiet">
                Assessment {revisionLetters(head.number)}
              </Link>
              <span aria-hidden="true"> / </span>
              <span aria-current="page">Lot {head.lot.name}</span>
            </>
          ) : (
            <span aria-current="page">Assessment {revisionLetters(head.number)}</span>
          )}
        </nav>
        <StarButton kind="assessment" id={head.id} />
        <MethodLink />
        <div className="ml-auto flex flex-wrap gap-2 max-tablet:hidden">
          <AssessmentActions head={head} leg={leg} />
        </div>
      </div>
      {refused ? (
        <Notice kind="error" title="The flow as it is now cannot be computed, so nothing was stored">
          {refused.step === null ? "" : `Step ${refused.step}: `}
          {refused.reason}{" "}
          <Link to={`/flows/${head.flow.id}`} className="link">
            Change the flow
          </Link>
        </Notice>
      ) : null}
    </>
  );
}
