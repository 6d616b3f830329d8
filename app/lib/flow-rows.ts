import { slotsInWords } from "#app/engine/flow/legs.ts";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { SIDE_NAMES, type Exposure, type FaceUp, type Holding, type Side } from "#app/engine/vocabulary.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";
import { withPieceMark } from "./carrier-units.ts";
import { filmCutWords } from "./film-cut.ts";
import { holdWords, runWords } from "./run-words.ts";
import { filmThicknessText, siliconText } from "./flow-thickness.ts";
import { formatBare } from "./format-measured.ts";
import { planAlong, type OnCarrier } from "./plan-along.ts";

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
  /** `identity` is the mark of the piece that is named */
  carrier: { name: string; identity?: string | null } | null;
  bondingMaterial: { name: string } | null;
  bondThickness: Measured | null;
  handling?: Partial<
    Pick<StepHandlingValues, "machine" | "recipe" | "sideUp" | "profile" | "bondFace" | "debondFace" | "slots">
  >;
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
  /** 'slots 1 to 12' where only those take the step; null for every wafer */
  slots: string | null;
  /** µm, without the unit; joined by 'or' where wafers that take the step come to it unlike */
  silicon: { text: string; changed: boolean };
  tool: string | null;
  /** which of several tools and by which recipe: 'oven 3, recipe PI-5'; null when neither is said */
  run: string | null;
  /** as stated; null where it is as it comes */
  sideUp: FaceUp | null;
  /** peak and minutes are those of a profile */
  profiled: boolean;
  exposures: Exposure[];
  planned: Holding;
  /** the carriers that it is on after the step, with what bonds one at the step that bonds */
  bond: string | null;
  /** some number of this step is assumed */
  assumed: boolean;
}

/** What a step adds to the wafer or takes off it. */
export interface StepChange {
  word: "adds" | "removes" | "trims" | "lets go";
  /** 'Plated copper A, 5 µm, 35 %' */
  what: string;
  side: "device side" | "back side" | null;
}

const length = (value: number, unit: string) => formatQuantity(value, "length", { unit });

function filmChange({ change, side, film, thickness, coverage, lines }: ShownStep["films"][number]): StepChange {
  const parts = [
    film.name,
    thickness && filmThicknessText(thickness.value),
    change === "adds" ? filmCutWords({ coverage, lines }) : null,
  ];
  return { word: change, what: parts.filter(Boolean).join(", "), side: SIDE_NAMES[side] };
}

/** `before`: the carriers that the wafer comes on, of one that comes on them in several ways each of those. */
function changesOf(
  { kind, films, trimWidth, trimDepth, handling }: ShownStep,
  before: readonly (readonly OnCarrier[])[],
): StepChange[] {
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
  const gone = kind === "debond" ? before.flat().filter(({ face }) => face === handling?.debondFace) : [];
  const names = [...new Set(gone.map(({ name }) => name))].join(" or ");
  const letGo: StepChange[] = gone[0] ? [{ word: "lets go", what: names, side: SIDE_NAMES[gone[0].face] }] : [];
  return [...trim, ...films.map(filmChange), ...letGo];
}

function isAssumed(step: ShownStep): boolean {
  const { siliconAfter, trimWidth, trimDepth, bondThickness, films } = step;
  return [siliconAfter, trimWidth, trimDepth, bondThickness, ...films.map(({ thickness }) => thickness)].some(
    (measured) => measured?.source === "assumed",
  );
}

function bondWords({ carrier, bondingMaterial, bondThickness, handling }: ShownStep): string {
  const words = [
    carrier && withPieceMark(carrier.name, carrier.identity),
    bondingMaterial?.name,
    bondThickness && length(bondThickness.value, "µm"),
  ];
  return [...words, handling?.bondFace === "back" ? "on the back side" : null].filter(Boolean).join(", ");
}

/** The rows of the step table: silicon and carriers are carried on from step to step, for the wafers that take them. */
export function stepRows(steps: readonly ShownStep[], incoming: Measured): StepRow[] {
  const along = planAlong(steps, incoming);
  return steps.map((step, index) => {
    const { silicon = [], before = [], after = [] } = along[index] ?? {};
    const bonds = step.kind === "bond" && step.carrier;
    const { slots } = step.handling ?? {};
    return {
      id: step.id,
      number: index + 1,
      title: step.title,
      kind: step.kind,
      slots: slots ? slotsInWords(slots) : null,
      changes: changesOf(step, before),
      peak: formatBare(step.peakTemperature, "temperature", "°C"),
      minutes: holdWords({ holdTime: step.holdTime, profile: step.handling?.profile ?? null }),
      silicon: { text: alternatives(silicon.map(siliconText)) ?? "", changed: step.siliconAfter !== null },
      tool: step.equipment?.name ?? null,
      run: runWords(step.handling ?? {}),
      sideUp: step.handling?.sideUp ?? null,
      profiled: Boolean(step.handling?.profile),
      exposures: step.exposures,
      planned: step.planned,
      bond: bonds ? bondWords(step) : alternatives(after.map(carrierNames)),
      assumed: isAssumed(step),
    };
  });
}

const carrierNames = (on: readonly OnCarrier[]) => on.map(({ name }) => name).join(" and ") || "no carrier";

/** Different texts joined; null where there is nothing but 'no carrier'. */
function alternatives(texts: readonly string[]): string | null {
  const different = [...new Set(texts)];
  return different.length === 1 && different[0] === "no carrier" ? null : different.join(" or ");
}
