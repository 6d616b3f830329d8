import type { ComparedStack } from "#app/lib/stack-comparison/figures.ts";
import { stackFigures } from "#app/lib/stack-comparison/figures.ts";
import type { Measured } from "#app/engine/measured.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { coverRequest } from "#app/lib/stack-of-request.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import { answerEstimate } from "#app/services/estimate-answer.ts";

const measured = (value: number, tolerance: number | null = null): Measured => ({
  value,
  tolerance,
  source: "measured here",
  note: "",
  on: null,
});

type Layer = ComparedStack["layers"][number];

export const layer = (changes: Partial<Layer> & { MPa?: number; um?: number; tolerance?: number } = {}): Layer => {
  const { MPa = 200, um = 5, tolerance = null, ...rest } = changes;
  return {
    side: "front",
    filmId: "copper",
    filmName: "Plated copper A",
    thickness: measured(um * 1e-6, tolerance === null ? null : um * 0.03e-6),
    stress: measured(MPa * 1e6, tolerance === null ? null : tolerance * 1e6),
    coverage: 1,
    lines: null,
    ...rest,
  };
};

export const RANGE = { from: 20e-6, to: 725e-6 };

/** A stack on 200 mm silicon (001) with copper's elastic constants throughout. */
export function stack(
  letter: string,
  layers: Layer[],
  { um = 300, tolerance = null as number | null } = {},
): ComparedStack {
  const siliconThickness = measured(um * 1e-6, tolerance === null ? null : tolerance * 1e-6);
  const request: EstimateRequest = {
    wafer: {
      diameter_m: 0.2,
      orientation: "100",
      thickness_m: siliconThickness.value,
      thickness_tolerance_m: siliconThickness.tolerance ?? undefined,
    },
    films: layers.map((each) => ({
      side: each.side,
      thickness_m: each.thickness.value,
      stress_Pa: each.stress.value,
      youngs_modulus_Pa: 117e9,
      poissons_ratio: 0.34,
      cte_per_K: 16.7e-6,
      ...coverRequest(each),
      thickness_tolerance_m: each.thickness.tolerance ?? undefined,
      stress_tolerance_Pa: each.stress.tolerance ?? undefined,
    })),
    sweep: { from_m: RANGE.from, to_m: RANGE.to, points: 60 },
  };
  return {
    id: `id-${letter}`,
    letter,
    name: `Stack ${letter}`,
    program: { name: "Tern" },
    silicon: { name: "Silicon (001), 200 mm, 725 µm", diameter: 0.2, nominalThickness: 725e-6 },
    siliconThickness,
    layers,
    figures: stackFigures({ request, answer: answerEstimate(request, defaultLimits()) }),
  };
}
