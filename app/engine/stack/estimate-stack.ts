import type { DirectionalLayer } from "../directional/layer.ts";
import { addTensor, type PlaneTensor } from "../directional/plane-stiffness.ts";
import { principalCurvatures, solveDirectionalLaminate } from "../directional/solve-directional-laminate.ts";
import { solveLaminate, type LaminateResult } from "../laminate/solve-laminate.ts";
import { mismatchStress } from "../laminate/mismatch-stress.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { directionalStoneyCurvature } from "../patterned/directional-stoney.ts";
import { linesPattern, type FilmLines } from "../patterned/pattern.ts";
import { patternedFilm, type PatternedFilmInput } from "../patterned/patterned-film.ts";
import { freeWaferShape, type FreeWaferShape, type FreeWaferShapeInput } from "../plate/free-wafer-shape.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { nearestAxes } from "../silicon/nearest-axes.ts";
import { siliconDirectionalConstants, siliconPlateConstants } from "../silicon/plane-constants.ts";
import { bowFromCurvature } from "../stoney/bow.ts";
import { filmForce } from "../stoney/film-force.ts";
import { stoneyCurvature } from "../stoney/stoney.ts";
import { directionalLaminateOfStack, laminateOfStack } from "./laminate-of-stack.ts";
import type { StackFilm, StackInput } from "./model.ts";

/**
 * A stack as a disc. Its directions are apart, along the axes of the largest and the smallest curvature, where a film is cut in
 * lines.
 */
export type StackDisc = FreeWaferShapeInput;

/** What a free wafer with this stack does. Sagittas have the sign of the curvature. */
export interface StackEstimate {
  /** thin-film formula, films summed, parabola; along the axis that it bends most where the directions differ */
  stoney: { curvature: number; sagitta: number };
  /** laminate theory, small deflections; `sagitta` is the parabola's along the axis that bends most */
  laminate: LaminateResult & { sagitta: number };
  /** both directions of the laminate apart, where a film is cut in lines */
  unequal: UnequalLaminate | null;
  shape: FreeWaferShape;
  disc: StackDisc;
  /** σ·h·coverage of each side at the temperature, N/m, tension positive; of lines the mean of along and across */
  filmForce: {
    front: number;
    back: number;
    /** of each film, in the order of the stack's */
    films: number[];
  };
}

/** The laminate of a stack whose directions differ. */
export interface UnequalLaminate {
  layers: DirectionalLayer[];
  /** larger curvature, the other, 1/m, and the angle of the first from x (the notch axis), rad */
  principal: { major: number; minor: number; angle: number };
}

/**
 * Stress of a film on thick silicon at a temperature (K), Pa, before it is cut into a pattern: its own and what expansion has added
 * since its reference.
 */
export function blanketStress(film: StackFilm, temperature: number): number {
  const { youngsModulus, poissonsRatio, expansion, referenceTemperature: from = ROOM_TEMPERATURE } = film;
  if (expansion === undefined || temperature === from) return film.stress;
  return film.stress + mismatchStress({ youngsModulus, poissonsRatio, cte: expansion, from, to: temperature });
}

/**
 * Bow of a free wafer by Stoney, by laminate theory and as a plate beyond small deflections, gravity left out.
 * @throws EngineInputError naming the input
 */
export function estimateStack(stack: StackInput): StackEstimate {
  const radius = stack.wafer.diameter / 2;
  const { laminate, unequal, disc } = freeDisc(stack);
  const pulling = atItsTemperature(stack);
  const force = { front: 0, back: 0, films: pulling.films.map(meanPull) };
  pulling.films.forEach(({ side }, index) => (force[side] += force.films[index] ?? 0));
  const curvature = thinFilmCurvature(pulling);
  const steepest = unequal?.principal.major ?? laminate.curvature;
  return {
    stoney: { curvature, sagitta: bowFromCurvature({ curvature, radius }) },
    laminate: { ...laminate, sagitta: bowFromCurvature({ curvature: steepest, radius }) },
    unequal,
    shape: freeWaferShape(disc),
    disc,
    filmForce: force,
  };
}

