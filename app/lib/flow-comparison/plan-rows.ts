import { slotsInWords } from "#app/engine/flow/legs.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, BondResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { ComparedGroup } from "#app/schemas/comparison.ts";
import { celsius } from "../assessment-figure.ts";
import { comparedRow, type RowCell } from "../comparison/compared-row.ts";
import { formatMeasured } from "../format-measured.ts";
import { thicknessWords } from "../stack-words.ts";
import { walkedRow } from "./answer-rows.ts";
import type { ComparedFlow, FlowFigures } from "./figures.ts";

/** What each flow is, as rows: the wafer, how thin and how hot, what holds it and which films it gets. */
export function planGroup(flows: readonly ComparedFlow[]): ComparedGroup {
  const row = (key: string, label: string, cellOf: (figures: FlowFigures) => RowCell) =>
    walkedRow(flows, key, label, cellOf);
  return {
    key: "plan",
    title: "What each flow is",
    rows: [
      comparedRow("silicon", "Silicon", flows, ({ silicon }) => ({ text: silicon.name })),
      row("steps", "Steps", ({ result: { steps } }) => ({ text: String(steps.length), note: skippedNote(steps) })),
      row("thinnest", "Least thickness", ({ result }) => thinnestCell(result)),
      row("hottest", "Highest temperature", ({ result }) => hottestCell(result)),
      row("support", "Steps that need support", ({ result }) => supportCell(result)),
      row("carrier", "Carriers", ({ result: { bonds } }) =>
        listCell(
          bonds.map(({ carrier }) => carrier),
          spans(bonds),
        ),
      ),
      row("bond", "Bonding materials", ({ result: { bonds } }) =>
        listCell(
          bonds.map(({ material, thickness }) => `${material}, ${thicknessWords(thickness)}`),
          [...new Set(bonds.map(({ release }) => release))].join("; ") || null,
        ),
      ),
      row("films", "Films it gets", ({ films }) =>
        listCell(films.map(({ name, thickness }) => `${name}, ${formatQuantity(thickness, "length", { unit: "µm" })}`)),
      ),
      row("slots", "Parts by slot", ({ result }) => slotsCell(result)),
      row("assumed", "Inputs that are assumed", ({ result: { assumed, inputs } }) => ({
        text: `${assumed.length} of ${inputs}`,
      })),
    ],
  };
}

/** Which assessment each flow has, and whether that still holds. */
export function standingGroup(flows: readonly ComparedFlow[]): ComparedGroup {
  return {
    key: "standing",
    title: "What the figures rest on",
    rows: [
      comparedRow("assessed", "Newest assessment", flows, ({ assessed }) =>
        assessed
          ? {
              text: `${assessed.revision}, ${assessed.date}`,
              note: assessed.outOfDate ? "out of date: an input has changed since" : "of the same inputs as here",
            }
          : { text: "not assessed yet" },
      ),
      comparedRow("changed", "Flow last changed", flows, ({ changedAt }) => ({ text: changedAt.slice(0, 10) })),
    ],
  };
}

function skippedNote(steps: readonly StepResult[]): string | null {
  const skipped = steps.filter((step) => step.skipped).length;
  return skipped > 0 ? `${skipped} of them skipped by these slots` : null;
}

function thinnestCell({ steps }: AssessmentResult): RowCell {
  const [first, ...rest] = steps;
  if (!first) return { text: "no steps" };
  const {
    silicon: value,
    siliconTolerance: tolerance,
    siliconLeast,
  } = rest.reduce((thinnest, next) => (next.silicon < thinnest.silicon ? next : thinnest), first);
  return {
    text: formatMeasured({ value, tolerance, source: "assumed" }, "length", { unit: "µm" }),
    note: tolerance === null ? "no tolerance" : `judged at ${thicknessWords(siliconLeast)}`,
  };
}

function hottestCell({ steps }: AssessmentResult): RowCell {
  const [first, ...rest] = steps;
  if (!first) return { text: "no steps" };
  const { peakTemperature, number, title } = rest.reduce(
    (hottest, next) => (next.peakTemperature > hottest.peakTemperature ? next : hottest),
    first,
  );
  return { text: celsius(peakTemperature), note: `step ${number}, ${title}` };
}

/** How many steps need each class of support. */
function supportCell({ steps }: AssessmentResult): RowCell {
  const counts = SUPPORT_CLASSES.flatMap((support) => {
    const needing = steps.filter(({ required, skipped }) => !skipped && required === support).length;
    return support === "bare" || needing === 0 ? [] : [`${support} ${needing}`];
  });
  const needing = steps.filter(({ required, skipped }) => !skipped && required !== "bare").length;
  return { text: String(needing), note: counts.join("; ") || null, same: counts };
}

const spans = (bonds: readonly BondResult[]) =>
  bonds.map(({ fromStep, toStep }) => `steps ${fromStep} to ${toStep}`).join("; ") || null;

function listCell(names: readonly string[], note: string | null = null): RowCell {
  return { text: [...new Set(names)].join("; ") || "none", note };
}

function slotsCell({ slots, legs }: AssessmentResult): RowCell {
  if (!legs || !slots) return { text: "no" };
  return { text: `${legs.length} legs`, note: `shown: the worst, ${slotsInWords(slots)}` };
}
