/*
 *   kx ky   curvatures of w = kx x²/2 + ky y²/2        1/m
 *   R       radius of the fitted disk                  m
 *   A20 A22 Zernike terms 2ρ² − 1 and ρ² cos 2θ        m
 */
import { describe, expect, it } from "vitest";
import { fitSurface } from "#app/engine/profile/map/fit-surface.ts";
import { shapeFigures } from "#app/engine/profile/map/shape-figures.ts";
import { surfaceContours } from "#app/engine/profile/map/surface-contours.ts";
import { secondOrderCurvature, surfaceHeight } from "#app/engine/profile/map/surface.ts";
import { thicknessFigures } from "#app/engine/profile/map/thickness-sites.ts";
import { zernikeIndices } from "#app/engine/profile/map/zernike.ts";
import { relative } from "../../relative.ts";

const degrees = (angle: number) => (angle * Math.PI) / 180;
type Height = (x: number, y: number) => number;

/** Scans of a height along azimuths, each at its own height and tilt, as instruments level them. */
const scansOf = (height: Height, angles: number[], half = 0.147) =>
  angles.map((angle, k) => {
    const x = Float64Array.from({ length: 295 }, (_, n) => -half + (2 * half * n) / 294);
    const [c, s] = [Math.cos(degrees(angle)), Math.sin(degrees(angle))];
    return { azimuth: degrees(angle), x, z: x.map((at) => height(at * c, at * s) + 1e-5 * k + 2e-4 * k * at) };
  });

const sitesOf = (height: Height, rings: [number, number][]) => {
  const places = rings.flatMap(([r, count]) =>
    Array.from({ length: count }, (_, n) => {
      const angle = (2 * Math.PI * n) / count;
      return { x: r * Math.cos(angle), y: r * Math.sin(angle) };
    }),
  );
  return {
    x: places.map(({ x }) => x),
    y: places.map(({ y }) => y),
    z: places.map(({ x, y }) => height(x, y)),
  };
};

const wafer = { radius: 0.15, edgeExclusion: 0.003 };
const figures = { radius: 0.15, waferThickness: 775e-6, gravity: "cancelled by turning over" } as const;

describe("surface from scans", () => {
  it("meets a shape of the fourth order from five azimuths, whatever each scan's level", () => {
    const height: Height = (x, y) => 0.02 * x * x - 0.01 * y * y + 0.3 * x * x * y + 0.8 * (x ** 4 - x * x * y * y);
    const surface = fitSurface({ ...wafer, scans: scansOf(height, [0, 36, 72, 108, 144]), order: 4 });
    expect(surface.order).toBe(4);
    expect(surface.rms).toBeLessThan(2e-9);
    // The scans carry no height or tilt of the whole: compare what is left of both after the middle and its slope.
    const flat: Height = (x, y) => surfaceHeight(surface, x, y);
    for (const [x, y] of [
      [0.1, 0.02],
      [-0.05, 0.12],
      [0.03, -0.11],
    ] as const) {
      const curved = (f: Height) => f(x, y) + f(-x, -y) - 2 * f(0, 0);
      expect(relative(curved(flat), curved(height))).toBeLessThan(1e-4);
    }
  });

  it("takes a lower order from fewer azimuths and says so", () => {
    const surface = fitSurface({ ...wafer, scans: scansOf((x, y) => 0.01 * (x * x + y * y), [0, 60, 120]), order: 4 });
    expect(surface.order).toBe(2);
    expect(surface.remarks[0]).toBe("The places tell a surface of order 2, not 4.");
    const { x, y, twist } = secondOrderCurvature(surface);
    expect(relative(x, 0.02)).toBeLessThan(1e-6);
    expect(relative(y, 0.02)).toBeLessThan(1e-6);
    expect(Math.abs(twist)).toBeLessThan(1e-9);
    expect(() => fitSurface({ ...wafer, scans: scansOf((x) => x * x, [0, 90]) })).toThrow(/three azimuths/);
  });

  it("gives terms an uncertainty that matches their scatter", () => {
    const noisy = scansOf((x, y) => 0.01 * (x * x + y * y), [0, 60, 120]).map(({ x, z, azimuth }, k) => ({
      azimuth,
      x,
      z: z.map((height, n) => height + 5e-8 * Math.sin(n * n * 0.7 + k)),
    }));
    const surface = fitSurface({ ...wafer, scans: noisy });
    const defocus = surface.terms.find(({ n, m }) => n === 2 && m === 0);
    const exact = (0.01 * 0.147 ** 2) / 2;
    expect(defocus?.standardUncertainty).toBeGreaterThan(1e-10);
    expect(Math.abs((defocus?.value ?? 0) - exact)).toBeLessThan(4 * (defocus?.standardUncertainty ?? 0));
  });
});

