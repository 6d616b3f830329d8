import { Link } from "react-router";
import { DetailList } from "#app/components/assessments/DetailList.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SupportTag } from "#app/components/drawings/SupportTag.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { micrometres } from "#app/lib/assessment-figure.ts";
import { sentenceCase } from "#app/lib/assessment-steps.ts";
import type { IncidentAnswer } from "#app/lib/incident-answer.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { spotWords } from "#app/lib/spot-words.ts";
import type { IncidentView } from "#app/schemas/incident.ts";
import { IncidentNotes } from "./IncidentNotes.tsx";
import { IncidentPhotos } from "./IncidentPhotos.tsx";
import { SEVERITY_CLASSES, STATE_CLASSES } from "./incident-words.ts";
import { WaferSpotDrawing } from "./WaferSpotDrawing.tsx";

/** An incident in full: what happened, where on the wafer, photos, what was expected of the step, and what came of it. */
export function IncidentPage({ incident, answer }: { incident: IncidentView; answer: IncidentAnswer | null }) {
  const { number, program, kind, severity, state, lot, wafer, step, prediction, spot, affected, broken, through } =
    incident;
  return (
    <>
      <PageHead
        title={`${number}: ${kind}`}
        crumbs={[{ name: "Incidents", path: "/incidents" }]}
        remark={`${program}, happened ${minuteOf(incident.occurredAt)}`}
      />
      <p className="mb-4 text-lead">
        <span className={SEVERITY_CLASSES[severity]}>{sentenceCase(severity)}</span> at step {step},{" "}
        {prediction.stepTitle}. <span className={STATE_CLASSES[state]}>{sentenceCase(state)}.</span>
      </p>
      <HungSection title="What happened" remark={`Reported by ${incident.reportedBy}`}>
        <div className="grid gap-6 tablet:grid-cols-[minmax(0,1fr)_16rem]">
          <div className="space-y-3">
            <p className="max-w-160 whitespace-pre-line break-words">{incident.words}</p>
            <DetailList>
              <dt>Lot</dt>
              <dd>
                <Link to={`/lots/${lot.id}`} className="link">
                  {lot.name}
                </Link>
              </dd>
              <dt>Wafer</dt>
              <dd>
                {wafer ? (
                  <Link to={`/wafers/${wafer.id}`} className="link">
                    {wafer.name}
                  </Link>
                ) : (
                  "not named"
                )}
              </dd>
              <dt>Wafers</dt>
              <dd>
                {affected} affected, {broken} of them broken or scrapped,{" "}
                {through === null
                  ? "how many went through the step is not known"
                  : `of ${through} that went through the step`}
              </dd>
              <dt>Reported</dt>
              <dd>
                {minuteOf(incident.reportedAt)} by {incident.reportedBy}
              </dd>
            </DetailList>
          </div>
          <figure>
            <WaferSpotDrawing spot={spot} />
            <figcaption className="text-label text-quiet">
              Device side towards you, notch down. {spot ? `${sentenceCase(spotWords(spot))}.` : "No place was marked."}
            </figcaption>
          </figure>
        </div>
      </HungSection>
      <IncidentPhotos incident={incident} faults={answer?.about === "photos" ? answer.faults : []} />
      <HungSection title="What was expected" remark="As the assessment said when it was reported">
        <Expected incident={incident} />
      </HungSection>
      <IncidentNotes incident={incident} answer={answer?.about === "note" ? answer : null} />
    </>
  );
}

function Expected({ incident: { assessment, step, prediction } }: { incident: IncidentView }) {
  const { warp, warpUncertainty } = prediction;
  return (
    <>
      <DetailList>
        <dt>Silicon</dt>
        <dd>{noBreak(micrometres(prediction.silicon))}</dd>
        <dt>Planned</dt>
        <dd>
          <SupportTag support={prediction.planned} />
        </dd>
        <dt>Required</dt>
        <dd>
          <SupportTag support={prediction.required} />
        </dd>
        <dt>Warp</dt>
        <dd>{warp === null ? "held flat, so none" : `${noBreak(micrometres(warp, warpUncertainty))} at 25\u00A0°C`}</dd>
        <dt>Films</dt>
        <dd>{prediction.films}</dd>
      </DetailList>
      <p className="mt-3">
        <Link to={`/assessments/${assessment.id}?step=${step}`} className="link">
          {assessment.number}, {assessment.flow}
          {assessment.lot ? `, lot ${assessment.lot}` : ""}: step {step}
        </Link>
      </p>
    </>
  );
}
