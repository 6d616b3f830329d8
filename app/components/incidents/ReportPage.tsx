import type { SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import type { ReportGround } from "#app/schemas/incident.ts";
import { ReportForm } from "./ReportForm.tsx";
import { ShardCaution } from "./ShardCaution.tsx";

interface Props {
  choices: { value: string; label: string }[];
  ground: ReportGround | null;
  lastResult: SubmissionResult<string[]> | undefined;
}

const CRUMBS = [{ name: "Incidents", path: "/incidents" }];

/** Reporting an incident: first its flow, then the form. */
export function ReportPage({ choices, ground, lastResult }: Props) {
  return (
    <>
      <PageHead
        title="Report an incident"
        crumbs={CRUMBS}
        remark={ground ? `${ground.assessment.program}, ${ground.assessment.flow}, ${ground.assessment.number}` : ""}
        actions={
          ground && (
            <Link to="/incidents/new" className="btn">
              Another flow
            </Link>
          )
        }
      />
      <ShardCaution className="mb-4 max-w-160" />
      {ground ? (
        <ReportForm key={ground.assessment.id} ground={ground} lastResult={lastResult} />
      ) : choices.length > 0 ? (
        <Form method="get" className="frame max-w-160 p-4">
          <div className="field">
            <label htmlFor="assessment">Flow that the lot goes through</label>
            <select id="assessment" name="assessment" required>
              {choices.map(({ value, label }) => (
                <option key={value} value={value}>
                  {label}
                </option>
              ))}
            </select>
            <small>By its newest assessment, which says what was expected of the step</small>
          </div>
          <button type="submit" className="btn btn-primary mt-3">
            Go on
          </button>
        </Form>
      ) : (
        <EmptyState title="No flow has been assessed yet">
          An incident stands beside what an assessment says of its step. Ask an engineer to assess the flow first, and
          tell the shift lead of the incident meanwhile.
        </EmptyState>
      )}
    </>
  );
}
