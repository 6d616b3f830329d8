import type { SubmissionResult } from "@conform-to/react";
import type { ReactNode } from "react";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import { floorPath, type FloorDeed } from "#app/lib/floor/floor-path.ts";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import type { FloorLot, FloorSheet } from "#app/schemas/floor-view.ts";
import { FloorActions } from "./FloorActions.tsx";
import { FloorBlocks } from "./FloorBlocks.tsx";
import { FloorCautions } from "./FloorCautions.tsx";
import { FloorClocks } from "./FloorClocks.tsx";
import { FloorDeedForm } from "./FloorDeedForm.tsx";
import { FloorIncidentForm } from "./FloorIncidentForm.tsx";
import { FloorOnDevice } from "./FloorOnDevice.tsx";
import { FloorRefusal } from "./FloorRefusal.tsx";
import { FloorSheetHead } from "./FloorSheetHead.tsx";
import { StepCommand } from "./StepCommand.tsx";

export interface FloorStepProps {
  lot: FloorLot;
  sheet: FloorSheet;
  step: FloorStep;
  /** the form that is open instead of the step */
  deed: FloorDeed | null;
  newId: string;
}

/** One step of a lot: what hands do, what must not happen, and the few things that can be said of it. */
export function FloorStepPage(props: FloorStepProps & Answered) {
  return (
    <FloorOnDevice lot={props.lot} step={props.step.number} isForm={props.deed !== null}>
      {(lot, notices) => <StepScreen {...props} lot={lot} sheet={lot.sheet ?? props.sheet} notices={notices} />}
    </FloorOnDevice>
  );
}

interface Answered {
  answer: { sentence: string | null; lastResult: SubmissionResult<string[]> } | undefined;
}

function StepScreen({ answer, notices, ...props }: FloorStepProps & Answered & { notices: ReactNode }) {
  const { lot, sheet, step, deed } = props;
  const blocks = sheet.blocks.filter((block) => block.step === null || block.step === step.number);
  return (
    <div className="flex min-h-dvh flex-col tablet:h-dvh">
      <FloorSheetHead lot={lot} sheet={sheet} />
      <div className="flex min-h-0 flex-1 flex-col tablet:flex-row">
        {/* On a tablet it scrolls by itself, so that what can be done stays in view. */}
        <main id="main" tabIndex={0} className="min-w-0 flex-1 overflow-y-auto px-4 py-5 tablet:px-6">
          {notices}
          <FloorRefusal sentence={answer?.sentence ?? null} />
          <FloorBlocks blocks={blocks} lot={lot.id} />
          {deed === null ? (
            <>
              <StepCommand sheet={sheet} step={step} />
              <FloorClocks clocks={sheet.clocks} now={lot.checkedAt} />
              <Notes sheet={sheet} step={step} />
            </>
          ) : deed === "incident" ? (
            <FloorIncidentForm {...props} lastResult={answer?.lastResult ?? null} />
          ) : (
            <FloorDeedForm key={deed} {...props} deed={deed} lastResult={answer?.lastResult ?? null} />
          )}
        </main>
        <FloorActions {...props} blocked={blocks.length > 0} />
      </div>
      <StepFoot {...props} />
    </div>
  );
}

function Notes({ sheet, step }: { sheet: FloorSheet; step: FloorStep }) {
  return (
    <div className="mt-4 grid gap-x-6 gap-y-3 tablet:grid-cols-2">
      <section className="text-lead">
        <h2 className="font-semibold">Watch for here</h2>
        <ul className="list-disc pl-5">
          {[step.touch, ...step.doNot, ...step.runs].map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      </section>
      <div>
        <FloorCautions cautions={sheet.cautions} />
        <p className="mt-2">
          <b>{sheet.emergency.heading}</b> {sheet.emergency.text} {sheet.emergency.call}
        </p>
      </div>
    </div>
  );
}

/** Back, all steps as a bar, and what comes next. */
function StepFoot({ lot, sheet, step }: FloorStepProps) {
  const { steps, support, leg } = sheet;
  const index = steps.findIndex(({ number }) => number === step.number);
  const [back, next] = [steps[index - 1], steps[index + 1]];
  const side =
    "flex min-h-27 w-27 flex-none items-center justify-center px-2 text-center text-lead font-medium no-underline";
  return (
    <nav aria-label="Steps" className="flex min-h-30 border-t border-ink">
      <a href={floorPath(lot.id, back?.number ?? null, leg)} className={`${side} border-r border-ink`}>
        {back ? `Back to step ${back.number}` : "All steps"}
      </a>
      <div className="min-w-0 flex-1 px-2 py-1 max-tablet:hidden">
        <SupportBar
          variant="floor"
          required={support.required}
          planned={support.planned}
          outcomes={support.outcomes}
          numbers={support.numbers}
          label={support.label}
          current={index}
        />
      </div>
      <a
        href={floorPath(lot.id, null, leg)}
        className="flex flex-1 items-center justify-center text-lead tablet:hidden"
      >
        All steps
      </a>
      <a href={floorPath(lot.id, next?.number ?? null, leg)} className={`${side} border-l border-ink`}>
        {next ? `Look at step ${next.number}` : "All steps"}
      </a>
    </nav>
  );
}
