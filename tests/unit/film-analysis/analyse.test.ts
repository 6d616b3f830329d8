import { describe, expect, test } from "vitest";
import { FILM_CURVATURE, MONITOR, MONITOR_PARAMETERS } from "#app/db/seeders/demo-monitor.ts";
import type { Measured } from "#app/engine/measured.ts";
import { analyseFilm } from "#app/lib/film-analysis/analyse.ts";
import { centred } from "#app/lib/film-analysis/pair-points.ts";
import { waferAnswer } from "#app/lib/wafer-answer.ts";
import type { FilmAnalysis } from "#app/schemas/film-analysis.ts";
import { even, pairsOf, STUDIED, subjectOf, TODAY } from "./pairs.ts";

const row = ({ budget }: FilmAnalysis, input: string) => budget.rows.find((one) => one.input === input);
const seen = ({ mistakes }: FilmAnalysis) =>
  mistakes.filter(({ state }) => state === "seen").map(({ number }) => number);
const stress: Measured = {
  value: MONITOR.filmStress,
  tolerance: 3e6,
  source: "measured here",
  note: "",
  on: null,
  text: "",
};
const film = { name: "Polymer", kind: "polymer" as const, stress, youngsModulus: 3e9, poissonsRatio: 0.35 };

describe("an even film", () => {
  const analysis = analyseFilm(pairsOf(even(FILM_CURVATURE)), subjectOf({ film }), TODAY);

  test("gives its stress back, the same by both relations, and a bowl", () => {
    expect(Math.abs(analysis.stress.stoney.value / MONITOR.filmStress - 1)).toBeLessThan(0.002);
    expect(analysis.stress.differs).toBe(false);
    expect(analysis.directions.change.all?.word).toBe("bowl");
    expect(waferAnswer("Polymer", analysis)).toEqual([
      expect.stringMatching(/^Polymer: 31\.0\d? ± 0\.\d+.MPa, tension\.$/u),
      "The film makes a bowl.",
    ]);
    expect(seen(analysis)).toEqual([]);
  });

  test("makes a map whose lines lie on the wafer, in thousandths of its radius, and whose bands cover it", () => {
    if ("why" in analysis.shape) throw new Error(analysis.shape.why);
    const change = analysis.shape.shapes.find(({ of }) => of === "change by the film");
    const numbers = (path: string) => (path.match(/-?\d+/g) ?? []).map(Number);
    const levels = change?.map.levels ?? [];
    expect(levels.length).toBeGreaterThan(5);
    for (const { path } of levels) expect(Math.max(...numbers(path).map(Math.abs))).toBeLessThanOrEqual(1000);
    expect(change?.map.bands.map(({ height }) => height)).toEqual(
      change?.map.bands.map(({ height }) => height).toSorted((a, b) => a - b),
    );
    expect(change?.figures.map(({ name }) => name)).toEqual(["bow", "bow, best fit", "warp"]);
    const warp = change?.figures[2]?.value.value ?? 0;
    expect(warp / ((FILM_CURVATURE * (change?.map.radius ?? 0) ** 2) / 2)).toBeCloseTo(1, 2);
  });

  test("of which one scan has a spike keeps its shape", () => {
    const spiked = pairsOf(even(FILM_CURVATURE), { disturb: (x) => (Math.abs(x - 0.03) < 0.0008 ? 40e-6 : 0) });
    const { shape } = analyseFilm(spiked, subjectOf(), TODAY);
    if ("why" in shape) throw new Error(shape.why);
    expect(Math.max(...shape.shapes.map(({ rms }) => rms))).toBeLessThan(60e-9);
  });
});

