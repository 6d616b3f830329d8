import { Link } from "react-router";
import { ChangedNotice } from "#app/components/changes/ChangedNotice.tsx";
import { Cautions } from "#app/components/cautions/Cautions.tsx";
import { AnswerLine } from "#app/components/drawings/AnswerLine.tsx";
import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import { StepStrip } from "#app/components/drawings/StepStrip.tsx";
import { LotSection } from "#app/components/lot/LotSection.tsx";
import type { AnswerFigureView, AssessmentView } from "#app/lib/assessment-view.ts";
import { stepPath } from "#app/lib/step-path.ts";
import type { OutOfDate } from "#app/schemas/assessment-changes.ts";
import { AssessmentActions } from "./AssessmentActions.tsx";
import { AssessmentTop, type NotComputable } from "./AssessmentTop.tsx";
import { FlowCourse } from "./FlowCourse.tsx";
import { LegList } from "./LegList.tsx";
import { OutOfDateSection } from "./OutOfDateSection.tsx";
import { SidePane } from "./SidePane.tsx";
import { StepLink } from "./StepLink.tsx";
import { StepList } from "./StepList.tsx";
import { StepTable } from "./StepTable.tsx";
import { WafersDrawn } from "./WafersDrawn.tsx";
import { useStepSelection } from "./use-step-selection.ts";

interface Props {
  view: AssessmentView;
  /** what has changed since it was run; null when it is up to date */
  changed: OutOfDate | null;
  refused: NotComputable | undefined;
}

/** An assessment: the answer, all steps on one axis, the steps one by one, and what follows from them. */
export function AssessmentPage({ view, changed, refused }: Props) {
  const { head, diameter, outcome, where, sentences, figures, steps, selected } = view;
  const { select, leg } = useStepSelection();
  const legNumber = view.legs?.chosen.number ?? null;
  const bows = steps.flatMap(({ bow }) => (bow.shape.kind === "bowed" ? [bow.shape.bow] : []));
  const exaggeration = chooseExaggeration(bows, diameter);
  const rows = { steps, selected, diameter, exaggeration };
  return (
    <>
      <AssessmentTop head={head} leg={legNumber} refused={refused} />
      <ChangedNotice of={`flow:${head.flow.id}`} since={head.id} title="Its flow was changed or assessed anew.">
        Somebody did so since you opened this page.
      </ChangedNotice>
      <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
        <AnswerLine outcome={outcome} where={where ?? undefined} sentences={sentences} figures={figures.map(linked)} />
        {view.legs ? <LegList legs={view.legs} /> : null}
        {head.lot ? <LotSection lot={head.lot} /> : null}
        {head.outOfDate ? <OutOfDateSection head={head} changed={changed} /> : null}
        <div className="border-t border-ink max-tablet:hidden">
          <StepStrip
            steps={steps.map((step) => ({
              ...step,
              name: step.title,
              selected: step.number === selected?.number,
              href: stepPath(step.number, leg),
            }))}
            diameter={diameter}
            exaggeration={exaggeration}
            label="Steps on one axis"
            onSelect={select}
          />
        </div>
        <div className="grid grid-cols-[minmax(0,1fr)] border-t border-ink wide:grid-cols-[minmax(0,1fr)_384px]">
          <section aria-labelledby="steps">
            <h2 id="steps" className="sr-only">
              Steps
            </h2>
            <StepTable {...rows} />
            <StepList {...rows} />
          </section>
          <SidePane view={view} />
        </div>
        <FlowCourse course={view.course} selected={selected?.number} />
        {head.mayAssess ? <WafersDrawn key={`${head.id} ${legNumber}`} assessmentId={head.id} leg={legNumber} /> : null}
      </article>
      <section className="mt-6" aria-labelledby="cautions">
        <h2 id="cautions" className="mb-2 font-semibold">
          Cautions
        </h2>
        <Cautions compact />
      </section>
      <p className="mt-4 text-label text-quiet">
        Engine {head.engineVersion}, inputs of {head.createdAt.slice(0, 16).replace("T", " ")} UTC, fingerprint{" "}
        {head.inputHash.slice(0, 12)}. ± is the expanded uncertainty, k = 2, from the tolerances given.
      </p>
      {head.lot ? null : (
        <p className="screen-only mt-2 tablet:hidden">
          <Link to={`/assessments/${head.id}/compare`} className="link">
            Compare with another assessment
          </Link>
          {"; "}
          <Link to={`/assessments/${head.id}/lot`} className="link">
            try a lot
          </Link>
          {"; "}
          <Link to={`/assessments/${head.id}/measured`} className="link">
            measured after a step
          </Link>
        </p>
      )}
      <div className="screen-only sticky bottom-0 z-10 -mx-4 mt-4 flex gap-2 border-t border-ink bg-surface px-4 py-2 tablet:hidden">
        <AssessmentActions head={head} leg={legNumber} phone />
      </div>
    </>
  );
}

/** A figure with its way to where it comes from. */
function linked({ label, value, link }: AnswerFigureView) {
  if (!link) return { label, value };
  const { text, to } = link;
  const working =
    typeof to === "string" ? (
      <Link to={to} className="link">
        {text}
      </Link>
    ) : (
      <StepLink step={to.step} className="link">
        {text}
      </StepLink>
    );
  return { label, value, working };
}
