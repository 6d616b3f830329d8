import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { OUTCOME_SIGNS, SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import { SupportColumn } from "#app/components/drawings/SupportColumn.tsx";
import type { StepRow } from "#app/lib/assessment-steps.ts";
import { FindingNote } from "./FindingNote.tsx";
import { StepDetails } from "./StepDetails.tsx";
import { StepLink } from "./StepLink.tsx";
import type { StepsProps } from "./StepTable.tsx";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** The steps on a phone: the support bar stands upright at their left. */
export function StepList({ steps, selected, diameter, exaggeration }: StepsProps) {
  return (
    <section aria-label="Steps as a list" className="tablet:hidden">
      <p className="border-b border-line px-3 py-2 text-label text-quiet">
        Bow lines ×{exaggeration}. Below each: warp with k = 2 and the tool’s limit, <OwnHead unit="µm" />.
      </p>
      <ol>
        {steps.map((step, index) => {
          const isSelected = step.number === selected?.number;
          const first = steps[index - 1]?.required !== step.required;
          return (
            <li
              key={step.number}
              className={`relative border-b border-line pl-13 last:border-b-0 ${isSelected ? "bg-wash" : ""}`}
            >
              <span className="absolute inset-y-0 left-3 w-5">
                <SupportColumn level={levelOf(step)} tallest={isSelected ? 2400 : undefined} />
              </span>
              <div className="relative grid grid-cols-[24px_minmax(0,1fr)_104px] py-2">
                <span className="font-semibold">{step.number}</span>
                <div className="pr-2">
                  <StepLink
                    step={step.number}
                    selected={isSelected}
                    className="block font-medium text-ink no-underline after:absolute after:inset-0"
                  >
                    {noBreak(step.title)}
                  </StepLink>
                  <p className="text-label text-quiet">
                    {first ? <strong>{SUPPORT_SIGNS[step.required].word} from here. </strong> : null}
                    {step.silicon.text}&nbsp;µm, {step.heldBy.toLowerCase()}, {step.temperature.text}&nbsp;°C
                    {step.bow.shape.kind === "held" ? "" : `, ${step.liesAs}`}
                  </p>
                  {step.outcome === "clear" ? null : (
                    <div className="mt-1 text-label">
                      <FindingTag outcome={step.outcome}>
                        <FindingNote step={step} />
                      </FindingTag>
                    </div>
                  )}
                </div>
                <div className="flex flex-col items-end justify-between gap-1 pr-3">
                  <BowLine
                    label=""
                    width={72}
                    height={26}
                    diameter={diameter}
                    {...step.bow}
                    exaggeration={exaggeration}
                    showScale={step.bow.shape.kind === "rolled"}
                  />
                  {step.bow.shape.kind === "bowed" ? (
                    <span className="text-right text-label tabular-nums">
                      <OwnFigure unit="µm">
                        {step.warpText} / {step.limitText}
                      </OwnFigure>
                    </span>
                  ) : null}
                </div>
              </div>
              {isSelected && selected ? (
                <div className="pr-3 pb-3 pl-1">
                  <StepDetails step={selected} />
                </div>
              ) : null}
            </li>
          );
        })}
      </ol>
    </section>
  );
}

/** What the step needs; a step that must not run, or cannot be judged, says so first. */
function levelOf({ outcome, required }: StepRow) {
  const blocked = outcome === "do not run" || outcome === "cannot judge";
  return blocked ? OUTCOME_SIGNS[outcome].level : SUPPORT_SIGNS[required].level;
}