describe("the budget", () => {
  const input = (changes: Parameters<typeof pairsOf>[1]) =>
    analyseFilm(pairsOf(even(FILM_CURVATURE), changes), subjectOf(), TODAY);

  test("has the repeatability of a studied instrument, and cancels its offset", () => {
    const analysis = input({ tool: STUDIED });
    expect(analysis.budget.tools).toEqual(["Stylus 1"]);
    expect(row(analysis, "repeatability of the tool")).toMatchObject({ shared: "each scan its own" });
    expect(row(analysis, "curvature of the tool's reference")).toMatchObject({
      contribution: 0,
      shared: "common, cancels",
    });
    expect(analysis.stress.stoney.uncertainty).toBeGreaterThan(input({}).stress.stoney.uncertainty);
  });

  test("keeps the offset between two instruments", () => {
    const two = row(input({ tool: STUDIED, sameTool: false }), "curvature of the tool's reference");
    expect(two?.shared).toBe("each scan its own");
    expect(two?.contribution).toBeGreaterThan(1e5);
  });

  test("shrinks what each scan has for itself with the number of lines, not what they share", () => {
    const [one, six] = [
      input({ tool: STUDIED, degrees: [0] }),
      input({ tool: STUDIED, degrees: [0, 30, 60, 90, 120, 150] }),
    ];
    const ratio = (name: string) => (row(one, name)?.contribution ?? 0) / (row(six, name)?.contribution ?? 1);
    expect(ratio("repeatability of the tool")).toBeCloseTo(Math.sqrt(6), 1);
    expect(ratio("film thickness")).toBeCloseTo(1, 2);
  });

  test("says where no tolerance was given", () => {
    const parameters = { ...MONITOR_PARAMETERS, filmThicknessTolerance: null };
    const analysis = analyseFilm(pairsOf(even(FILM_CURVATURE)), subjectOf({ parameters }), TODAY);
    expect(row(analysis, "film thickness")?.given).toBe(false);
    expect(row(analysis, "substrate thickness")?.given).toBe(true);
  });
});

describe("other shapes", () => {
  test("a film that pulls one way is a saddle, with stress by direction, and the check for it is seen", () => {
    const analysis = analyseFilm(pairsOf({ x: 0.01, y: -0.008, twist: 0 }), subjectOf(), TODAY);
    expect(analysis.directions.change.all?.word).toBe("saddle");
    expect(analysis.directional?.high).toBeGreaterThan(0);
    expect(analysis.directional?.low).toBeLessThan(0);
    expect(seen(analysis)).toEqual([11]);
    expect(waferAnswer("Film", analysis)[1]).toMatch(/^One possible mistake was seen/);
  });

  test("a thick stiff film differs between the relations, and the full model answers", () => {
    const parameters = { ...MONITOR_PARAMETERS, filmThickness: 20e-6, siliconThickness: 300e-6 };
    const stiff = { ...film, youngsModulus: 120e9 };
    const analysis = analyseFilm(pairsOf(even(0.02), { parameters }), subjectOf({ parameters, film: stiff }), TODAY);
    expect(analysis.stress.differs).toBe(true);
    expect(waferAnswer("Copper", analysis)[0]).toMatch(/, by the full model\.$/);
  });

  test("a wafer that has rolled gives no stress", () => {
    const parameters = { ...MONITOR_PARAMETERS, siliconThickness: 50e-6 };
    const analysis = analyseFilm(
      pairsOf({ x: 0.5, y: 0.001, twist: 0 }, { parameters }),
      subjectOf({ parameters }),
      TODAY,
    );
    expect(analysis.stress.full).toBeNull();
    expect(waferAnswer("Film", analysis)[0]).toMatch(/rolled up/);
    expect(analysis.directions.change.all?.word).toBe("curled");
  });

  test("one line, two across and lines without azimuth say what cannot be seen, and why there is no map", () => {
    for (const degrees of [[0], [0, 90]]) {
      const analysis = analyseFilm(pairsOf(even(FILM_CURVATURE), { degrees }), subjectOf(), TODAY);
      expect(analysis.directions.change.all).toBeNull();
      expect(analysis.directional).toBeNull();
      expect(analysis.shape).toMatchObject({ why: expect.stringMatching(/three azimuths/) as string });
    }
    const nameless = pairsOf(even(FILM_CURVATURE)).map((pair) => ({ ...pair, azimuth: null }));
    const analysis = analyseFilm(nameless, subjectOf(), TODAY);
    expect(Math.abs(analysis.stress.stoney.value / MONITOR.filmStress - 1)).toBeLessThan(0.002);
    expect(analysis.shape).toHaveProperty("why");
  });

  test("scans whose points are gone still give stress and budget", () => {
    const pairs = pairsOf(even(FILM_CURVATURE)).map((pair) => ({ ...pair, points: null }));
    const analysis = analyseFilm(pairs, subjectOf({ film }), TODAY);
    expect(analysis.stress.full).not.toBeNull();
    expect(analysis.mistakes.find(({ number }) => number === 8)?.state).toBe("cannot tell");
  });
});

