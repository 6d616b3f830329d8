import { warpModel } from "#app/engine/stack/warp-uncertainty.ts";
import { firstOrderUncertainty } from "#app/engine/uncertainty/first-order.ts";
import type { UncertainQuantity } from "#app/engine/uncertainty/quantity.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparedSensitivity } from "#app/schemas/comparison.ts";
import { lengthWords } from "../stack-words.ts";
import type { ComparedStack } from "./figures.ts";

/** How many inputs of a stack are told. */
const TOLD = 5;

/** An input whose tolerance moves the warp: by `moves`, m, to either side. */
export interface Mover {
  input: string;
  halfWidth: number;
  moves: number;
}

/**
 * The inputs of a stack by how far their tolerances move its warp, largest first: the slope of the first order
 * (JCGM 100:2008, 5.1.3) times the half-width. `linear` false: the warp bends so much that a slope misleads. Null when nothing has a
 * tolerance.
 */
export function warpMovers({ figures }: Pick<ComparedStack, "figures">): { movers: Mover[]; linear: boolean } | null {
  if (!figures) return null;
  const { inputs, model } = warpModel(figures.stack);
  if (inputs.length === 0) return null;
  const { lines, linear } = firstOrderUncertainty({ model, inputs });
  const widths = new Map(inputs.map((input) => [input.name, halfWidth(input)]));
  const movers = lines.map(({ input, sensitivity }) => {
    const width = widths.get(input) ?? 0;
    return { input, halfWidth: width, moves: Math.abs(sensitivity) * width };
  });
  return { movers: movers.toSorted((a, b) => b.moves - a.moves), linear };
}

const halfWidth = (input: UncertainQuantity) => (input.distribution === "rectangular" ? input.halfWidth : 0);

/** The largest movers of every stack in words, with bars on one scale for all. */
export function sensitivityWords(stacks: readonly ComparedStack[]): ComparedSensitivity[] {
  const found = stacks.map((stack) => ({ stack, answer: stack.figures?.own.rolledUp ? null : warpMovers(stack) }));
  const largest = Math.max(0, ...found.flatMap(({ answer }) => answer?.movers.map(({ moves }) => moves) ?? []));
  return found.map(({ stack, answer }) => ({
    letter: stack.letter,
    name: stack.name,
    remark: remarkOf(stack, answer),
    lines: (answer?.movers ?? []).slice(0, TOLD).map(({ input, halfWidth: width, moves }) => ({
      ...inputWords(stack, input, width),
      moves: `± ${lengthWords(moves)}`,
      share: largest > 0 ? moves / largest : 0,
    })),
  }));
}

function remarkOf({ figures }: ComparedStack, answer: ReturnType<typeof warpMovers>): string | null {
  if (!figures) return "It cannot be estimated.";
  if (figures.own.rolledUp) return "It is rolled past half a turn, where a warp means nothing.";
  if (!answer) return "Nothing of it has a tolerance, so nothing is known to move it.";
  if (answer.movers.length === 0) return "No tolerance of it moves the warp.";
  if (!answer.linear) return "The warp bends over these tolerances: take the figures for the first order only.";
  return null;
}

/** The engine counts films from 1 in the order of the stack. */
function inputWords({ layers }: ComparedStack, input: string, width: number): { input: string; tolerance: string } {
  const [, what = "", number] = /^(stress|thickness) of film (\d+)$/.exec(input) ?? [];
  if (number === undefined) return { input: "Silicon thickness", tolerance: `± ${lengthWords(width)}` };
  const film = layers[Number(number) - 1];
  const alone = layers.filter(({ filmId }) => filmId === film?.filmId).length === 1;
  const name = `${film?.filmName.replace(/ \(.*\)$/, "") ?? "film"}${alone ? "" : `, film ${number}`}`;
  return what === "stress"
    ? {
        input: `Stress of ${name}`,
        tolerance: `± ${formatQuantity(width, "stress", { unit: "MPa", significant: 3, trim: true })}`,
      }
    : { input: `Thickness of ${name}`, tolerance: `± ${lengthWords(width)}` };
}
