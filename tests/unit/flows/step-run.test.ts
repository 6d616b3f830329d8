/** Which machine, by which recipe, which side up: as rows, in words, and found again. */
import { describe, expect, it } from "vitest";
import { findSteps } from "#app/lib/find-steps.ts";
import { stepRows, type ShownStep } from "#app/lib/flow-rows.ts";
import { runWords } from "#app/lib/run-words.ts";
import { forLibrary, planWithCarrier, planWithPeak } from "#app/lib/step-edits.ts";
import { BLANK_HANDLING } from "#app/lib/blank-step.ts";
import { plannedStep } from "./planned-step.ts";

const shown = (overrides: Partial<ShownStep>): ShownStep => ({
  id: "id",
  kind: "measure",
  title: "Measure",
  peakTemperature: 298.15,
  holdTime: null,
  equipment: null,
  exposures: [],
  planned: "bare",
  siliconAfter: null,
  trimWidth: null,
  trimDepth: null,
  carrier: null,
  bondingMaterial: null,
  bondThickness: null,
  films: [],
  ...overrides,
});
const incoming = { value: 725e-6, tolerance: null, source: "supplier" as const };
const profile = [
  { time: 0, temperature: 298.15 },
  { time: 1800, temperature: 503.15 },
  { time: 3600, temperature: 298.15 },
];

const rows = stepRows(
  [
    shown({
      title: "Cure",
      kind: "cure",
      equipment: { name: "Cure oven" },
      handling: { machine: "oven 3", recipe: "PI-5" },
    }),
    shown({ title: "Bond", kind: "bond", planned: "carrier", carrier: { name: "Glass", identity: "K-12" } }),
    shown({ handling: { sideUp: "back side", profile }, peakTemperature: 503.15, holdTime: 87.8048780487805 }),
  ],
  incoming,
);

describe("a row of the step table", () => {
  it("says machine and recipe, the piece of the carrier, the side up and that it has a profile", () => {
    expect(rows.map(({ run, bond, sideUp, profiled }) => ({ run, bond, sideUp, profiled }))).toEqual([
      { run: "oven 3, recipe PI-5", bond: null, sideUp: null, profiled: false },
      { run: null, bond: "Glass, piece K-12", sideUp: null, profiled: false },
      { run: null, bond: "Glass", sideUp: "back side", profiled: true },
    ]);
    expect(rows[2]?.minutes?.replaceAll("\u00a0", " ")).toBe("1.46 min");
    expect(runWords({ recipe: "R 7" })).toBe("recipe R 7");
    expect(runWords({})).toBeNull();
  });

  it.each([
    ["oven 3", [1]],
    ["pi-5 cure", [1]],
    ["K-12", [2]],
    ["back side up", [3]],
    ["glass", [2, 3]],
    ["oven glass", []],
    ["  ", [1, 2, 3]],
  ])("is found by %j", (query, numbers) => {
    expect(findSteps(rows, query).map(({ number }) => number)).toEqual(numbers);
  });
});

describe("an edit of a stored step", () => {
  const handling = { ...BLANK_HANDLING, profile, carrierPiece: "piece" };
  const bonded = plannedStep({ kind: "bond", carrier: "glass", peakTemperature: 503.15, holdTime: 87.8, handling });

  it("stretches its profile to another peak", () => {
    const hotter = planWithPeak(bonded, 523.15);
    expect(hotter.peakTemperature).toBe(523.15);
    expect(hotter.handling.profile?.map(({ temperature }) => temperature)).toEqual([298.15, 523.15, 298.15]);
    const plain = plannedStep({ holdTime: 60 });
    expect(planWithPeak(plain, 400)).toEqual({ ...plain, peakTemperature: 400 });
  });

  it("lets go of the piece with its carrier, and in the library", () => {
    expect(planWithCarrier(bonded, "silicon")).toMatchObject({ carrier: "silicon", handling: { carrierPiece: null } });
    expect(planWithCarrier(bonded, "glass")).toBe(bonded);
    expect(forLibrary(bonded)).toMatchObject({ carrier: "glass", handling: { carrierPiece: null, profile } });
  });
});
