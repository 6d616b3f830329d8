import { formatWithUncertainty } from "#app/engine/units/format.ts";
import type { FilmAnalysis } from "#app/schemas/film-analysis.ts";
import { senseOf } from "./scan-answer.ts";

/** The answer of a film on a wafer in one or two sentences: stress, shape, and what stands against it. */
export function waferAnswer(name: string, { stress, directions, mistakes }: FilmAnalysis): string[] {
  const seen = mistakes.filter(({ state }) => state === "seen");
  const against =
    seen.length === 0
      ? []
      : [
          `${seen.length === 1 ? "One possible mistake was" : `${seen.length} possible mistakes were`} seen: look at them first.`,
        ];
  if (stress.full === null)
    return [`${name}: the wafer has rolled up, so these scans give no film stress.`, ...against];
  const best = stress.differs ? stress.full : stress.stoney;
  const text = formatWithUncertainty(best.value, best.uncertainty, "stress", { unit: "MPa" });
  const sense = senseOf({ stress: best.value, stressUncertainty: best.uncertainty / 2 });
  const model = stress.differs ? ", by the full model" : "";
  const word = directions.change.all?.word;
  const shape =
    word === undefined
      ? "The scans do not show all directions."
      : word === "flat"
        ? "The film left the shape as it was."
        : `The film makes a ${word === "curled" ? "roll" : word}.`;
  return [`${name}: ${text}, ${sense}${model}.`, ...(seen.length > 0 ? against : [shape])];
}
