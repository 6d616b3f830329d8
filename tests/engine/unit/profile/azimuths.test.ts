/*
 *   θ         azimuth                                 rad
 *   kx ky t   curvatures of w = kx x²/2 + ky y²/2 + t x y   1/m
 */
import { describe, expect, it } from "vitest";
import { curvatureAlong, fitAzimuths, ONE_LINE, type AzimuthReading } from "#app/engine/profile/azimuths.ts";
import { faceUpScan, lineAzimuth, pairScans } from "#app/engine/profile/orient-scan.ts";

const degrees = (angle: number) => (angle * Math.PI) / 180;
const read = (shape: { x: number; y: number; twist: number }, angles: number[], u = 1e-5): AzimuthReading[] =>
  angles.map((angle) => ({
    azimuth: degrees(angle),
    curvature: curvatureAlong(shape, degrees(angle)),
    standardUncertainty: u,
  }));

function allDirections(readings: AzimuthReading[], curledFrom?: number) {
  const fit = fitAzimuths(readings, curledFrom);
  if (fit.kind !== "all directions") throw new Error(fit.kind);
  return fit;
}

describe("fitAzimuths", () => {
  it("finds principal curvatures, their axis and the word", () => {
    // 0.02 along 30°, −0.01 across it.
    const [c, s] = [Math.cos(degrees(30)), Math.sin(degrees(30))];
    const shape = { x: 0.02 * c * c - 0.01 * s * s, y: 0.02 * s * s - 0.01 * c * c, twist: 0.03 * c * s };
    const fit = allDirections(read(shape, [0, 60, 120]));
    expect(fit.word).toBe("saddle");
    expect(fit.major).toBeCloseTo(0.02, 12);
    expect(fit.minor).toBeCloseTo(-0.01, 12);
    expect(fit.majorAngle).toBeCloseTo(degrees(30), 10);
    expect(fit.mean).toBeCloseTo(0.005, 12);
    expect(fit.angleUncertainty).toBeLessThan(degrees(0.1));
  });

  it.each<[string, { x: number; y: number; twist: number }, number | undefined]>([
    ["bowl", { x: 0.01, y: 0.012, twist: 0.001 }, undefined],
    ["dome", { x: -0.01, y: -0.012, twist: 0.001 }, undefined],
    ["saddle", { x: -0.02, y: 0.011, twist: 0 }, undefined],
    ["curled", { x: 0.3, y: 0.001, twist: 0 }, 0.2],
    ["flat", { x: 1e-5, y: -1e-5, twist: 0 }, undefined],
  ])("says %s", (word, shape, curledFrom) => {
    expect(allDirections(read(shape, [0, 45, 90, 135]), curledFrom).word).toBe(word);
  });

  it("a dome's larger curvature lies along its own axis", () => {
    const fit = allDirections(read({ x: -0.01, y: -0.03, twist: 0 }, [0, 60, 120]));
    expect(fit.major).toBeCloseTo(-0.03, 12);
    expect(Math.abs(fit.majorAngle)).toBeCloseTo(Math.PI / 2, 10);
  });

  it("uncertainties follow from the readings; three at 60°", () => {
    const fit = allDirections(read({ x: 0.01, y: 0.01, twist: 0 }, [0, 60, 120], 3e-5));
    // The mean of three readings spread evenly.
    expect(fit.meanUncertainty).toBeCloseTo(3e-5 / Math.sqrt(3), 12);
    expect(fit.angleUncertainty).toBe(Math.PI / 2);
  });

  it("widens them where the readings disagree", () => {
    const readings = read({ x: 0.01, y: 0.01, twist: 0 }, [0, 45, 90, 135], 1e-6).map((reading, n) => ({
      ...reading,
      curvature: reading.curvature + (n % 2 ? 5e-5 : -5e-5) * (n < 2 ? 1 : -1),
    }));
    const calm = allDirections(read({ x: 0.01, y: 0.01, twist: 0 }, [0, 45, 90, 135], 1e-6));
    const spread = allDirections(
      readings.map((reading, n) => ({
        ...reading,
        curvature: reading.curvature + ([3e-5, -1e-5, -2e-5, 5e-5][n] ?? 0),
      })),
    );
    expect(spread.chiSquare).toBeGreaterThan(10);
    expect(spread.meanUncertainty).toBeGreaterThan(5 * calm.meanUncertainty);
  });

  it("says what fewer lines cannot show", () => {
    expect(fitAzimuths(read({ x: 0.01, y: -0.01, twist: 0 }, [0]))).toMatchObject({
      kind: "one line",
      sentence: ONE_LINE,
    });
    // The same line run the other way is no second one.
    expect(fitAzimuths(read({ x: 0.01, y: -0.01, twist: 0 }, [0, 180])).kind).toBe("one line");
    const two = fitAzimuths(read({ x: 0.01, y: -0.03, twist: 0.02 }, [10, 100]));
    expect(two.kind).toBe("mean only");
    if (two.kind === "mean only") expect(two.mean).toBeCloseTo(-0.01, 12);
    expect(fitAzimuths(read({ x: 0.01, y: 0, twist: 0 }, [0, 40])).kind).toBe("one line");
    expect(() => fitAzimuths([])).toThrow(/at least one scan/);
  });
});

describe("how a scan lay", () => {
  const scan = { x: [-1, 0, 2], z: [5, 0, 7], azimuth: degrees(20) };
  const rows = ({ x, z }: { x: ArrayLike<number>; z: ArrayLike<number> }) => Array.from(x, (at, n) => [at, z[n]]);

  it("device side up along its azimuth stays as it is", () => {
    expect(faceUpScan(scan, { up: "device side" })).toEqual(scan);
    expect(lineAzimuth(degrees(-10))).toBeCloseTo(degrees(170), 12);
  });

  it("run the other way, x is reversed", () => {
    const turned = faceUpScan({ ...scan, azimuth: degrees(200) }, { up: "device side" });
    expect(turned.azimuth).toBeCloseTo(degrees(20), 12);
    expect(rows(turned)).toContainEqual([-2, 7]);
  });

  it("back side up turns heights over, and x when turned over the line across", () => {
    expect(rows(faceUpScan(scan, { up: "back side", turnedOver: "along the scan" }))).toContainEqual([2, -7]);
    expect(rows(faceUpScan(scan, { up: "back side", turnedOver: "across the scan" }))).toContainEqual([-2, -7]);
  });

  it("pairs scans by wafer and line; the rest wait", () => {
    const place = (wafer: string, angle: number) => ({ wafer, azimuth: degrees(angle) });
    const pre = [place("A 1", 0), place("A 1", 90), place("A 2", 0), place("A 3", 0)];
    const post = [place("A 2", 181), place("A 1", 91), place("A 1", 0.5), place("A 4", 0)];
    const { pairs, waiting } = pairScans(pre, post);
    expect(pairs.map(({ pre: a, post: b }) => [pre.indexOf(a), post.indexOf(b)])).toEqual([
      [0, 2],
      [1, 1],
      [2, 0],
    ]);
    expect(waiting.pre).toEqual([pre[3]]);
    expect(waiting.post).toEqual([post[3]]);
  });
});
