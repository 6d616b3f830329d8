import type { StackInput } from "#app/engine/stack/model.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import type { CutFilm } from "./film-cut.ts";

/** What a request says of the area that a film covers. */
export const coverRequest = ({
  coverage,
  lines,
}: CutFilm): Pick<EstimateRequest["films"][number], "coverage" | "lines"> => ({
  coverage,
  ...(lines && { lines: { width_m: lines.width, direction_rad: lines.direction } }),
});

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
      lines: film.lines && { width: film.lines.width_m, direction: film.lines.direction_rad },
      thicknessTolerance: film.thickness_tolerance_m,
      stressTolerance: film.stress_tolerance_Pa,
    })),
    temperature: temperature_K,
  };
}
