import { solveLaminate, type LaminateResult } from "../laminate/solve-laminate.ts";
import { mismatchStress } from "../laminate/mismatch-stress.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { freeWaferShape, type FreeWaferShape, type FreeWaferShapeInput } from "../plate/free-wafer-shape.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import { bowFromCurvature } from "../stoney/bow.ts";
import { filmForce } from "../stoney/film-force.ts";
import { stoneyCurvature } from "../stoney/stoney.ts";
import { laminateOfStack } from "./laminate-of-stack.ts";
import type { StackFilm, StackInput } from "./model.ts";

/** A stack as a disc that bends alike in both directions. */
export type StackDisc = FreeWaferShapeInput & { linearCurvature: number };

/** What a free wafer with this stack does. Sagittas have the sign of the curvature. */
export interface StackEstimate {
  /** thin-film formula, films summed, parabola */
  stoney: { curvature: number; sagitta: number };
  /** laminate theory, small deflections, parabola */
  laminate: LaminateResult & { sagitta: number };
  shape: FreeWaferShape;
  disc: StackDisc;
  /** σ·h·coverage of each side at the temperature, N/m, tension positive */
  filmForce: { front: number; back: number };
}

/**
 * Stress of a film on thick silicon at a temperature (K) times the area that it covers, Pa: its own and what expansion has
 * added since its reference. This, on the film's thickness, is what pulls.
 */
export function coveredStress(film: StackFilm, temperature: number): number {
  const { youngsModulus, poissonsRatio, expansion, coverage = 1, referenceTemperature: from = ROOM_TEMPERATURE } = film;
  if (expansion === undefined || temperature === from) return film.stress * coverage;
  const thermal = mismatchStress({ youngsModulus, poissonsRatio, cte: expansion, from, to: temperature });
  return (film.stress + thermal) * coverage;
}

/**
 * Bow of a free wafer by Stoney, by laminate theory and as a plate beyond small deflections, gravity left out.
 * @throws EngineInputError naming the input
 */
export function estimateStack(stack: StackInput): StackEstimate {
  const radius = stack.wafer.diameter / 2;
  const { laminate, disc } = freeDisc(stack);
  const force = { front: 0, back: 0 };
  const pulling = atItsTemperature(stack);
  for (const { side, stress, thickness } of pulling.films) force[side] += filmForce({ stress, thickness });
  const curvature = thinFilmCurvature(pulling);
  return {
    stoney: { curvature, sagitta: bowFromCurvature({ curvature, radius }) },
    laminate: { ...laminate, sagitta: bowFromCurvature({ curvature: laminate.curvature, radius }) },
    shape: freeWaferShape(disc),
    disc,
    filmForce: force,
  };
}

/** The same pull of the films without their expansion, which no thickness of silicon changes. */
export function atItsTemperature({ wafer, films, temperature = ROOM_TEMPERATURE }: StackInput): StackInput {
  return {
    wafer,
    films: films.map((film) => ({
      ...film,
      stress: coveredStress(film, temperature),
      coverage: 1,
      expansion: undefined,
    })),
  };
}

/** Curvature of the stack by the thin-film formula, the films' parts added up, 1/m. */
export function thinFilmCurvature({ wafer, films, temperature = ROOM_TEMPERATURE }: StackInput): number {
  const biaxialModulus = siliconBiaxialModulus(wafer.orientation);
  let curvature = 0;
  for (const film of films) {
    const bend = stoneyCurvature({
      filmStress: coveredStress(film, temperature),
      filmThickness: film.thickness,
      substrateThickness: wafer.thickness,
      biaxialModulus,
    });
    curvature += film.side === "front" ? bend : -bend;
  }
  return curvature;
}

/** The stack as a laminate at its temperature, and the free disc that stands for it. */
export function freeDisc(stack: StackInput): { laminate: LaminateResult; disc: StackDisc } {
  const { wafer, temperature = ROOM_TEMPERATURE } = stack;
  const laminate = solveLaminate(laminateOfStack(stack), { temperature });
  return {
    laminate,
    disc: {
      ...siliconPlateConstants(wafer.orientation),
      radius: wafer.diameter / 2,
      thickness: laminate.effectiveThickness,
      linearCurvature: laminate.curvature,
      crystal: wafer.orientation,
    },
  };
}