describe("surface from sites", () => {
  it("meets a second-order shape with tilt on 9 sites of a cross but for the saddle that they cannot show", () => {
    const tilted: Height = (x, y) => 3e-6 + 1e-4 * x - 2e-4 * y + 0.01 * x * x + 0.004 * y * y;
    const sites = (height: Height) =>
      sitesOf(height, [
        [0, 1],
        [0.07, 4],
        [0.147, 4],
      ]);
    const nine = fitSurface({ ...wafer, sites: sites(tilted) });
    expect(nine.order).toBe(2);
    expect(nine.remarks.join(" ")).toMatch(/cannot show a saddle at 45°/);
    expect(relative(surfaceHeight(nine, 0.1, 0.03), tilted(0.1, 0.03))).toBeLessThan(1e-9);
  });

  it("meets a fourth-order shape on 49 sites", () => {
    const tilted: Height = (x, y) => 3e-6 + 1e-4 * x - 2e-4 * y + 0.004 * x * y + 0.01 * x * x;
    const bent: Height = (x, y) => tilted(x, y) + 0.5 * x ** 4 - 0.2 * x * y ** 3;
    const many = fitSurface({
      ...wafer,
      sites: sitesOf(bent, [
        [0, 1],
        [0.049, 8],
        [0.098, 16],
        [0.147, 24],
      ]),
    });
    expect(many.order).toBe(4);
    expect(relative(surfaceHeight(many, 0.1, 0.03), bent(0.1, 0.03))).toBeLessThan(1e-9);
  });

  it("leaves out sites in the edge exclusion", () => {
    const sites = sitesOf(
      (x, y) => (Math.hypot(x, y) > 0.148 ? 1 : x * x),
      [
        [0, 1],
        [0.07, 8],
        [0.14, 8],
        [0.149, 8],
      ],
    );
    const surface = fitSurface({ ...wafer, sites });
    expect(surface.used).toBe(17);
    expect(surface.rms).toBeLessThan(1e-12);
  });
});

describe("bow, warp and sori", () => {
  const of = (height: Height) =>
    shapeFigures({ ...figures, surface: fitSurface({ ...wafer, scans: scansOf(height, [0, 36, 72, 108, 144]) }) });

  it("a bowl: bow is −κR²/2 at the three points, warp and sori κR²/2 over the disk", () => {
    const { bow, bowBestFit, warp, sori } = of((x, y) => 0.005 * (x * x + y * y));
    const sagitta = 0.005 * 0.147 ** 2;
    expect(relative(bow.value, -sagitta)).toBeLessThan(1e-9);
    expect(relative(warp.value, sagitta)).toBeLessThan(1e-9);
    expect(sori.value).toBe(warp.value);
    // The least-squares plane of a bowl lies at half of its sagitta.
    expect(relative(bowBestFit.value, -sagitta / 2)).toBeLessThan(1e-9);
  });

  it("a saddle has no bow and the most warp: (|kx| + |ky|) R²/2", () => {
    const { bow, warp } = of((x, y) => 0.01 * x * x - 0.01 * y * y);
    expect(Math.abs(bow.value)).toBeLessThan(1e-12);
    expect(relative(warp.value, 0.02 * 0.147 ** 2)).toBeLessThan(1e-9);
  });

  it("a cylinder: three-point bow −k R²/4, warp k R²/2", () => {
    const { bow, warp } = of((x) => 0.01 * x * x);
    expect(relative(bow.value, (-0.02 * 0.147 ** 2) / 4)).toBeLessThan(1e-9);
    expect(relative(warp.value, 0.01 * 0.147 ** 2)).toBeLessThan(1e-9);
  });

  it("two curvatures give A20, A22 and the three-point bow of the reference values", () => {
    // Fitted up to the rim, R = 150 mm: 196.875 µm, 168.75 µm, 393.75 µm for 0.05 and 0.02 1/m.
    const rings: [number, number][] = [
      [0, 1],
      [0.075, 12],
      [0.15, 24],
    ];
    const surface = fitSurface({
      radius: 0.15,
      edgeExclusion: 0,
      sites: sitesOf((x, y) => 0.025 * x * x + 0.01 * y * y, rings),
      order: 2,
    });
    const term = (n: number, m: number) => surface.terms.find((t) => t.n === n && t.m === m)?.value;
    expect(relative(term(2, 0), 196.875e-6)).toBeLessThan(1e-6);
    expect(relative(term(2, 2), 168.75e-6)).toBeLessThan(1e-6);
    const { bow } = shapeFigures({ ...figures, surface });
    // At 147 mm, where the points lie.
    expect(relative(bow.value, -393.75e-6 * (0.147 / 0.15) ** 2)).toBeLessThan(1e-6);
  });

  it("takes the median surface from front and thickness", () => {
    const thickness = fitSurface({
      ...wafer,
      sites: sitesOf(
        (x, y) => 775e-6 + 1e-4 * (x * x + y * y),
        [
          [0, 1],
          [0.07, 8],
          [0.147, 12],
        ],
      ),
      order: 2,
    });
    const surface = fitSurface({ ...wafer, scans: scansOf((x, y) => 0.005 * (x * x + y * y), [0, 60, 120]), order: 2 });
    const { warp, sori, remarks } = shapeFigures({ ...figures, surface, thickness });
    expect(relative(sori.value, 0.005 * 0.147 ** 2)).toBeLessThan(1e-6);
    expect(relative(warp.value, 0.00495 * 0.147 ** 2)).toBeLessThan(1e-6);
    expect(remarks.some((text) => text.startsWith("No thickness map"))).toBe(false);
  });

  it("says what is outside the standards, and how gravity was dealt with", () => {
    const surface = fitSurface({ ...wafer, scans: scansOf((x) => x * x, [0, 60, 120]), order: 2 });
    const at = (waferThickness: number, gravity: "included" | "cancelled by turning over") =>
      shapeFigures({ surface, radius: 0.15, waferThickness, gravity }).remarks.join(" ");
    expect(at(80e-6, "included")).toMatch(/Below about 100\u00a0µm .* own weight is in these figures/);
    expect(at(150e-6, "cancelled by turning over")).toMatch(/at least 180\u00a0µm/);
    expect(at(775e-6, "cancelled by turning over")).not.toMatch(/Below about|at least 50 mm/);
  });
});

