import { directionalLaminateWorking } from "../directional/working.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { laminateWorking } from "../laminate/working.ts";
import { directionalStoneyWorking, patternedFilmWorking } from "../patterned/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { bowFromCurvatureWorking, filmForceWorking, stoneyCurvatureWorking } from "../stoney/working.ts";
import type { Working } from "../working.ts";
import { blanketStress, patternedOf, pullOf, unequalThinFilm, type StackEstimate } from "./estimate-stack.ts";
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
  const filmForces = films.map((film) => forceWorking({ ...film, stress: blanketStress(film, temperature) }));
  return {
    shape: { ...shape, from: [...laminateWorkings(stack, estimate), ...(shape.from ?? [])] },
    stoney: estimate.unequal
      ? {
          ...stoney,
          note: "The films’ forces add up by direction, those of the back side reversed; x and y are the axes of the sum.",
          from: [unequalCurvature(stack, filmForces)],
        }
      : {
          ...stoney,
          note: "The curvatures of the films add up; a film on the back side counts with its stress reversed.",
          from: films.map((film) => filmCurvature(film, stack, temperature)),
        },
    filmForces,
  };
}

/** Of a stack with lines both curvatures, x along the notch axis. */
function laminateWorkings(stack: StackInput, { unequal }: StackEstimate): Working[] {
  const { temperature = ROOM_TEMPERATURE } = stack;
  if (!unequal) return [laminateWorking(laminateOfStack(stack), { temperature })];
  return (["curvatureX", "curvatureY"] as const).map((part) =>
    directionalLaminateWorking(unequal.layers, part, { temperature }),
  );
}

function unequalCurvature(stack: StackInput, filmForces: Working[]): Working {
  const { input, axis } = unequalThinFilm(stack);
  return { ...directionalStoneyWorking(input, axis), from: filmForces };
}

/** Force of a film at its reference temperature; of lines along the axis, notch or across, along which it is larger. */
function forceWorking(film: StackFilm): Working {
  const { stress, thickness, coverage, lines } = film;
  if (!lines) return filmForceWorking({ stress, thickness, coverage });
  const { x, y } = pullOf(film);
  return patternedFilmWorking(patternedOf(film, lines), Math.abs(x) >= Math.abs(y) ? "x" : "y");
}

function filmCurvature(film: StackFilm, { wafer }: StackInput, temperature: number): Working {
  const stress = blanketStress(film, temperature) * (film.coverage ?? 1);
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
