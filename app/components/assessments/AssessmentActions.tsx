import { Link } from "react-router";
import { legQuery } from "#app/lib/leg-query.ts";
import type { AssessmentHead } from "#app/lib/assessment-view.ts";
import { RunAgain } from "./RunAgain.tsx";

interface Props {
  head: AssessmentHead;
  /** number of the leg that is looked at, of a flow that parts by slot */
  leg?: number | null;
  phone?: boolean;
}

/** What can be done with an assessment. One that is out of date is run again rather than printed. */
export function AssessmentActions({ head, leg = null, phone = false }: Props) {
  const { outOfDate, lot } = head;
  // A lot's assessment is no revision: its flow is changed, run and compared from the assessment that it is of.
  const mayAssess = head.mayAssess && lot === null;
  const grow = phone ? "flex-1" : "";
  return (
    <>
      {phone || lot ? null : (
        <Link to={`/assessments/${head.id}/lot`} className="btn">
          This lot
        </Link>
      )}
      {phone ? null : (
        <Link to={`/assessments/${head.id}/measured`} className="btn">
          Measured
        </Link>
      )}
      {mayAssess ? (
        <Link to={`/flows/${head.flow.id}`} className={`btn ${grow}`}>
          Change the flow
        </Link>
      ) : null}
      {phone || lot ? null : (
        <Link to={`/assessments/${head.id}/compare`} className="btn">
          Compare
        </Link>
      )}
      {phone || lot ? null : (
        <Link to={`/assessments/${head.id}/review`} className="btn">
          Review
        </Link>
      )}
      {mayAssess && !outOfDate && !phone ? <RunAgain /> : null}
      <Link
        to={`/sheets/${head.id}${legQuery("?", leg)}`}
        className={`btn ${outOfDate && mayAssess ? "" : "btn-primary"} ${grow}`}
      >
        Print the sheet
      </Link>
    </>
  );
}
