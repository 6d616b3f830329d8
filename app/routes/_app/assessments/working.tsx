import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { legAnswer } from "#app/lib/assessment-leg.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { figureAskedFor } from "#app/lib/assessment-working.ts";
import { stepPath } from "#app/lib/step-path.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { getAssessment } from "#app/services/assessments/assessments.server.ts";
import type { Route } from "./+types/working";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `Working: ${loaderData.figure.label}` : "Working"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { id, number, flow, engineVersion, ...stored } = await getAssessment(scopeOf(context), params.assessmentId);
  const { result, legs } = legAnswer(stored.result, url.searchParams.get("leg"));
  const figure = figureAskedFor(result, url.searchParams);
  if (!figure) throw problem(404, "This assessment has no such figure, or none with a calculation behind it.");
  return { id, number, flow, engineVersion, figure, leg: legs?.chosen ?? null };
}

export default function FigureWorking({ loaderData }: Route.ComponentProps) {
  const { id, number, flow, engineVersion, figure, leg } = loaderData;
  const { step, label, value, working } = figure;
  return (
    <>
      <PageHead
        title={label}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: `/flows/${flow.id}` },
          { name: `Assessment ${revisionLetters(number)}`, path: `/assessments/${id}` },
          { name: `Step ${step.number}`, path: `/assessments/${id}${stepPath(step.number, leg?.number)}` },
        ]}
      />
      <article className="frame max-w-280">
        <div className="border-b border-ink p-4 tablet:p-6">
          <p className="text-quiet">
            {noBreak(`Step ${step.number}, ${step.title}${leg ? `, for ${leg.slots}` : ""}`)}
          </p>
          <p className="text-answer font-medium">{value}</p>
          <p className="mt-1 text-label text-quiet">
            Computed by engine {engineVersion} and stored with the assessment. ± is the expanded uncertainty, k = 2.
            Below, a bowl counts positive, device side up; the standard bow has the opposite sign.
          </p>
        </div>
        <div className="p-4 tablet:p-6">
          <WorkingView working={working} level={2} />
        </div>
      </article>
      <p className="mt-4">
        <Link to={`/assessments/${id}${stepPath(step.number, leg?.number)}`} className="link">
          Back to step {step.number}
        </Link>
      </p>
    </>
  );
}
