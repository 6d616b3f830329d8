import { describe, expect, it } from "vitest";
import { answerEstimate } from "#app/services/estimate-answer.ts";
import type { SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { valueAt } from "#app/lib/stack-sweep/axis.ts";
import { sweptFigures } from "#app/lib/stack-sweep/figures.ts";
import { levelsOf } from "#app/lib/stack-sweep/levels.ts";
import { levelLines, MAP_CELLS, mapValues, regionAbove, sweptMap } from "#app/lib/stack-sweep/map.ts";
import { answer, axisOf, COPPER_STRESS, request, SILICON, site, stack } from "./samples.ts";

const [x, y] = [axisOf(SILICON, "40 um", "775 um"), axisOf(COPPER_STRESS, "-100 MPa", "400 MPa")];
const map = sweptMap(stack, x, y);
const side = MAP_CELLS + 1;
/** px of a map on the widest screen */
const [WIDTH, HEIGHT] = [780, 520];

describe("a map", () => {
  it("has at every place what an estimate of that stack alone says, to the last digit", () => {
    const [warps, bows] = [mapValues(map, answer("warp")), mapValues(map, answer("bow"))];
    let place = 17;
    for (let n = 0; n < 60; n += 1) {
      place = (place * 1103 + 12_345) % (side * side);
      const [column, row] = [place % side, Math.floor(place / side)];
      const films = request.films.map((film, at) =>
        at === 1 ? { ...film, stress_Pa: valueAt(y, row / MAP_CELLS) } : film,
      );
      const wafer = { ...request.wafer, thickness_m: valueAt(x, column / MAP_CELLS) };
      const { shape } = answerEstimate({ wafer, films }, site);
      const figures = map.places[place]?.figures;
      expect(figures?.load).toBe(shape.stability_ratio);
      expect(figures?.warp).toBe(shape.warp_m);
      expect(warps[place] ?? shape.warp_m).toBe(shape.warp_m);
      expect(bows[place]).toBe(shape.regime === "curled" ? null : shape.bow_m);
    }
  });

  it.each(["warp", "bow", "along", "stress", "load"])(
    "has lines of %s within half a pixel of the full model",
    (key) => {
      const asked = answer(key);
      const levels = levelsOf(mapValues(map, asked));
      expect(levels.length).toBeGreaterThan(4);
      for (const level of levels) {
        const points = levelLines(map, { of: asked.field, folded: asked.folded ?? false }, level).flat();
        const some = points.filter((_, n) => n % 7 === 0);
        expect(some.filter((point) => !turnsWithin(0.5, asked, level, point))).toEqual([]);
      }
    },
  );

  it("has outlines of what is curled that are closed and hold every curled place", () => {
    const outlines = regionAbove(map, { of: ({ load }) => load, folded: true }, 1);
    for (const outline of outlines) expect(outline.at(0)).toEqual(outline.at(-1));
    map.places.forEach(({ figures }, place) => {
      const at = { x: (place % side) / MAP_CELLS, y: Math.floor(place / side) / MAP_CELLS };
      // On its very edge a place is on neither side.
      if (at.x === 0 || at.x === 1 || at.y === 0 || at.y === 1) return;
      expect(isInside(outlines, at)).toBe((figures?.load ?? 0) > 1);
    });
  });
});

/** Whether the full model passes a level within so many px of a point on a side of a cell, along that side. */
function turnsWithin(
  px: number,
  asked: SweepAnswer,
  level: number,
  { x: alongX, y: alongY }: { x: number; y: number },
) {
  const isOnColumn = Math.abs(alongX * MAP_CELLS - Math.round(alongX * MAP_CELLS)) < 1e-9;
  // Both lines of a folded answer may lie within a pixel: each is told by the side that it bends to.
  return ([1, -1] as const).some((way) => {
    const [before, after] = [-px, px].map((move) => {
      const there = isOnColumn
        ? map.stackAt(alongX, alongY + move / HEIGHT)
        : map.stackAt(alongX + move / WIDTH, alongY);
      const figures = sweptFigures(there);
      return (asked.folded ? way * figures.side : 1) * (asked.field(figures) ?? NaN) - level;
    });
    return (before ?? NaN) * (after ?? NaN) <= 0;
  });
}

function isInside(outlines: readonly (readonly { x: number; y: number }[])[], at: { x: number; y: number }): boolean {
  let inside = false;
  for (const outline of outlines)
    outline.forEach((one, n) => {
      const other = outline[n + 1];
      if (!other || one.y > at.y === other.y > at.y) return;
      if (at.x < one.x + ((at.y - one.y) / (other.y - one.y)) * (other.x - one.x)) inside = !inside;
    });
  return inside;
}
