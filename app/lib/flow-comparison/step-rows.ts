import { supportClassOf, supportRank } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { ComparedGroup } from "#app/schemas/comparison.ts";
import { micrometres } from "../assessment-figure.ts";
import { bySeverity, findingNote } from "../assessment-finding.ts";
import { heldFlat, shapeText } from "../assessment-shape.ts";
import { comparedRow, type RowCell } from "../comparison/compared-row.ts";
import type { AlignedSteps } from "./align-many.ts";
import type { ComparedFlow } from "./figures.ts";

/** How a place of the aligned steps is called, in table, chart and sentences: '5, Grind to 60 µm'. */
export const placeName = ({ title }: Pick<AlignedSteps<unknown>, "title">, index: number) => `${index + 1}, ${title}`;

/** The steps of all flows side by side, a row for each place: support, shape and finding. */
export function stepsGroup(flows: readonly ComparedFlow[], places: readonly AlignedSteps<StepResult>[]): ComparedGroup {
  return {
    key: "steps",
    title: "Steps side by side: support, and how it lies at 25\u00A0°C",
    rows: places.map((place, index) =>
      comparedRow(`step ${index + 1}`, placeName(place, index), flows, ({ figures }, column) => {
        if (!figures) return { text: "–", same: null };
        const step = place.steps[column] ?? null;
        return step ? stepCell(step, place, figures.result) : { text: "no such step", same: null };
      }),
    ),
  };
}

function stepCell(step: StepResult, place: AlignedSteps<StepResult>, result: AssessmentResult): RowCell {
  const findings = result.findings.filter(({ step: number }) => number === step.number);
  const [worst] = findings.filter(({ outcome }) => outcome !== "clear").sort(bySeverity);
  const support = supportWords(step);
  const lies = step.atRoom ? shapeText(step.atRoom, step.lies) : heldFlat(step.planned);
  const warp = step.atRoom ? micrometres(step.atRoom.warp) : null;
  return {
    text: step.skipped ? "skipped by these slots" : `${support}; ${lies}`,
    note: [
      step.title === place.title ? `its step ${step.number}` : `its step ${step.number}, ${step.title}`,
      micrometres(step.silicon),
      ...(worst ? [`${step.outcome}: ${findingNote(worst)}`] : []),
    ].join("; "),
    same: [
      step.skipped ?? false,
      step.required,
      step.planned,
      step.outcome,
      micrometres(step.silicon),
      step.lies,
      warp,
    ],
  };
}

/** 'carrier', 'needs carrier, planned bare', 'on carrier, bare would do'. */
function supportWords({ required, planned }: StepResult): string {
  const has = supportClassOf(planned);
  if (supportRank(required) > supportRank(has))
    return required === "none fits" ? `no support fits, planned ${planned}` : `needs ${required}, planned ${planned}`;
  if (required === has) return planned;
  return `${planned}, ${required} would do`;
}