describe("contours", () => {
  it("of a bowl are circles at round heights that end inside the disk", () => {
    const surface = fitSurface({ ...wafer, scans: scansOf((x, y) => 0.005 * (x * x + y * y), [0, 60, 120]), order: 2 });
    const { levels, step, low } = surfaceContours(surface);
    expect(step).toBeCloseTo(20e-6, 12);
    expect(levels.length).toBeGreaterThan(4);
    for (const { height, lines } of levels)
      for (const { x, y } of lines.flat()) {
        // Straight interpolation over a cell of 2.5 mm: κ d²/8 in height.
        expect(Math.abs(0.005 * (x * x + y * y) - (height - low))).toBeLessThan(1e-7);
        expect(Math.hypot(x, y)).toBeLessThanOrEqual(0.147 * (1 + 1e-9));
      }
  });

  it("of a saddle reach the rim", () => {
    const surface = fitSurface({ ...wafer, scans: scansOf((x, y) => 0.01 * (x * x - y * y), [0, 60, 120]), order: 2 });
    const ends = surfaceContours(surface).levels.flatMap(({ lines }) =>
      lines.flatMap((line) => [line[0], line.at(-1)]),
    );
    const onRim = ends.filter((end) => end && Math.abs(Math.hypot(end.x, end.y) - 0.147) < 1e-9);
    expect(onRim.length).toBe(ends.length);
  });

  it("of a flat surface there are none", () => {
    const surface = fitSurface({
      ...wafer,
      sites: sitesOf(
        () => 0,
        [
          [0, 1],
          [0.07, 8],
          [0.14, 8],
        ],
      ),
    });
    expect(surfaceContours(surface).levels).toEqual([]);
  });
});

describe("thickness sites", () => {
  it("takes off the tape and gives TTV", () => {
    const sites = { x: [0, 0.1, -0.1], y: [0, 0, 0], z: [225e-6, 227e-6, 224e-6] };
    const found = thicknessFigures(sites, 125e-6);
    expect(found.centre).toBeCloseTo(100e-6, 12);
    expect(found.ttv).toBeCloseTo(3e-6, 12);
    expect(() => thicknessFigures({ x: [0], y: [0], z: [1e-4] })).toThrow(/at least 2/);
  });
});

describe("zernikeIndices", () => {
  it("runs by order, then by waves", () => {
    expect(zernikeIndices(2).map(({ n, m }) => `${n},${m}`)).toEqual(["0,0", "1,-1", "1,1", "2,-2", "2,0", "2,2"]);
    expect(() => zernikeIndices(7)).toThrow(/0 to 6/);
  });
});
