import type { EntityManager } from "@mikro-orm/postgresql";
import type { Film } from "#app/db/entities/film.ts";
import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { StackLayer } from "#app/db/entities/stack-layer.ts";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import type { SiteColumns } from "#app/engine/profile/map/fit-surface.ts";
import { thicknessFigures } from "#app/engine/profile/map/thickness-sites.ts";
import type { Estimate } from "#app/engine/profile/mistakes/scan-checks.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { stoneyStress } from "#app/engine/stoney/stoney.ts";
import type { FilmSubject } from "#app/lib/film-analysis/pair-points.ts";
import type { ScanParameters } from "#app/schemas/scan-result.ts";
import type { WaferMeasurementContent } from "#app/schemas/wafer.ts";

/** A thickness that differs by more than this share was measured on the wafer in another state. */
const SAME_STATE = 0.1;
/** Standard uncertainty of one thickness of a summary, m; common practice, no source. */
const GAUGE = 0.5e-6;

/** All that is known of a film that scans are of, beside the scans. */
export async function filmSubject(
  em: EntityManager,
  about: { film: Film | null; program: string; wafer: string | null; parameters: ScanParameters },
): Promise<FilmSubject> {
  const { film, program, wafer, parameters } = about;
  const measurements = wafer === null ? [] : await measurementsOf(em, wafer);
  return {
    parameters,
    film: film && {
      name: film.name,
      kind: film.kind,
      stress: film.stress,
      youngsModulus: film.youngsModulus.value,
      poissonsRatio: film.poissonsRatio.value,
    },
    usedAt: film && (await usedAt(em, film.id, program, parameters.filmThickness)),
    ...thicknessOf(measurements, parameters.siliconThickness),
    reduced: reducedOf(measurements, parameters),
  };
}

/** The newest measurement of each kind. */
async function measurementsOf(em: EntityManager, wafer: string): Promise<WaferMeasurementContent[]> {
  const found = await em.find(WaferMeasurement, { wafer }, { orderBy: { createdAt: "desc" } });
  return found.map(({ content }) => content);
}

/** The thickness at which the program's stacks and flows use a film, the one farthest from the monitor's; null for none. */
async function usedAt(em: EntityManager, film: string, program: string, monitor: number): Promise<number | null> {
  const layers = await em.find(StackLayer, { film, program });
  const steps = await em.find(FlowStepFilm, { film, program });
  const thicknesses = [...layers, ...steps]
    .flatMap(({ thickness }) => thickness?.value ?? [])
    .filter((value) => value > 0);
  const off = (value: number) => Math.abs(Math.log(value / monitor));
  return thicknesses.reduce<number | null>((far, value) => (far === null || off(value) > off(far) ? value : far), null);
}

function thicknessOf(
  measurements: readonly WaferMeasurementContent[],
  used: number,
): { measuredThickness: Estimate | null; thicknessSites: SiteColumns | null } {
  for (const content of measurements) {
    if (content.kind === "thickness map" && content.underneath === "nothing" && content.sites.length > 1) {
      const sites = {
        x: content.sites.map(({ x }) => x),
        y: content.sites.map(({ y }) => y),
        z: content.sites.map(({ thickness }) => thickness),
      };
      const { mean, standardDeviation } = thicknessFigures(sites);
      if (Math.abs(mean - used) < SAME_STATE * used)
        return { measuredThickness: { value: mean, standardUncertainty: standardDeviation }, thicknessSites: sites };
    }
    if (content.kind === "summary") {
      const value = content.figures.find(
        ({ quantity, statistic }) => quantity === "thickness" && (statistic === "mean" || statistic === "centre"),
      )?.value;
      if (typeof value === "number" && Math.abs(value - used) < SAME_STATE * used)
        return { measuredThickness: { value, standardUncertainty: GAUGE }, thicknessSites: null };
    }
  }
  return { measuredThickness: null, thicknessSites: null };
}

/** A stress that the tool has reduced by itself, and the same radii reduced here. */
function reducedOf(
  measurements: readonly WaferMeasurementContent[],
  { orientation, filmThickness, siliconThickness }: ScanParameters,
): FilmSubject["reduced"] {
  for (const content of measurements) {
    if (content.kind !== "reduced stress") continue;
    for (const row of content.stresses) {
      const { stress, curvatureBefore, curvatureAfter } = row;
      if (stress === null || curvatureBefore === null || curvatureAfter === null) continue;
      const recomputed = stoneyStress({
        filmThickness: row.filmThickness ?? filmThickness,
        substrateThickness: row.substrateThickness ?? siliconThickness,
        biaxialModulus: siliconBiaxialModulus(orientation),
        curvatureChange: curvatureAfter - curvatureBefore,
      });
      return { byTool: stress, recomputed };
    }
  }
  return null;
}
