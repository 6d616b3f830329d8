import type { StackInput } from "#app/engine/stack/model.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";

/** The engine's view of a request. */
export function stackOf({ wafer, films, temperature_K }: EstimateRequest): StackInput {
  return {
    wafer: {
      diameter: wafer.diameter_m,
      orientation: wafer.orientation,
      thickness: wafer.thickness_m,
      thicknessTolerance: wafer.thickness_tolerance_m,
    },
    films: films.map((film) => ({
      side: film.side,
      thickness: film.thickness_m,
      stress: film.stress_Pa,
      youngsModulus: film.youngs_modulus_Pa,
      poissonsRatio: film.poissons_ratio,
      expansion: film.cte_per_K,
      referenceTemperature: film.reference_temperature_K,
      coverage: film.coverage,
      thicknessTolerance: film.thickness_tolerance_m,
      stressTolerance: film.stress_tolerance_Pa,
    })),
    temperature: temperature_K,
  };
}
