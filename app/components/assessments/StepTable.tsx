import { Fragment } from "react";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { HATCH_STYLES, OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import type { SelectedStep } from "#app/lib/assessment-selected.ts";
import type { StepRow } from "#app/lib/assessment-steps.ts";
import { FindingNote } from "./FindingNote.tsx";
import { StepDetails } from "./StepDetails.tsx";
import { StepLink } from "./StepLink.tsx";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

export interface StepsProps {
  steps: readonly StepRow[];
  selected: SelectedStep | null;
  /** wafer diameter, m */
  diameter: number;
  exaggeration: number;
}

const HEADS: readonly { head: string; unit?: string; numeric?: boolean }[] = [
  { head: "Step" },
  { head: "What is done" },
  { head: "Silicon", unit: "µm", numeric: true },
  { head: "Held by" },
  { head: "Bow line" },
  { head: "Warp, 25\u00A0°C", unit: "µm, k = 2", numeric: true },
  { head: "Lies as" },
  { head: "Limit", unit: "µm", numeric: true },
  { head: "Finding" },
];

/** Every step with its state and its worst finding; the one that is looked at opens below its row. */
export function StepTable({ steps, selected, diameter, exaggeration }: StepsProps) {
  return (
    <div className="overflow-x-auto max-tablet:hidden" tabIndex={0} role="region" aria-label="Steps as a table">
      <table className="table">
        <caption className="sr-only">Steps with their shape, limit and worst finding</caption>
        <thead>
          <tr>
            {HEADS.map(({ head, unit, numeric }, index) => (
              <th
                key={head}
                scope="col"
                className={`${numeric ? "num" : "whitespace-nowrap"} ${index === 0 ? "pl-4!" : ""}`}
              >
                {head}
                {unit === undefined ? null : (
                  <span className="block">
                    <OwnHead unit={unit} />
                  </span>
                )}
                {head === "Bow line" ? <span className="block">×{exaggeration}</span> : null}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {steps.map((step) => {
            const isSelected = step.number === selected?.number;
            return (
              <Fragment key={step.number}>
                <Row step={step} selected={isSelected} diameter={diameter} exaggeration={exaggeration} />
                {isSelected && selected ? (
                  <tr className="bg-wash">
                    <td className="border-t-0! p-0!" style={{ boxShadow: severityBar(step) }} />
                    <td colSpan={HEADS.length - 1} className="border-t-0! pt-0! pb-3.5! whitespace-normal">
                      <StepDetails step={selected} />
                    </td>
                  </tr>
                ) : null}
              </Fragment>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

function Row(props: { step: StepRow; selected: boolean; diameter: number; exaggeration: number }) {
  const { step, selected, diameter, exaggeration } = props;
  const weight = selected ? "font-semibold" : "";
  return (
    <tr id={`step-${step.number}`} className="relative scroll-mt-4" aria-current={selected ? "true" : undefined}>
      <td className="w-10 pl-4!" style={selected ? { boxShadow: severityBar(step) } : undefined}>
        {step.number}
      </td>
      <th scope="row" className="font-normal">
        <StepLink
          step={step.number}
          selected={selected}
          className={`text-ink no-underline after:absolute after:inset-0 hover:underline ${weight}`}
        >
          {noBreak(step.title)}
        </StepLink>
      </th>
      <td className="num">
        <OwnFigure unit="µm">{step.silicon.text}</OwnFigure>
      </td>
      <td className="whitespace-nowrap">{step.heldBy}</td>
      <td className="pr-0!">
        <BowLine
          label=""
          width={76}
          height={32}
          diameter={diameter}
          {...step.bow}
          exaggeration={exaggeration}
          showScale={step.bow.shape.kind === "rolled"}
        />
      </td>
      <td className={`num ${weight}`}>
        <OwnFigure unit="µm">{step.warpText}</OwnFigure>
      </td>
      <td className={step.bow.shape.kind === "rolled" ? "min-w-40" : "whitespace-nowrap"}>{step.liesAs}</td>
      <td className="num">
        <OwnFigure unit="µm">{step.limitText}</OwnFigure>
      </td>
      <td className={step.note === null ? "" : "min-w-52 print:min-w-0"}>
        <FindingTag outcome={step.outcome}>
          <FindingNote step={step} />
        </FindingTag>
      </td>
    </tr>
  );
}

/** The 4 px bar at the left of the step that is looked at, in the colour of its outcome. */
function severityBar({ outcome }: StepRow): string {
  const token = outcome === "clear" ? "ink" : HATCH_STYLES[OUTCOME_SIGNS[outcome].level].colour;
  return `inset 4px 0 0 var(--${token})`;
}
