/*
 * Each check for a mistake with a case that has it and one that has not.
 *
 *   κ   curvature 1/m     x  position, z height  m
 */
import { describe, expect, it } from "vitest";
import { findMistakes, judged, MISTAKES } from "#app/engine/profile/mistakes/find-mistakes.ts";
import type { ScanChecks } from "#app/engine/profile/mistakes/scan-checks.ts";
import { estimates, honestCase, type Honest } from "./honest-scan.ts";

type Scan = Honest["pre"];

/** An honest case with a change that is as expected within 2 %. */
const honest: Honest = (() => {
  const drawn = honestCase(20, 0);
  const change = drawn.change?.value ?? 0;
  return { ...drawn, expectedChange: { value: 1.02 * change, standardUncertainty: 0.05 * Math.abs(change) } };
})();

function stateOf(number: number, checks: ScanChecks) {
  const mistake = MISTAKES.find((m) => m.number === number);
  if (!mistake) throw new Error(`no check ${number}`);
  return judged(mistake, checks);
}

const columns = (scan: Scan) => ({ x: Float64Array.from(scan.x), z: Float64Array.from(scan.z) });
const changed = (scan: Scan, x: (x: number) => number, z: (z: number, x: number) => number): Scan => {
  const from = columns(scan);
  return { ...scan, x: from.x.map(x), z: from.z.map((height, n) => z(height, from.x[n] ?? 0)) };
};
const same = (value: number) => value;
const minus = (value: number) => -value;
/** Records say nothing, so that only the data speak. */
const silent = (checks: Honest): Honest => ({
  ...checks,
  pre: { ...checks.pre, at: null, azimuth: null },
  post: { ...checks.post, at: null, azimuth: null },
});
/** A wafer whose own shape beyond the parabola is plain to see. */
const shaped = (() => {
  const own = (z: number, x: number) => z + 6e-6 * (x / 0.1) ** 3 + 8e-6 * (x / 0.1) ** 4;
  return silent({
    ...honest,
    ...estimates({ pre: changed(honest.pre, same, own), post: changed(honest.post, same, own) }),
  });
})();
const withPost = (checks: Honest, post: Scan): Honest => ({ ...checks, ...estimates({ pre: checks.pre, post }) });
const wafer = { diameter: 0.3, thickness: 775e-6 };

