import { azimuthsWorking } from "#app/engine/profile/working.ts";
import type { CalendarDay } from "#app/engine/profile/mistakes/scan-checks.ts";
import { shapeFiguresWorkings } from "#app/engine/profile/map/working.ts";
import { directionalFilmStress } from "#app/engine/profile/stress/directional-stress.ts";
import { stressBothWays, type FullModelInput } from "#app/engine/profile/stress/full-model.ts";
import { gravityRemark } from "#app/engine/profile/stress/gravity-remark.ts";
import {
  directionalStressWorking,
  fullStressWorking,
  stressBudgetWorking,
} from "#app/engine/profile/stress/working.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import type { Working } from "#app/engine/working.ts";
import { MODULUS_UNCERTAINTY } from "#app/lib/modulus-uncertainty.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import type { BothStresses, FilmAnalysis } from "#app/schemas/film-analysis.ts";
import type { ScanParameters } from "#app/schemas/scan-result.ts";
import { budgetInput, budgetView } from "./budget.ts";
import { directionsFit, directionsView, meanOf, readingsOf } from "./directions.ts";
import { mistakesIn } from "./mistakes.ts";
import type { FilmSubject, PlacedPair } from "./pair-points.ts";
import { shapesOf } from "./shapes.ts";

/**
 * What the scans of one film on one wafer say: curvature in all directions, surface and its figures, stress by both relations and by
 * direction, its uncertainty, and what may have gone wrong. With a single pair it is what that line says.
 * @param today the day on which it is worked out: no scan can be later
 * @throws EngineInputError for no pair, or inputs out of range
 */
export function analyseFilm(pairs: readonly PlacedPair[], subject: FilmSubject, today: CalendarDay): FilmAnalysis {
  const { parameters } = subject;
  const [change, before, after] = (["change", "before", "after"] as const).map((of) =>
    directionsFit(pairs, of, parameters),
  ) as [ReturnType<typeof directionsFit>, ReturnType<typeof directionsFit>, ReturnType<typeof directionsFit>];
  const biaxialModulus = siliconBiaxialModulus(parameters.orientation);
  const mean = { before: meanOf(before).value, change: meanOf(change).value, biaxialModulus };
  const input = budgetInput(pairs, subject, mean, MODULUS_UNCERTAINTY);
  const budget = budgetView(input, pairs, subject);
  const full = fullModelInput(subject, mean);
  const directional =
    change.kind === "all directions"
      ? {
          change: change.curvature,
          filmThickness: parameters.filmThickness,
          substrateThickness: parameters.siliconThickness,
          orientation: parameters.orientation,
        }
      : null;
  const shape = shapesOf(pairs, subject);
  const workings: [string, Working | null][] = [
    ["Stress", fullStressWorking(full)],
    ["Its uncertainty", stressBudgetWorking(input)],
    ["Stress by direction", directional && directionalStressWorking(directional)],
    ["Change in all directions", azimuthsWorking(readingsOf(pairs, "change"))],
    ...("shapes" in shape
      ? shape.shapes.flatMap(({ view, input: shaped, figures }) =>
          shapeFiguresWorkings(shaped, figures).map((working): [string, Working] => [`Shape ${view.of}`, working]),
        )
      : []),
  ];
  return {
    stress: bothStresses(full, budget.expandedUncertainty),
    directional: directional && directionalView(directional),
    budget,
    directions: { change: directionsView(change), before: directionsView(before), after: directionsView(after) },
    shape: "shapes" in shape ? { ...shape, shapes: shape.shapes.map(({ view }) => view) } : shape,
    gravity: gravityWords(parameters),
    mistakes: mistakesIn(pairs, subject, today),
    workings: workings.flatMap(([of, working]) => (working ? [{ of, working: shownWorking(working) }] : [])),
  };
}

function fullModelInput(
  { parameters, film }: FilmSubject,
  { before, change }: { before: number; change: number },
): FullModelInput {
  return {
    before,
    after: before + change,
    radius: parameters.diameter / 2,
    substrateThickness: parameters.siliconThickness,
    orientation: parameters.orientation,
    filmThickness: parameters.filmThickness,
    ...(film && { film: { youngsModulus: film.youngsModulus, poissonsRatio: film.poissonsRatio } }),
  };
}

/** Both relations; the share of the uncertainty is the same, since they differ by a factor that is known far better. */
function bothStresses(input: FullModelInput, uncertainty: number): BothStresses {
  const { stoney, full, differs, sentence } = stressBothWays(input);
  const factor = stoney === 0 || full === null ? 1 : Math.abs(full / stoney);
  return {
    stoney: { value: stoney, uncertainty },
    full: full === null ? null : { value: full, uncertainty: factor * uncertainty },
    differs,
    sentence,
  };
}

function directionalView(input: Parameters<typeof directionalFilmStress>[0]) {
  const { stress, principal } = directionalFilmStress(input);
  return { x: stress.x, y: stress.y, shear: stress.xy, ...principal };
}

/** No record says how the wafer lay, so the usual case stands for it, and is named. */
function gravityWords({ diameter, siliconThickness, orientation }: ScanParameters): string {
  const { sentence } = gravityRemark({
    radius: diameter / 2,
    thickness: siliconThickness,
    orientation,
    support: { kind: "edge-ring" },
    taken: "two scans on the same support",
  });
  return `How the wafer lay is not recorded; if it lay on a ring both times: ${sentence.charAt(0).toLowerCase()}${sentence.slice(1)} The figures of a single scan have the sag in them.`;
}
