import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatWithUncertainty } from "#app/engine/units/format.ts";
import type { ShapeRegime } from "#app/engine/vocabulary.ts";
import type { ComparedGroup, ComparedRow } from "#app/schemas/comparison.ts";
import { comparedRow, type RowCell } from "../comparison/compared-row.ts";
import {
  bareFrom,
  lengthWords,
  limitWords,
  radiusWords,
  ratioWords,
  shapeWords,
  thicknessWords,
  warpWords,
} from "../stack-words.ts";
import { COMPARED_AT, type ComparedStack, type StackFigures, type WarpAt } from "./figures.ts";
import { atThickness, UNKNOWN } from "./rows.ts";

const REGIMES: Record<ShapeRegime, string> = {
  linear: "small bow",
  nonlinear: "beyond the linear range",
  curled: "curled about one axis",
};

/** Said in the place of a warp that means nothing any more. */
const ROLLED_UP = "rolled past half a turn";

/** What the free wafers do, as rows: shape at the temperature (in words), warp over thickness, and what it takes to lift them. */
export function figureGroups(
  stacks: readonly ComparedStack[],
  temperature: string,
  limits: SiteLimits,
): ComparedGroup[] {
  const first = stacks[0]?.figures ?? null;
  const row = (key: string, label: string, cellOf: (figures: StackFigures) => RowCell) =>
    comparedRow(key, label, stacks, ({ figures }) => (figures ? cellOf(figures) : UNKNOWN));
  return [
    {
      key: "shape",
      title: `Free wafer at its own thickness, ${temperature}`,
      rows: [
        row("bow", "Bow, device side up", bowCell),
        row("lies", "Lies", ({ estimated }) => ({ text: shapeWords(estimated.answer.shape, limits.flatWithin.value) })),
        row("warp", "Warp", (figures) => ({
          ...warpCell(figures.own, figures === first ? undefined : first?.own),
          ...(!figures.own.rolledUp && { text: warpWords(figures.estimated.answer.shape) }),
        })),
        row("regime", "Regime", ({ estimated: { answer } }) => ({
          text: REGIMES[answer.shape.regime],
          note: `${ratioWords(answer.shape.stability_ratio)} of the curling load`,
          same: answer.shape.regime,
        })),
        row("curls", "Curls", ({ estimated: { answer } }) => ({
          text: answer.curls_below_m === null ? "at no thickness" : `below ${limitWords(answer.curls_below_m)}`,
        })),
      ],
    },
    {
      key: "thinned",
      title: `Free wafer thinned, ${temperature}`,
      rows: COMPARED_AT.map((thickness, n): ComparedRow =>
        row(`at ${thickness}`, atThickness(thickness), (figures) =>
          warpCell(figures.warpAt[n], figures === first ? undefined : first?.warpAt[n]),
        ),
      ),
    },
    {
      key: "support",
      title: "Support to lift it",
      rows: [
        row("least", "Least thickness without support", ({ estimated }) => {
          const least = bareFrom(estimated, limits);
          return { text: least === null ? "no limit for this diameter" : limitWords(least) };
        }),
        row("support", "At its own thickness", ({ estimated: { request, answer } }) => ({
          text: answer.support.class ?? "cannot be judged",
          note: `judged at ${thicknessWords(request.wafer.thickness_m - (request.wafer.thickness_tolerance_m ?? 0))}`,
          same: answer.support.class,
        })),
      ],
    },
  ];
}

/** The signed bow with its expanded uncertainty, k = 2; a curled wafer has none. */
function bowCell({ estimated, bowUncertainty }: StackFigures): RowCell {
  const { shape } = estimated.answer;
  if (shape.regime === "curled" && shape.roll_radius_m !== null)
    return { text: "none, it rolls", note: `radius about ${radiusWords(shape.roll_radius_m)}` };
  return {
    text:
      bowUncertainty === null
        ? lengthWords(shape.bow_m, true)
        : formatWithUncertainty(shape.bow_m, 2 * bowUncertainty, "length", { sign: true }),
    note: shape.across ? `${lengthWords(shape.across.bow_m, true)} across that` : null,
  };
}

function warpCell(here: WarpAt | undefined, first: WarpAt | undefined): RowCell {
  if (!here) return UNKNOWN;
  if (here.rolledUp) return { text: ROLLED_UP };
  const apart = first && !first.rolledUp ? away(here.warp, first.warp) : null;
  const notes = [...(here.regime === "curled" ? ["curled"] : []), ...(apart ? [apart] : [])];
  return { text: lengthWords(here.warp), note: notes.length > 0 ? notes.join(", ") : null };
}

/** How far a warp is from the first stack's: '57 µm more'; null where there is nothing between them. */
function away(warp: number, first: number): string | null {
  if (lengthWords(warp) === lengthWords(first)) return null;
  return `${lengthWords(Math.abs(warp - first))} ${warp > first ? "more" : "less"}`;
}