const cases: [number, string, ScanChecks, ScanChecks][] = [
  [1, "by their times", { ...honest, pre: { ...honest.pre, at: 9e9 } }, honest],
  [1, "by the sign", { ...shaped, ...estimates({ pre: shaped.post, post: shaped.pre }) }, shaped],
  [2, "turned over the scan's line", withPost(shaped, changed(shaped.post, same, minus)), shaped],
  [2, "turned over the line across", withPost(shaped, changed(shaped.post, minus, minus)), shaped],
  [3, "180° by the shape", withPost(shaped, changed(shaped.post, minus, same)), shaped],
  [
    3,
    "90° by the records",
    { ...honest, post: { ...honest.post, azimuth: (honest.pre.azimuth ?? 0) + Math.PI / 2 } },
    honest,
  ],
  [
    3,
    "180° by the records",
    { ...honest, post: { ...honest.post, azimuth: (honest.pre.azimuth ?? 0) + Math.PI } },
    honest,
  ],
  [
    3,
    "90° by the shape",
    // Two lines of a wafer with nothing in common but the bow.
    withPost({ ...shaped, pre: wavy(shaped.pre, 8) }, wavy(shaped.post, 13)),
    shaped,
  ],
  [
    4,
    "said to be nominal",
    { wafer: { ...wafer, thicknessFrom: "nominal" } },
    { wafer: { ...wafer, thickness: 768.4e-6 } },
  ],
  [
    4,
    "other than measured",
    { wafer: { ...wafer, measured: { value: 768e-6, standardUncertainty: 0.5e-6 } } },
    { wafer: { ...wafer, measured: { value: 775.2e-6, standardUncertainty: 0.5e-6 } } },
  ],
  [5, "725 on 300 mm", { wafer: { ...wafer, thickness: 725e-6 } }, { wafer }],
  [6, "by the modulus", { biaxialModulus: 169e9 / 0.72, expectedModulus: 180.2e9 }, { biaxialModulus: 180.2e9 }],
  [
    6,
    "by the tool's stress",
    { reduced: { byTool: 130.2e6, recomputed: 100e6 } },
    { reduced: { byTool: 101e6, recomputed: 100e6 } },
  ],
  [
    7,
    "a slope",
    // The slope of each scan in place of its height.
    {
      ...honest,
      pre: changed(honest.pre, same, (_, x) => 0.001 * x + 1e-8 * Math.sin(x * 1e5)),
      post: changed(
        honest.post,
        same,
        (_, x) => (0.001 + (honest.expectedChange?.value ?? 0)) * x + 1e-8 * Math.sin(x * 1e5),
      ),
    },
    honest,
  ],
  [7, "left over by a fit", { ...honest, post: detrended(honest.post) }, honest],
  [8, "by its ends", { post: levelled(honest.post) }, { post: honest.post }],
  [
    9,
    "radius as diameter",
    { post: honest.post, wafer: { diameter: 0.1, thickness: 725e-6 } },
    { post: honest.post, wafer: { diameter: 0.2, thickness: 725e-6 } },
  ],
  [
    9,
    "bow four times",
    {
      change: { value: 0.04, standardUncertainty: 1e-4 },
      expectedChange: { value: 0.0101, standardUncertainty: 5e-4 },
    },
    {
      change: { value: 0.01, standardUncertainty: 1e-4 },
      expectedChange: { value: 0.0101, standardUncertainty: 5e-4 },
    },
  ],
  [
    10,
    "heights",
    { change: { value: 0.1, standardUncertainty: 1e-4 }, expectedChange: { value: 0.0101, standardUncertainty: 5e-4 } },
    {
      change: { value: 0.01, standardUncertainty: 1e-4 },
      expectedChange: { value: 0.0101, standardUncertainty: 5e-4 },
    },
  ],
  [
    10,
    "film thickness",
    { film: { thickness: 1e-7, expectedThickness: 1e-6 } },
    { film: { thickness: 1.2e-6, expectedThickness: 1e-6 } },
  ],
  [11, "a saddle", { azimuths: saddle(0.01, -0.008) }, { azimuths: saddle(0.01, 0.008) }],
  [
    12,
    "20 minutes after",
    { film: { thickness: 5e-6, cures: true, curedAt: 0 }, post: { ...honest.post, at: 1200 } },
    { film: { thickness: 5e-6, cures: true, curedAt: 0 }, post: { ...honest.post, at: 2e5 } },
  ],
  [13, "5 µm", { film: { thickness: 1e-6, usedAt: 5e-6 } }, { film: { thickness: 4.5e-6, usedAt: 5e-6 } }],
  [14, "4 March as 3 April", dated(4, 3), dated(3, 4)],
  [15, "from the last slot", { slots: slots(true) }, { slots: slots(false) }],
  [16, "a dip", { ...honest, post: notched(honest.post) }, honest],
];

function wavy(scan: Scan, waves: number): Scan {
  return changed(scan, same, (_, x) => {
    const t = (waves * x) / 0.1;
    return 0.003 * x * x + 3e-6 * (Math.sin(t) + Math.cos(t)) + 1e-8 * Math.sin(x * 1e5);
  });
}

function detrended(scan: Scan): Scan {
  const { x, z } = columns(scan);
  // By sums over all points, as a spreadsheet would.
  let rest = z;
  for (let pass = 0; pass < 3; pass += 1) {
    const t = x.map((at) => at / 0.1);
    const p2 = (() => {
      const mean = t.reduce((s, v) => s + v * v, 0) / t.length;
      return t.map((v) => v * v - mean);
    })();
    for (const p of [t.map(() => 1), t, p2]) {
      const share = rest.reduce((s, v, n) => s + v * (p[n] ?? 0), 0) / p.reduce((s, v) => s + v * v, 0);
      rest = rest.map((v, n) => v - share * (p[n] ?? 0));
    }
  }
  return { ...scan, x, z: rest };
}

