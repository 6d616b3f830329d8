import type { Layer } from "../laminate/layer.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import type { StackFilm, StackInput } from "./model.ts";

/** The stack's layers from the bottom up, z out of the device side: outermost back film first. */
export function laminateOfStack({ wafer, films }: StackInput): Layer[] {
  const { youngsModulus, poissonsRatio } = siliconPlateConstants(wafer.orientation);
  const silicon: Layer = { thickness: wafer.thickness, youngsModulus, poissonsRatio, cte: "silicon" };
  const onSide = (side: StackFilm["side"]) => films.filter((film) => film.side === side).map(layerOf);
  return [...onSide("back").toReversed(), silicon, ...onSide("front")];
}

function layerOf(film: StackFilm): Layer {
  return {
    thickness: film.thickness,
    youngsModulus: film.youngsModulus,
    poissonsRatio: film.poissonsRatio,
    stress: film.stress,
    cte: film.expansion,
    referenceTemperature: film.referenceTemperature,
    coverage: film.coverage,
  };
}
