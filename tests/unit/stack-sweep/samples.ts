import { defaultLimits } from "#app/engine/rules/limits.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { answerOf, type SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { readAxis, type SweepAxis } from "#app/lib/stack-sweep/axis.ts";
import { sweepInputs, type SweepInput } from "#app/lib/stack-sweep/inputs.ts";
import { stackOf } from "#app/lib/stack-of-request.ts";
import type { ComparedInputs } from "#app/schemas/stack-comparison.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";

export const site = defaultLimits();

const exact = (value: number) => ({ value, tolerance: null, source: "supplier" as const });

const FILMS = [
  { side: "front", filmId: "oxide", filmName: "Oxide", thickness: 1e-6, stress: -120e6, modulus: 70e9, cte: 0.6e-6 },
  {
    side: "front",
    filmId: "copper",
    filmName: "Plated copper",
    thickness: 5e-6,
    stress: 160e6,
    modulus: 118e9,
    cte: 17e-6,
  },
  { side: "front", filmId: "polymer", filmName: "Polymer", thickness: 8e-6, stress: 30e6, modulus: 3.5e9, cte: 35e-6 },
  {
    side: "back",
    filmId: "copper",
    filmName: "Plated copper",
    thickness: 2e-6,
    stress: 150e6,
    modulus: 118e9,
    cte: 17e-6,
  },
] as const;

/** Four films on a 300 mm wafer, as it is stored and as the engine takes it. */
export const inputs: ComparedInputs = {
  id: "stack",
  name: "Four films",
  program: { name: "Tern" },
  silicon: { name: "300 mm (001)", diameter: 0.3, nominalThickness: 775e-6 },
  siliconThickness: exact(200e-6),
  layers: FILMS.map(({ side, filmId, filmName, thickness, stress }) => ({
    side,
    filmId,
    filmName,
    thickness: exact(thickness),
    stress: exact(stress),
    coverage: 1,
  })),
};

export const request: EstimateRequest = {
  wafer: { diameter_m: 0.3, thickness_m: 200e-6, orientation: "100" },
  films: FILMS.map(({ side, thickness, stress, modulus, cte }) => ({
    side,
    thickness_m: thickness,
    stress_Pa: stress,
    youngs_modulus_Pa: modulus,
    poissons_ratio: 0.3,
    cte_per_K: cte,
  })),
};

export const stack: StackInput = stackOf(request);

export const SILICON = "silicon";
export const COPPER_STRESS = "front copper 1 stress";

export const choices = sweepInputs(inputs, stack, 298.15);

export function inputOf(key: string): SweepInput {
  const found = choices.find((input) => input.key === key);
  if (!found) throw new Error(`no input ${key}`);
  return found;
}

export function axisOf(input: string, from = "", to = ""): SweepAxis {
  const { axis, faults } = readAxis({ input, from, to }, choices);
  if (!axis) throw new Error(JSON.stringify(faults));
  return axis;
}

export function answer(key: string): SweepAnswer {
  const found = answerOf(key);
  if (!found) throw new Error(`no answer ${key}`);
  return found;
}
