import type { DirectionalLayer } from "../directional/layer.ts";
import type { Layer } from "../laminate/layer.ts";
import { meanOfDirections } from "../patterned/mean-of-directions.ts";
import { checkPattern, linesPattern } from "../patterned/pattern.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import type { StackFilm, StackInput } from "./model.ts";

/**
 * The stack's layers from the bottom up, z out of the device side: outermost back film first. A film in lines counts with the mean
 * of both directions.
 */
export function laminateOfStack(stack: StackInput): Layer[] {
  return fromBelow<Layer>(
    stack,
    (film, at) => {
      const layer = blanketLayer(film);
      return film.lines ? meanOfDirections(layer, patternOf(film, at)) : { ...layer, coverage: film.coverage };
    },
    siliconLayer(stack),
  );
}

/** The same with both directions apart; null for a stack without lines, whose directions are alike. */
export function directionalLaminateOfStack(stack: StackInput): DirectionalLayer[] | null {
  if (!stack.films.some(({ lines }) => lines)) return null;
  const { thickness, orientation } = stack.wafer;
  const cubic: DirectionalLayer = { silicon: { direction: "110" }, thickness, cte: "silicon" };
  return fromBelow<DirectionalLayer>(
    stack,
    (film, at) =>
      film.lines
        ? { ...blanketLayer(film), pattern: patternOf(film, at) }
        : { ...blanketLayer(film), coverage: film.coverage },
    orientation === "100" ? cubic : siliconLayer(stack),
  );
}

function siliconLayer({ wafer }: StackInput): Layer {
  return { ...siliconPlateConstants(wafer.orientation), thickness: wafer.thickness, cte: "silicon" };
}

function fromBelow<Made>({ films }: StackInput, make: (film: StackFilm, field: string) => Made, silicon: Made): Made[] {
  const on = (side: StackFilm["side"]) => films.filter((film) => film.side === side);
  const [back, front] = [on("back").toReversed(), on("front")];
  const made = (some: StackFilm[], from: number) => some.map((film, n) => make(film, `layers[${from + n}]`));
  return [...made(back, 0), silicon, ...made(front, back.length + 1)];
}

/** Refuses by the place of the layer, as the laminate itself does. */
function patternOf({ lines, coverage = 1 }: StackFilm, field: string) {
  return checkPattern(linesPattern(lines ?? { width: 0, direction: 0 }, coverage), field);
}

function blanketLayer(film: StackFilm): Layer & { stress: number } {
  return {
    thickness: film.thickness,
    youngsModulus: film.youngsModulus,
    poissonsRatio: film.poissonsRatio,
    stress: film.stress,
    cte: film.expansion,
    referenceTemperature: film.referenceTemperature,
  };
}
