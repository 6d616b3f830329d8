/* Workings of scans: they carry the figure of the calculation itself, name known equations and hold finite numbers. */
import { describe, expect, it } from "vitest";
import { EQUATIONS } from "#app/engine/equations.ts";
import { fitAzimuths } from "#app/engine/profile/azimuths.ts";
import { fitScan } from "#app/engine/profile/fit-scan.ts";
import { acceptedValue } from "#app/engine/profile/lot-figures/accepted-value.ts";
import { controlChart } from "#app/engine/profile/lot-figures/control-chart.ts";
import { predictedAgainstMeasured } from "#app/engine/profile/lot-figures/predicted-against-measured.ts";
import { acceptedValueWorking, controlLimitsWorking, parityWorking } from "#app/engine/profile/lot-figures/working.ts";
import { fitSurface } from "#app/engine/profile/map/fit-surface.ts";
import { shapeFigures } from "#app/engine/profile/map/shape-figures.ts";
import { surfaceHeight } from "#app/engine/profile/map/surface.ts";
import { shapeFiguresWorkings, surfaceWorking } from "#app/engine/profile/map/working.ts";
import { directionalFilmStress } from "#app/engine/profile/stress/directional-stress.ts";
import { stressBothWays } from "#app/engine/profile/stress/full-model.ts";
import { stressBudget } from "#app/engine/profile/stress/stress-budget.ts";
import {
  directionalStressWorking,
  fullStressWorking,
  stressBudgetWorking,
} from "#app/engine/profile/stress/working.ts";
import { referenceCheck, repeatabilityStudy } from "#app/engine/profile/tool/repeatability.ts";
import { referenceCheckWorking, repeatabilityWorking } from "#app/engine/profile/tool/working.ts";
import { azimuthsWorking, fitScanWorking } from "#app/engine/profile/working.ts";
import type { Working } from "#app/engine/working.ts";

const x = Float64Array.from({ length: 201 }, (_, n) => -0.09 + n * 9e-4);
const scan = { x, z: x.map((at, n) => 0.005 * at * at + 1e-8 * ((n * 5) % 11)) };
const scans = [0, 1, 2].map((n) => ({ ...scan, azimuth: (n * Math.PI) / 3 }));
const readings = scans.map(({ azimuth }) => ({
  azimuth,
  curvature: 0.01 + 0.001 * azimuth,
  standardUncertainty: 1e-4,
}));
const wafer = { radius: 0.1, edgeExclusion: 0.01 };
const surface = fitSurface({ ...wafer, scans });
const figures = { surface, radius: 0.1, waferThickness: 725e-6, gravity: "subtracted" } as const;
const film = { filmThickness: 1e-6, substrateThickness: 725e-6, orientation: "100" as const };
const full = { ...film, before: 0, after: 0.01, radius: 0.1 };
const directional = { ...film, change: { x: 0.01, y: 0.012, twist: 0.001 } };
const u = (standardUncertainty: number) => ({ standardUncertainty });
const budget = {
  ...film,
  biaxialModulus: 180e9,
  before: 0,
  after: 0.01,
  fit: u(1e-5),
  tool: { offset: u(1e-4), heightCalibration: u(0.002) },
  uncertainties: { substrateThickness: u(1e-6), biaxialModulus: u(1e9), filmThickness: u(1e-8) },
};
const repeats = [
  [1, 2, 3],
  [4, 5],
];
const values = [1, 2, 1, 3, 2, 1].map((value) => ({ value }));
const accepted = values.map(({ value }) => ({ value, standardUncertainty: 0.1 }));
const points = [1, 2, 3].map((predicted) => ({
  step: "a",
  predicted,
  measured: 1.1 * predicted,
  predictedUncertainty: 0.1,
  measuredUncertainty: 0.1,
}));
const reference = {
  known: { value: 45, standardUncertainty: 0.2 },
  readings: [45.1, 45.4, 45.2].map((value, at) => ({ at: at * 86_400, value })),
  toolUncertainty: 0.3,
};
const azimuths = fitAzimuths(readings);
const shape = shapeFigures(figures);

const cases: [string, Working | null, number | null][] = [
  ["fitScan", fitScanWorking(scan, wafer), fitScan(scan, wafer).expandedUncertainty],
  ["azimuths", azimuthsWorking(readings), azimuths.kind === "all directions" ? azimuths.major : null],
  ["surface", surfaceWorking({ ...wafer, scans }), surfaceHeight(surface, 0.09, 0) - surfaceHeight(surface, 0, 0)],
  ...shapeFiguresWorkings(figures).map((working, n): [string, Working, number] => [
    `shape ${n}`,
    working,
    [shape.bow, shape.bowBestFit, shape.warp, shape.sori][n]?.value ?? Number.NaN,
  ]),
  ["full model", fullStressWorking(full), stressBothWays(full).full],
  ["directional stress", directionalStressWorking(directional), directionalFilmStress(directional).principal.high],
  ["budget", stressBudgetWorking(budget), stressBudget(budget).expandedUncertainty],
  ["repeatability", repeatabilityWorking(repeats, "m"), repeatabilityStudy(repeats).forTwo],
  ["reference check", referenceCheckWorking(reference, "m"), referenceCheck(reference).bias],
  ["control limits", controlLimitsWorking(values, "Pa"), controlChart(values).limits.upper],
  ["accepted value", acceptedValueWorking(accepted, "Pa", 0.2), acceptedValue(accepted, 0.2).standardUncertainty],
  ["parity", parityWorking(points, "m"), predictedAgainstMeasured(points).all.bias],
];

describe("workings of scans", () => {
  it.each(cases)("%s carries the calculation's own figure and names known equations", (_, working, figure) => {
    expect(working?.result.value).toBeCloseTo(figure ?? Number.NaN, 12);
    for (const { equation, inputs, result } of working ? [working, ...(working.from ?? [])] : []) {
      expect(EQUATIONS).toHaveProperty(equation);
      for (const line of [...inputs, result]) {
        expect(Number.isFinite(line.value)).toBe(true);
        expect(line.meaning).not.toBe("");
      }
      const symbols = inputs.map(({ symbol }) => symbol);
      expect(new Set(symbols).size).toBe(symbols.length);
    }
  });

  it("there is none where there is no figure", () => {
    expect(azimuthsWorking(readings.slice(0, 1))).toBeNull();
    expect(fullStressWorking({ ...full, substrateThickness: 100e-6, after: 1 })).toBeNull();
  });
});
