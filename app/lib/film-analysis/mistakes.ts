import { fromTolerance } from "#app/engine/measured.ts";
import { findMistakes } from "#app/engine/profile/mistakes/find-mistakes.ts";
import type { MistakeFinding } from "#app/engine/profile/mistakes/mistake.ts";
import type { CalendarDay, CheckedScan, Estimate, ScanChecks } from "#app/engine/profile/mistakes/scan-checks.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import type { MistakeView } from "#app/schemas/film-analysis.ts";
import { changeUncertainty, readingsOf } from "./directions.ts";
import type { FilmSubject, PlacedPair, PlacedPoints } from "./pair-points.ts";

/** What each check says of all pairs together: what was seen in one of them was seen. */
export function mistakesIn(pairs: readonly PlacedPair[], subject: FilmSubject, today: CalendarDay): MistakeView[] {
  const each = pairs.map((pair) => ({ pair, findings: findMistakes(checksOf(pair, pairs, subject, today)) }));
  const [first] = each;
  return (first?.findings ?? []).map((_, n) =>
    together(
      each.flatMap(({ pair, findings }) => {
        const finding = findings[n];
        return finding ? [{ label: pair.label, finding }] : [];
      }),
    ),
  );
}

const WEIGHT = { seen: 2, "cannot tell": 1, "not seen": 0 } as const;

function together(all: { label: string; finding: MistakeFinding }[]): MistakeView {
  const worst = all.reduce((a, b) => (WEIGHT[b.finding.state] > WEIGHT[a.finding.state] ? b : a));
  const { number, name, state, sentence, remedy, read } = worst.finding;
  const same = all.filter(({ finding }) => finding.state === state);
  return {
    number,
    name,
    state,
    sentence,
    remedy,
    read,
    where: all.length > 1 && state === "seen" && same.length < all.length ? same.map(({ label }) => label) : [],
  };
}

function checksOf(
  pair: PlacedPair,
  pairs: readonly PlacedPair[],
  subject: FilmSubject,
  today: CalendarDay,
): ScanChecks {
  const { parameters, film, usedAt, measuredThickness, reduced } = subject;
  const { result, points } = pair;
  const { sinceCure = null } = parameters;
  const post = points && scanOf(points.post, pair);
  // A file names the day at most: without it the clock begins with the scan.
  const at = post?.at ?? 0;
  const placed = pairs.filter(({ azimuth }) => azimuth !== null);
  return {
    pre: points && scanOf(points.pre, pair),
    post: post && (sinceCure === null ? post : { ...post, at }),
    edgeExclusion: parameters.edgeExclusion,
    change: { value: result.curvatureChange, standardUncertainty: changeUncertainty(pair) },
    expectedChange: expectedChange(subject, result.biaxialModulus),
    before: { value: result.curvatureBefore, standardUncertainty: changeUncertainty(pair) },
    wafer: {
      diameter: parameters.diameter,
      thickness: parameters.siliconThickness,
      thicknessFrom: parameters.siliconThicknessFrom ?? null,
      measured: measuredThickness,
    },
    expectedModulus: result.biaxialModulus,
    reduced,
    film: {
      thickness: parameters.filmThickness,
      usedAt,
      curedAt: sinceCure === null ? null : at - sinceCure,
      cures: film && film.kind !== "polymer" ? false : null,
    },
    azimuths: readingsOf(placed, "change"),
    date: points?.post.day ? { read: points.post.day, earliest: points.pre.day, latest: today } : null,
  };
}

function scanOf({ x, z, day }: PlacedPoints, { azimuth }: PlacedPair): CheckedScan {
  return { x, z, azimuth, at: day && Date.UTC(day.year, day.month - 1, day.day) / 1000 };
}

/** The change of curvature that the library's stress would make; none where its tolerance is not stated. */
function expectedChange({ film, parameters }: FilmSubject, biaxialModulus: number): Estimate | null {
  if (!film || film.stress.tolerance === null) return null;
  const { filmThickness, siliconThickness: substrateThickness } = parameters;
  const per = stoneyCurvature({ filmStress: 1, filmThickness, substrateThickness, biaxialModulus });
  return {
    value: per * film.stress.value,
    standardUncertainty: Math.abs(per) * fromTolerance(film.stress.tolerance),
  };
}
