import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { MeasuredAnswer } from "#app/lib/measured-answer.ts";
import type { StepMeasurements } from "#app/schemas/step-measurement.ts";
import { MeasuredForm } from "./MeasuredForm.tsx";
import { MeasuredTable } from "./MeasuredTable.tsx";

interface Props {
  page: StepMeasurements;
  answer: MeasuredAnswer | null;
}

/** Bows that were measured after steps of an assessment: what is recorded, and recording more. */
export function MeasuredPage({ page, answer }: Props) {
  const { assessment, flow, program, rows, mayRecord, steps } = page;
  return (
    <>
      <PageHead
        title="Measured after a step"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: `/flows/${flow.id}` },
          { name: `Assessment ${revisionLetters(assessment.number)}`, path: `/assessments/${assessment.id}` },
        ]}
        remark={[program, assessment.lot && `lot ${assessment.lot}`].filter(Boolean).join(", ")}
        actions={
          <Link to={`/predictions?of=bow&flow=${flow.id}`} className="btn">
            Predicted against measured
          </Link>
        }
      />
      {answer?.refused && <Notice kind="error" title={answer.refused} />}
      {rows.length > 0 ? (
        <MeasuredTable page={page} />
      ) : (
        <EmptyState title="No bow recorded yet">
          Bows that were measured after a step of this flow belong here, beside what the assessment predicts. They show
          where the model is off.
        </EmptyState>
      )}
      {mayRecord && steps.length > 0 && (
        <MeasuredForm key={rows.length} page={page} lastResult={answer?.lastResult ?? null} />
      )}
      {steps.length === 0 && (
        <p className="mt-4 text-quiet">
          After no step of this flow has the wafer a bow of its own: it is held flat or rolled up throughout.
        </p>
      )}
    </>
  );
}
