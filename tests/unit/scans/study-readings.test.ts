import { describe, expect, test } from "vitest";
import { RULES } from "#app/schemas/ranges.ts";
import { bowOfCurvature, curvatureOfBow, readTypedRepeats } from "#app/lib/study-readings.ts";
import { studyFault, studyResult } from "#app/lib/study-result.ts";

const bows = { typedAs: "bow", diameter: 0.2, rule: RULES.bow } as const;

test("a bow and its curvature lead to each other; a bowl has a negative bow and a positive curvature", () => {
  expect(curvatureOfBow(-50e-6, 0.2)).toBeCloseTo(0.01, 12);
  expect(bowOfCurvature(0.01, 0.2)).toBeCloseTo(50e-6, 12);
  expect(curvatureOfBow(0, 0.2)).toBe(0);
});

describe("typed repeats", () => {
  test("are read one a line with their units, blank lines passed over", () => {
    expect(readTypedRepeats("-45.2 µm\r\n\n  -45,4um\n−0.0451 mm", bows)).toEqual({
      ok: true,
      curvatures: [-45.2e-6, -45.4e-6, -45.1e-6].map((bow) => expect.closeTo(curvatureOfBow(bow, 0.2), 12) as number),
    });
    expect(readTypedRepeats("9.04 1/km", { ...bows, typedAs: "curvature", rule: RULES.curvature })).toEqual({
      ok: true,
      curvatures: [expect.closeTo(0.00904, 12)],
    });
  });

  test.each([
    ["a word", "-45.2 µm\nabout the same", /^Line 2: /],
    ["no unit", "-45.2", /^Line 1: /],
    ["a bow of a metre", "\n1 m", /^Line 2: .*outside −20 mm to 20 mm/],
    ["too many", "1 µm\n".repeat(201), /^201 readings/],
  ])("%s is refused with its line", (_, text, says) => {
    const read = readTypedRepeats(text, bows);
    expect(read.ok ? "" : read.fault).toMatch(says);
  });
});

describe("a study", () => {
  const of = (...curvatures: number[]) => curvatures.map((curvature) => ({ curvature, file: null }));

  test("says mean, scatter and what budgets take", () => {
    const result = studyResult(of(0.01, 0.0102, 0.0098, 0.01, 0.0101, 0.0099));
    expect(result.mean).toBeCloseTo(0.01, 12);
    expect(result.standardUncertainty).toBeCloseTo(Math.sqrt((2 * (0.0002 ** 2 + 0.0001 ** 2)) / 5), 12);
    expect(result.degreesOfFreedom).toBe(5);
    expect(result.forTwo / result.standardUncertainty).toBeCloseTo(1.32, 2);
    expect(result.remark).toMatch(/repeats are few/);
  });

  test("needs three repeats that differ", () => {
    expect(studyFault([])).toMatch(/^No repeat is too few/);
    expect(studyFault(of(1, 2))).toMatch(/^2 repeats are too few/);
    expect(studyFault(of(1, 1, 1))).toMatch(/equal to the last digit/);
    expect(studyFault(of(1, 1, 1.1))).toBeNull();
  });
});