/** The same pull of the films without their expansion, which no thickness of silicon changes. */
export function atItsTemperature({ wafer, films, temperature = ROOM_TEMPERATURE }: StackInput): StackInput {
  return {
    wafer,
    films: films.map((film) => ({ ...film, stress: blanketStress(film, temperature), expansion: undefined })),
  };
}

/** Force of a film per width of wafer by direction, N/m, tension positive, at its reference temperature. */
export function pullOf(film: StackFilm): PlaneTensor {
  const { stress, thickness, coverage = 1, lines } = film;
  if (lines) return patternedFilm(patternedOf(film, lines)).force;
  const both = filmForce({ stress, thickness, coverage });
  return { x: both, y: both, xy: 0 };
}

function meanPull(film: StackFilm): number {
  const { x, y } = pullOf(film);
  return (x + y) / 2;
}

/** A film in lines as the functions of patterned films take it. */
export function patternedOf(film: StackFilm, lines: FilmLines): PatternedFilmInput {
  const { stress, thickness, youngsModulus, poissonsRatio, coverage = 1 } = film;
  return { stress, thickness, youngsModulus, poissonsRatio, pattern: linesPattern(lines, coverage) };
}

/**
 * Curvature of the stack by the thin-film formula, the films' parts added up, 1/m: along the axis that bends most where the
 * directions differ.
 */
export function thinFilmCurvature(stack: StackInput): number {
  const pulling = atItsTemperature(stack);
  if (pulling.films.some(({ lines }) => lines)) return unequalThinFilm(pulling).curvature;
  const { wafer, films } = pulling;
  const biaxialModulus = siliconBiaxialModulus(wafer.orientation);
  let curvature = 0;
  for (const { side, stress, coverage = 1, thickness } of films) {
    const bend = stoneyCurvature({
      filmStress: stress * coverage,
      filmThickness: thickness,
      substrateThickness: wafer.thickness,
      biaxialModulus,
    });
    curvature += side === "front" ? bend : -bend;
  }
  return curvature;
}

/** The thin-film formula where directions differ: what goes into it along the axes of the films' forces, and what is larger. */
export function unequalThinFilm(stack: StackInput) {
  const { wafer, films } = atItsTemperature(stack);
  let force: PlaneTensor = { x: 0, y: 0, xy: 0 };
  for (const film of films) force = addTensor(force, pullOf(film), film.side === "front" ? 1 : -1);
  const { major, minor, angle } = principalCurvatures(force.x, force.y, force.xy);
  const input = {
    force: { x: major, y: minor },
    substrateThickness: wafer.thickness,
    ...(wafer.orientation === "100"
      ? siliconDirectionalConstants(nearestAxes(angle))
      : siliconPlateConstants(wafer.orientation)),
  };
  const { x, y } = directionalStoneyCurvature(input);
  const axis: "x" | "y" = Math.abs(x) >= Math.abs(y) ? "x" : "y";
  return { input, axis, curvature: axis === "x" ? x : y };
}

/** The stack as a laminate at its temperature, of equal directions and with both apart, and the free disc that stands for it. */
export function freeDisc(stack: StackInput): {
  laminate: LaminateResult;
  unequal: UnequalLaminate | null;
  disc: StackDisc;
} {
  const { wafer, temperature = ROOM_TEMPERATURE } = stack;
  const laminate = solveLaminate(laminateOfStack(stack), { temperature });
  const layers = directionalLaminateOfStack(stack);
  const apart = layers && solveDirectionalLaminate(layers, { temperature });
  return {
    laminate,
    unequal: apart && { layers, principal: apart.principal },
    disc: {
      ...siliconPlateConstants(wafer.orientation),
      radius: wafer.diameter / 2,
      thickness: apart?.effectiveThickness ?? laminate.effectiveThickness,
      linearCurvature: apart ? { x: apart.principal.major, y: apart.principal.minor } : laminate.curvature,
      crystal: wafer.orientation,
      ...(apart && { axes: nearestAxes(apart.principal.angle) }),
    },
  };
}
