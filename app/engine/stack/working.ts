import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { laminateWorking } from "../laminate/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { bowFromCurvatureWorking, filmForceWorking, stoneyCurvatureWorking } from "../stoney/working.ts";
import type { Working } from "../working.ts";
import { coveredStress, type StackEstimate } from "./estimate-stack.ts";
import { laminateOfStack } from "./laminate-of-stack.ts";
import type { StackFilm, StackInput } from "./model.ts";

/** The calculations behind a stack's estimate. Sagittas have the sign of the curvature. */
export interface StackWorking {
  /** bow of the free wafer along the axis that bends most */
  shape: Working;
  /** bow by the thin-film formula, the films' curvatures added */
  stoney: Working;
  /** film force of each film, in the order of the stack */
  filmForces: Working[];
}

/** The calculations behind `estimate`, which `estimateStack` has made of the same stack, as data. */
export function stackWorking(stack: StackInput, estimate: StackEstimate): StackWorking {
  const { wafer, films } = stack;
  const temperature = stack.temperature ?? ROOM_TEMPERATURE;
  const shape = freeWaferShapeWorking(estimate.disc);
  const stoney = bowFromCurvatureWorking({ curvature: estimate.stoney.curvature, radius: wafer.diameter / 2 });
  return {
    shape: { ...shape, from: [laminateWorking(laminateOfStack(stack), { temperature }), ...(shape.from ?? [])] },
    stoney: {
      ...stoney,
      note: "The curvatures of the films add up; a film on the back side counts with its stress reversed.",
      from: films.map((film) => filmCurvature(film, stack, temperature)),
    },
    filmForces: films.map((film) =>
      filmForceWorking({
        stress: coveredStress({ ...film, coverage: 1 }, temperature),
        thickness: film.thickness,
        coverage: film.coverage,
      }),
    ),
  };
}

function filmCurvature(film: StackFilm, { wafer }: StackInput, temperature: number): Working {
  const stress = coveredStress(film, temperature);
  const working = stoneyCurvatureWorking({
    filmStress: film.side === "front" ? stress : -stress,
    filmThickness: film.thickness,
    substrateThickness: wafer.thickness,
    biaxialModulus: siliconBiaxialModulus(wafer.orientation),
  });
  const [first, ...others] = working.inputs;
  if (!first) return working;
  const meaning = film.side === "front" ? "film stress times area covered" : "the same of a back film, sign reversed";
  return { ...working, inputs: [{ ...first, meaning }, ...others] };
}
