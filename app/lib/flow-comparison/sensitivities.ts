import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { Unknown } from "#app/engine/flow/unknowns.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparedSensitivity } from "#app/schemas/comparison.ts";
import { celsius } from "../assessment-figure.ts";
import { isRolled } from "../lying-as.ts";
import { lengthWords } from "../stack-words.ts";
import type { ComparedFlow } from "./figures.ts";
import type { DecidingWarp } from "./tightest.ts";

/** How many inputs of a flow are told. */
const TOLD = 5;

/** The inputs of every flow that move its deciding warp most, in words, with bars on one scale for all. */
export function flowSensitivities(flows: readonly ComparedFlow[]): ComparedSensitivity[] {
  const largest = Math.max(0, ...flows.flatMap(({ figures }) => figures?.movers.map(({ moves }) => moves) ?? []));
  return flows.map(({ letter, name, figures }) => ({
    letter,
    name,
    remark: figures ? remarkOf(figures.deciding, figures.movers) : "It cannot be walked.",
    lines: (figures?.movers ?? []).slice(0, TOLD).map(({ unknown, moves }) => ({
      input: unknown.label,
      tolerance: toleranceWords(unknown),
      moves: `± ${lengthWords(moves)}`,
      share: largest > 0 ? moves / largest : 0,
    })),
  }));
}

function remarkOf(deciding: DecidingWarp | null, movers: readonly { whole: boolean }[]): string {
  if (!deciding) return "It lies nowhere with a warp of its own: something holds it flat at every step.";
  const { step, moment, limit } = deciding;
  const shape = step[moment];
  const when = shape && shape.temperature !== ROOM_TEMPERATURE ? `at ${celsius(shape.temperature)}` : "at 25\u00A0°C";
  const what = shape && isRolled(shape) ? "edge lift" : "warp";
  const figure = `Of its ${limit ? "tightest" : "largest"} ${what}: ${lengthWords(deciding.warp)} after step ${step.number}, ${step.title}, ${when}.`;
  if (movers.length === 0) return `${figure} No tolerance of it moves that.`;
  return movers.slice(0, TOLD).every(({ whole }) => whole)
    ? figure
    : `${figure} Some inputs can be moved to one side only.`;
}

/** Half-width of an input with the unit that its kind is read in. */
export function toleranceWords({ measured, places }: Pick<Unknown, "measured" | "places">): string {
  const tolerance = measured.tolerance ?? 0;
  const text = (dimension: Parameters<typeof formatQuantity>[1], unit: string) =>
    `± ${formatQuantity(tolerance, dimension, { unit, significant: 3, trim: true })}`;
  switch (places[0]?.at(-1)) {
    case "stress":
    case "yieldStress":
      return text("stress", "MPa");
    case "youngsModulus":
    case "effectiveModulus":
      return text("stress", tolerance < 1e9 ? "MPa" : "GPa");
    case "expansion":
    case "expansionBelow":
      return text("expansion", "ppm/K");
    case "groundFaceForce":
      return text("forcePerLength", "N/m");
    case "filmShare":
      return text("fraction", "%");
    case "flowPoint":
      return text("temperatureDifference", "K");
    case "x":
    case "y":
      return text("curvature", "1/m");
    default:
      return `± ${lengthWords(tolerance)}`;
  }
}
