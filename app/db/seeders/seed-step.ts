import type { Measured } from "#app/engine/measured.ts";
import { BLANK_HANDLING } from "#app/lib/blank-step.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { stressFor } from "./demo-stacks.ts";
import type { DemoStep } from "./demo-step.ts";
import { celsius, measured } from "./measured.ts";
import type { SeedLibrary } from "./seed-library.ts";

const um = (micrometres: number, share: number | null, source: Measured["source"], note = "") =>
  measured(micrometres * 1e-6, share === null ? null : micrometres * share * 1e-6, source, note);

/** A seeded step as it is typed: the library by id, SI, every number with its provenance. */
export function seedStep(step: DemoStep, library: SeedLibrary): StepValues {
  const { silicon, trim, bond, groundFaceForce: force, adds = [], removes = [] } = step;
  return {
    kind: step.kind,
    title: step.title,
    peakTemperature: celsius(step.peak),
    holdTime: step.minutes === undefined ? null : step.minutes * 60,
    equipment: library.tool(step.equipment).id,
    exposures: step.exposures ?? [],
    planned: step.planned,
    siliconAfter: silicon
      ? measured(silicon.thickness * 1e-6, silicon.tolerance * 1e-6, "supplier", "grinder specification")
      : null,
    trimWidth: trim ? measured(trim.width * 1e-3, 0.05e-3, "supplier") : null,
    trimDepth: trim ? measured(trim.depth * 1e-6, 10e-6, "supplier") : null,
    carrier: bond ? library.carrier(bond.carrier).id : null,
    bondingMaterial: bond ? library.material(bond.material).id : null,
    bondThickness: bond ? measured(bond.thickness * 1e-6, 2e-6, "supplier", "coater recipe") : null,
    groundFaceForce:
      force === undefined ? null : measured(force, Math.abs(force) / 2, "handbook", "common practice, no source"),
    tape: step.tape === undefined ? null : library.tape(step.tape).id,
    handling: { ...BLANK_HANDLING, ...step.handling },
    films: [
      ...removes.map(({ side, film }) => ({
        change: "removes" as const,
        side,
        film: library.film(film).id,
        thickness: null,
        stress: null,
        coverage: null,
      })),
      ...adds.map(({ side, film, thickness, stress, coverage }) => ({
        change: "adds" as const,
        side,
        film: library.film(film).id,
        thickness: um(thickness, 0.03, "measured here"),
        stress: stressFor(library.film(film), stress),
        coverage,
      })),
    ],
  };
}