function levelled(scan: Scan): Scan {
  const { x, z } = columns(scan);
  const [x0, x1, z0, z1] = [x[0] ?? 0, x.at(-1) ?? 1, z[0] ?? 0, z.at(-1) ?? 0];
  const line = z.map((height, n) => height - z0 - ((z1 - z0) * ((x[n] ?? 0) - x0)) / (x1 - x0));
  line[line.length - 1] = 0;
  return { ...scan, x, z: line };
}

function saddle(x: number, y: number) {
  return [0, 45, 90, 135].map((angle) => {
    const azimuth = (angle * Math.PI) / 180;
    return { azimuth, curvature: x * Math.cos(azimuth) ** 2 + y * Math.sin(azimuth) ** 2, standardUncertainty: 1e-4 };
  });
}

function dated(month: number, day: number): ScanChecks {
  return {
    date: {
      read: { year: 2024, month, day },
      earliest: { year: 2024, month: 3, day: 1 },
      latest: { year: 2024, month: 3, day: 20 },
    },
  };
}

function slots(reversed: boolean) {
  const expected = Array.from({ length: 25 }, (_, n) => n * 0.3 + Math.sin(n * n));
  const measured = expected.map((value, n) => value + 0.2 * Math.cos(n * 3));
  return expected.map((value, n) => ({
    expected: value,
    measured: (reversed ? measured.toReversed() : measured)[n] ?? 0,
  }));
}

function notched(scan: Scan): Scan {
  const end = columns(scan).x.at(-1) ?? 0;
  return changed(scan, same, (z, x) => (x > end - 0.0065 && x < end - 0.0045 ? z - 20e-6 : z));
}

describe("checks for mistakes", () => {
  it.each(cases)("%i is seen: %s", (number, _, made) => {
    const found = stateOf(number, made);
    expect(found.sentence).not.toBe("");
    expect(found.state, found.sentence).toBe("seen");
    expect(found.remedy).not.toBeNull();
    expect(found.sentence).toMatch(/[.]$/);
  });

  it.each(cases)("%i is not seen without it: %s", (number, _, __, without) => {
    const found = stateOf(number, without);
    expect(found.state, found.sentence).toBe("not seen");
    expect(found.remedy).toBeNull();
  });

  it("every one says that it cannot tell when nothing is there", () => {
    expect(findMistakes({}).map(({ state }) => state)).toEqual(MISTAKES.map(() => "cannot tell"));
    expect(MISTAKES.map(({ number }) => number)).toEqual(MISTAKES.map((_, n) => n + 1));
  });

  it("a scan too short for a fit makes those cannot tell, with the reason", () => {
    const short = { x: [0, 1, 2], z: [0, 0, 0] };
    const found = stateOf(16, { post: short });
    expect(found.state).toBe("cannot tell");
    expect(found.sentence).toMatch(/3 usable points are too few/);
  });

  it("a reversed sign alone leaves open whether the scans are swapped or one lay face down", () => {
    const faint = {
      change: { value: -0.01, standardUncertainty: 1e-5 },
      expectedChange: { value: 0.01, standardUncertainty: 5e-4 },
      before: { value: 0, standardUncertainty: 1e-5 },
    };
    expect(stateOf(1, faint).state).toBe("cannot tell");
    expect(stateOf(2, faint).state).toBe("cannot tell");
    expect(
      stateOf(2, {
        ...faint,
        before: { value: 0.005, standardUncertainty: 1e-5 },
        change: { value: -0.02, standardUncertainty: 1e-5 },
      }).state,
    ).toBe("seen");
  });
});