describe("mistakes", () => {
  test("scans that were exchanged, a modulus of mixed constants and a thickness of another wafer are seen", () => {
    const before = even(0.002);
    const exchanged = pairsOf(even(-FILM_CURVATURE), { before });
    expect(seen(analyseFilm(exchanged, subjectOf({ film }), TODAY))).toContain(1);
    const reduced = { byTool: 234.7e6, recomputed: 180.2e6 };
    expect(seen(analyseFilm(pairsOf(even(FILM_CURVATURE)), subjectOf({ reduced }), TODAY))).toContain(6);
    const measuredThickness = { value: 750e-6, standardUncertainty: 0.5e-6 };
    expect(seen(analyseFilm(pairsOf(even(FILM_CURVATURE)), subjectOf({ measuredThickness }), TODAY))).toContain(4);
    expect(seen(analyseFilm(pairsOf(even(FILM_CURVATURE)), subjectOf({ usedAt: 1e-6 }), TODAY))).toContain(13);
  });

  test("what was said of the thickness and of the cure is looked at", () => {
    const said = (parameters: Partial<typeof MONITOR_PARAMETERS>, number: number) =>
      analyseFilm(
        pairsOf(even(FILM_CURVATURE)),
        subjectOf({ film, parameters: { ...MONITOR_PARAMETERS, ...parameters } }),
        TODAY,
      ).mistakes.find((mistake) => mistake.number === number)?.state;
    expect(said({ siliconThicknessFrom: "nominal" }, 4)).toBe("seen");
    expect(said({ siliconThicknessFrom: "measured" }, 4)).toBe("not seen");
    expect(said({ siliconThicknessFrom: null }, 4)).toBe("cannot tell");
    expect(said({ sinceCure: 3600 }, 12)).toBe("seen");
    expect(said({ sinceCure: 26 * 3600 }, 12)).toBe("not seen");
    expect(said({ sinceCure: null }, 12)).toBe("cannot tell");
  });

  test("seen in one of several scans name it", () => {
    const pairs = pairsOf(even(FILM_CURVATURE)).map((pair, n) =>
      n === 1 && pair.points ? withDays(pair, pair.points) : pair,
    );
    const [swapped] = analyseFilm(pairs, subjectOf(), TODAY).mistakes;
    expect(swapped).toMatchObject({ state: "seen", where: ["M-1, 60°"] });
  });

  const withDays = (
    pair: ReturnType<typeof pairsOf>[number],
    { pre, post }: NonNullable<ReturnType<typeof pairsOf>[number]["points"]>,
  ) => ({
    ...pair,
    points: {
      pre: { ...pre, day: { year: 2026, month: 11, day: 20 } },
      post: { ...post, day: { year: 2026, month: 11, day: 3 } },
    },
  });
});

describe("positions", () => {
  const scan = (from: number, to: number) => ({ x: [from, 0.03, to], z: [0, 1, 2] });
  test("counted from one end are moved to the middle; from the centre they stay, radii too", () => {
    expect([...centred(scan(0, 0.19), 0.2).x]).toEqual([-0.095, 0.03 - 0.095, 0.095]);
    expect([...centred(scan(-0.094, 0.096), 0.2).x]).toEqual([-0.094, 0.03, 0.096]);
    expect([...centred(scan(0, 0.098), 0.2).x]).toEqual([0, 0.03, 0.098]);
  });
});
