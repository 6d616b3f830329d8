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

/** What a free wafer with this stack does. Sagittas have the sign of the curvature. */
export interface StackEstimate {
  /** thin-film formula, films summed, parabola */
  stoney: { curvature: number; sagitta: number };
  /** laminate theory, small deflections, parabola */
  laminate: LaminateResult & { sagitta: number };
  shape: FreeWaferShape;
  disc: FreeWaferShapeInput;
  /** σ·h·coverage of each side at the temperature, N/m, tension positive */
  filmForce: { front: number; back: number };
}

/** Stress of a film on thick silicon at a temperature (K), Pa: its own and what expansion has added since its reference. */
function stressAt(film: StackFilm, temperature: number): number {
  const reference = film.referenceTemperature ?? ROOM_TEMPERATURE;
  if (film.expansion === undefined || temperature === reference) return film.stress;
  const { youngsModulus, poissonsRatio, expansion } = film;
  return (
    film.stress +
    mismatchStress({
      youngsModulus,
      poissonsRatio,
      cte: expansion,
      from: reference,
      to: temperature,
    })
  );
}

/**
 * Bow of a free wafer by Stoney, by laminate theory and as a plate beyond small deflections, gravity left out.
 * @throws EngineInputError naming the input
 */
export function estimateStack(stack: StackInput): StackEstimate {
  const { wafer, films } = stack;
  const temperature = stack.temperature ?? ROOM_TEMPERATURE;
  const radius = wafer.diameter / 2;
  const solved = solveLaminate(laminateOfStack(stack), { temperature });
  const biaxialModulus = siliconBiaxialModulus(wafer.orientation);
  const force = { front: 0, back: 0 };
  let curvature = 0;
  for (const film of films) {
    const stress = stressAt(film, temperature) * (film.coverage ?? 1);
    const bend = stoneyCurvature({
      filmStress: stress,
      filmThickness: film.thickness,
      substrateThickness: wafer.thickness,
      biaxialModulus,
    });
    curvature += film.side === "front" ? bend : -bend;
    force[film.side] += filmForce({ stress, thickness: film.thickness });
  }
  const disc: FreeWaferShapeInput = {
    ...siliconPlateConstants(wafer.orientation),
    radius,
    thickness: solved.effectiveThickness,
    linearCurvature: solved.curvature,
    crystal: wafer.orientation,
  };
  return {
    stoney: { curvature, sagitta: bowFromCurvature({ curvature, radius }) },
    laminate: { ...solved, sagitta: bowFromCurvature({ curvature: solved.curvature, radius }) },
    shape: freeWaferShape(disc),
    disc,
    filmForce: force,
  };
}
