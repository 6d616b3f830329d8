/*
 * The tables of free plates against shapes solved in full: several hundred stored ones at random loads between the tables' own
 * points (`fixtures/plate-shapes.json`, made by `npm run plate-table` with a finer basis than the tables'), and a handful made
 * anew here.
 *
 *   ν        Poisson's ratio
 *   S_cr     small-deflection curvature times R²/(4h) at which a plate becomes unstable
 *   bow, …   curvatures times R²/(4h); heights over 2 h
 *   major    along the axis that bends most; its errors are shares of the value
 *   minor    across it; errors are shares of the larger of the value itself and a tenth of the one along it
 */
import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { errorsByMaterial, type Errors } from "#app/engine/plate/generator/check.ts";
import { criticalByBisection } from "#app/engine/plate/generator/convergence.ts";
import { ratiosOf, solvedPoints, type OffGridPoint } from "#app/engine/plate/generator/off-grid.ts";
import { pointsOf } from "#app/engine/plate/generator/off-grid-fixture.ts";
import { ritzSpace } from "#app/engine/plate/generator/ritz-plate.ts";
import { isotropicPlate, siliconPlates } from "#app/engine/plate/plate.ts";
import { SHAPE_ERRORS } from "#app/engine/plate/table/errors.ts";
import { relative } from "../relative.ts";

const points = pointsOf(readFileSync("fixtures/plate-shapes.json", "utf8"));
const measured = Object.entries(errorsByMaterial(points)).flatMap(([material, classes]) =>
  Object.entries(classes).map(([sort, errors]) => [material, sort, errors] as const),
);

/** The bounds that the tables claim for one material and kind of load. */
function claimedFor(material: string, sort: string): Errors | undefined {
  const classes: Record<string, Record<string, unknown>> = SHAPE_ERRORS;
  return classes[material]?.[sort] as Errors | undefined;
}

describe("the tables between their own points", () => {
  it("are tried at several hundred loads, up to 20 times the onset and beyond, of either sign, and on silicon", () => {
    expect(points.length).toBeGreaterThan(500);
    expect(measured.map(([material, sort]) => `${material} ${sort}`).sort()).toEqual([
      "isotropic beyond",
      "isotropic equal",
      "isotropic held",
      "isotropic one sign",
      "isotropic opposite",
      "silicon100 equal",
      "silicon100 held",
      "silicon100 one sign",
      "silicon100 opposite",
      "silicon110 held",
      "silicon110 one sign",
      "silicon110 opposite",
    ]);
  });

  it.each(measured)("%s, %s: within the errors that they claim", (material, sort, errors) => {
    const claimed = claimedFor(material, sort);
    expect(claimed).toBeDefined();
    for (const [key, value] of Object.entries(errors) as [keyof Errors, number][]) {
      if (key === "points") expect(value).toBe(claimed?.points);
      else expect(value, key).toBeLessThanOrEqual(claimed?.[key] ?? 0);
    }
  });

  it.each(measured)(
    "%s, %s: bow, curvatures along the roll, three-point bow and warp within 0.5 %",
    (_, __, errors) => {
      for (const key of [
        "bowMajor",
        "bowMinor",
        "centreMajor",
        "parabolaMajor",
        "parabolaMinor",
        "threePoint",
        "warp",
      ] as const) {
        expect(errors[key], key).toBeLessThan(0.005);
      }
    },
  );
});

/** The stored point of a material and kind with the least load beyond the onset. */
function leastLoaded(material: "" | "100", sort: OffGridPoint["class"]): OffGridPoint {
  const size = ({ load }: OffGridPoint) => Math.abs(load.x + load.y) + Math.abs(load.x - load.y);
  const [found] = points
    .filter(({ kind, class: own }) => own === sort && (kind.crystal ? (kind.axes ?? "100") : "") === material)
    .filter((point) => size(point) > 4)
    .sort((a, b) => size(a) - size(b));
  if (!found) throw new RangeError("no such point");
  return found;
}

describe("the generator makes the stored shapes anew", () => {
  // Enough polynomials for loads of a few times the onset.
  const space = ritzSpace("even", 14);

  it.each([
    ["", "equal"],
    ["", "one sign"],
    ["", "opposite"],
    ["100", "one sign"],
    ["100", "opposite"],
  ] as const)(
    "material '%s', %s, at the least load stored, to 1 part in 2000 with fewer polynomials",
    (material, sort) => {
      const point = leastLoaded(material, sort);
      const [made] = solvedPoints(space, point.kind, sort, point.load);
      const size = Math.max(Math.abs(point.bow.x), Math.abs(point.bow.y));
      for (const key of ["bow", "centre", "parabola"] as const) {
        expect(Math.abs((made?.[key].x ?? NaN) - point[key].x)).toBeLessThan(5e-4 * size);
        expect(Math.abs((made?.[key].y ?? NaN) - point[key].y)).toBeLessThan(5e-4 * size);
      }
      expect(Math.abs((made?.rim ?? NaN) - point.rim)).toBeLessThan(5e-4 * size);
      expect(relative(made?.warp, point.warp)).toBeLessThan(5e-4);
    },
  );

  it.each([0, 0.16, 0.28, 0.45])("the loads at which a bowl rolls and a saddle snaps, ν = %d", (poissonsRatio) => {
    const plate = isotropicPlate(poissonsRatio);
    const ratios = ratiosOf({ poissonsRatio });
    expect(relative(plate.criticalLoad, criticalByBisection(10, ratios, "bowl"))).toBeLessThan(SHAPE_ERRORS.onset.bowl);
    expect(relative(plate.saddleLoad, criticalByBisection(10, ratios, "saddle"))).toBeLessThan(
      SHAPE_ERRORS.onset.saddle,
    );
    expect(SHAPE_ERRORS.onset.bowl).toBeLessThan(0.0005);
    expect(SHAPE_ERRORS.onset.saddle).toBeLessThan(0.005);
  });

  it("the load at which a bowl of silicon (001) rolls", () => {
    const ratios = ratiosOf({ poissonsRatio: 0.28, crystal: "100" });
    const made = criticalByBisection(10, ratios, "bowl");
    expect(relative(siliconPlates().soft.criticalLoad, made)).toBeLessThan(SHAPE_ERRORS.onset.bowl);
  });
});
