import type { Equation } from "./equations/equation.ts";
import { CHUCK } from "./equations/chuck.ts";
import { DIE } from "./equations/die.ts";
import { DIRECTIONAL } from "./equations/directional.ts";
import { GRAVITY } from "./equations/gravity.ts";
import { HANDLING } from "./equations/handling.ts";
import { LAMINATE } from "./equations/laminate.ts";
import { METROLOGY } from "./equations/metrology.ts";
import { PLATE } from "./equations/plate.ts";
import { SILICON } from "./equations/silicon.ts";
import { STRENGTH } from "./equations/strength.ts";
import { THIN_FILM } from "./equations/thin-film.ts";

export type { Equation } from "./equations/equation.ts";

/** Every equation that a figure may rest on. The method page lists it; a `Working` names one by its key. */
export const EQUATIONS = {
  ...THIN_FILM,
  ...SILICON,
  ...LAMINATE,
  ...PLATE,
  ...METROLOGY,
  ...HANDLING,
  ...DIRECTIONAL,
  ...GRAVITY,
  ...CHUCK,
  ...STRENGTH,
  ...DIE,
} as const satisfies Record<string, Equation>;

/** Key of an equation. */
export type EquationId = keyof typeof EQUATIONS;
