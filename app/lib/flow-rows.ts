import type { StepKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Exposure, Holding, Side } from "#app/engine/vocabulary.ts";
import { filmCutWords } from "./film-cut.ts";
import { filmThicknessText, siliconText } from "./flow-thickness.ts";
import { formatBare } from "./format-measured.ts";

/** A step as the step table needs it; a stored step and a proposed one both have this. */
export interface ShownStep {
  id: string;
  kind: StepKind;
  title: string;
  /** K */
  peakTemperature: number;
  /** s */
  holdTime: number | null;
  equipment: { name: string } | null;
  exposures: Exposure[];
  planned: Holding;
  siliconAfter: Measured | null;
  trimWidth: Measured | null;
  trimDepth: Measured | null;
  carrier: { name: string } | null;
  bondingMaterial: { name: string } | null;
  bondThickness: Measured | null;
  films: {
    change: "adds" | "removes";
    side: Side;
    film: { name: string };
    thickness: Measured | null;
    coverage: number;
    lines?: FilmLines | null;
  }[];
}

/** A row of the step table, as text. */
export interface StepRow {
  id: string;
  number: number;
  title: string;
  kind: StepKind;
  changes: StepChange[];
  /** °C, without the unit */
  peak: string;
  /** with its unit; null when it does not matter */
  minutes: string | null;
  /** µm, without the unit */
  silicon: { text: string; changed: boolean };
  tool: string | null;
  exposures: Exposure[];
  planned: Holding;
  /** the carrier that it is on after the step, with what bonds it at the step that bonds */
  bond: string | null;
  /** some number of this step is assumed */
  assumed: boolean;
}

/** What a step adds to the wafer or takes off it. */
export interface StepChange {
  word: "adds" | "removes" | "trims";
  /** 'Plated copper A, 5 µm, 35 %' */
  what: string;
  side: "device side" | "back side" | null;
}

const SIDES = { front: "device side", back: "back side" } as const;

const length = (value: number, unit: string) => formatQuantity(value, "length", { unit });

function filmChange({ change, side, film, thickness, coverage, lines }: ShownStep["films"][number]): StepChange {
  const parts = [
    film.name,
    thickness && filmThicknessText(thickness.value),
    change === "adds" ? filmCutWords({ coverage, lines }) : null,
  ];
  return { word: change, what: parts.filter(Boolean).join(", "), side: SIDES[side] };
}

function changesOf({ films, trimWidth, trimDepth }: ShownStep): StepChange[] {
  const trim: StepChange[] =
    trimWidth && trimDepth
      ? [
          {
            word: "trims",
            what: `edge, ${length(trimWidth.value, "mm")} wide, ${length(trimDepth.value, "µm")} deep`,
            side: null,
          },
        ]
      : [];
  return [...trim, ...films.map(filmChange)];
}

function isAssumed(step: ShownStep): boolean {
  const { siliconAfter, trimWidth, trimDepth, bondThickness, films } = step;
  return [siliconAfter, trimWidth, trimDepth, bondThickness, ...films.map(({ thickness }) => thickness)].some(
    (measured) => measured?.source === "assumed",
  );
}

function bondWords({ carrier, bondingMaterial, bondThickness }: ShownStep): string {
  return [carrier?.name, bondingMaterial?.name, bondThickness && length(bondThickness.value, "µm")]
    .filter(Boolean)
    .join(", ");
}

/** The rows of the step table: silicon and carrier are carried on from step to step. */
export function stepRows(steps: readonly ShownStep[], incoming: Measured): StepRow[] {
  let silicon = incoming;
  let carrier: string | null = null;
  return steps.map((step, index) => {
    const changed = step.siliconAfter !== null;
    silicon = step.siliconAfter ?? silicon;
    let bond = carrier;
    if (step.kind === "bond" && step.carrier) {
      carrier = step.carrier.name;
      bond = bondWords(step);
    } else if (step.kind === "debond") bond = carrier = null;
    return {
      id: step.id,
      number: index + 1,
      title: step.title,
      kind: step.kind,
      changes: changesOf(step),
      peak: formatBare(step.peakTemperature, "temperature", "°C"),
      minutes: step.holdTime === null ? null : formatQuantity(step.holdTime, "time"),
      silicon: { text: siliconText(silicon), changed },
      tool: step.equipment?.name ?? null,
      exposures: step.exposures,
      planned: step.planned,
      bond,
      assumed: isAssumed(step),
    };
  });
}
