/* The answer in words, the curve and its file. */
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { warpPlot } from "#app/components/drawings/warp-plot.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { drawnCurve, warpChart } from "#app/lib/stack-chart.ts";
import { stackCsv } from "#app/lib/stack-csv.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import {
  againstFreeWafer,
  answerOutcome,
  answerSentences,
  bareFrom,
  becauseSentence,
  cautions,
  comparisonSentences,
  differencePercent,
  lengthWords,
  limitWords,
  radiusWords,
  shapeWords,
  type Estimated,
} from "#app/lib/stack-words.ts";
import { SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import { answerEstimate } from "#app/services/estimate-answer.ts";

const limits = defaultLimits();
const flat = limits.flatWithin.value;
const plain = (text: string) => text.replaceAll("\u00A0", " ");

const FILM = {
  side: "front" as const,
  thickness_m: 5e-6,
  stress_Pa: 100e6,
  youngs_modulus_Pa: 117e9,
  poissons_ratio: 0.34,
  cte_per_K: 16.7e-6,
};

function estimated(
  wafer: Partial<EstimateRequest["wafer"]>,
  changes: Partial<EstimateRequest> = {},
  film: Partial<typeof FILM> | { side: "back" } = {},
): Estimated {
  const request: EstimateRequest = {
    wafer: { diameter_m: 0.2, thickness_m: 725e-6, orientation: "100", ...wafer },
    films: [{ ...FILM, ...film }],
    sweep: { from_m: 20e-6, to_m: 725e-6, points: 120 },
    ...changes,
  };
  return { request, answer: answerEstimate(request, limits) };
}

const THICK = estimated({ thickness_m: 725e-6 });
const SAFE = estimated({ thickness_m: 725e-6, thickness_tolerance_m: 5e-6 }, {}, { stress_Pa: 20e6 });
const THIN = estimated({ thickness_m: 100e-6, thickness_tolerance_m: 3e-6 });

describe("words for figures", () => {
  it.each([
    [343.21e-6, "343 µm"],
    [11.249e-3, "11.2 mm"],
    [0, "0 µm"],
    [-12.5e-6, "−12.5 µm"],
  ])("a length of %f m is %s", (metres, words) => {
    expect(plain(lengthWords(metres))).toBe(words);
  });

  it("a limit is rounded up, so that it is never undercut", () => {
    expect([306.0000000001e-6, 306.2e-6, 306e-6].map(limitWords).map(plain)).toEqual(["306 µm", "307 µm", "306 µm"]);
  });

  it("a roll radius is said about", () => {
    expect([0.4432, 0.0414, 0.1].map(radiusWords).map(plain)).toEqual(["0.44 m", "41 mm", "0.10 m"]);
  });

  it("a difference is a share of the reference, and nothing against nothing", () => {
    expect(differencePercent(90e-6, 100e-6)).toBeCloseTo(-10, 10);
    expect(differencePercent(1e-6, 0)).toBeNull();
  });
});

describe("the shape in words", () => {
  it("says which way the edges lie with the device side up", () => {
    expect(plain(shapeWords(THICK.answer.shape, flat))).toMatch(/^edges up \d+ µm$/);
    expect(plain(shapeWords(estimated({}, {}, { side: "back" }).answer.shape, flat))).toMatch(/^edges down \d+ µm$/);
  });

  it("never gives a curled wafer a bow", () => {
    const words = plain(shapeWords(THIN.answer.shape, flat));
    expect(words).toMatch(/^rolls up, radius about 0\.\d\d m$/);
  });

  it("calls flat what is within the site's figure, at it too", () => {
    const shape = { ...THICK.answer.shape, warp_m: flat };
    expect(shapeWords(shape, flat)).toBe("flat");
    expect(shapeWords({ ...shape, warp_m: flat * 1.01 }, flat)).not.toBe("flat");
  });
});

describe("the answer", () => {
  it("of a thick wafer says down to where it may be lifted bare, and how it lies", () => {
    const [safe, here, more] = answerSentences(THICK, null, limits).map(plain);
    expect(safe).toMatch(/^Safe to lift bare down to (3\d\d) µm; free, it curls below (that|\d+ µm)\.$/);
    expect(here).toMatch(/^At 725 µm it lies edges up \d+ µm\.$/);
    expect(more).toBeUndefined();
  });

  it("never calls bare what curls, whatever the limit by thickness", () => {
    const least = bareFrom(THICK, limits) ?? 0;
    expect(least).toBeGreaterThanOrEqual(THICK.answer.curls_below_m ?? 0);
    expect(least).toBeGreaterThanOrEqual(limits.bareFrom200.value);
  });

  it("of a thin one says what it needs and what it does when let go", () => {
    const [, here] = answerSentences(THIN, null, limits).map(plain);
    expect(here).toMatch(/^At 100 µm it needs tape or ring; let go, it rolls up, radius about 0\.\d\d m\.$/);
    expect(plain(becauseSentence(THIN))).toBe(
      "Judged at 97 µm, nominal minus tolerance: it is too thin for a gripper.",
    );
    expect(plain(becauseSentence(THICK))).toBe("Judged at nominal 725 µm: the silicon is thick enough.");
  });

  it("adds another temperature as a third sentence", () => {
    const hot = estimated({}, { temperature_K: 518.15 });
    expect(plain(answerSentences(THICK, hot, limits)[2] ?? "")).toMatch(/^At 245 °C, free, it lies edges down /);
  });

  it("does not judge a wafer for which no limits are set", () => {
    const large = estimated({ diameter_m: 0.45 });
    expect(plain(answerSentences(large, null, limits)[0] ?? "")).toContain("No thickness limits are set for a 450 mm");
    expect(bareFrom(large, limits)).toBeNull();
    expect(answerOutcome(large, limits)).toBe("cannot judge");
  });

  it("of a wafer without a pull does not curl", () => {
    const still = estimated({}, { films: [] });
    expect(plain(answerSentences(still, null, limits)[0] ?? "")).toBe(
      "Safe to lift bare down to 300 µm; it does not curl.",
    );
    expect(plain(answerSentences(still, null, limits)[1] ?? "")).toBe("At 725 µm it lies flat.");
  });

  it("has a level for every support class", () => {
    const levels = SUPPORT_CLASSES.map((support) =>
      answerOutcome({ ...SAFE, answer: { ...SAFE.answer, support: { class: support, because: "" } } }, limits),
    );
    expect(levels).toEqual(["clear", "caution", "needs support", "needs support", "do not run"]);
  });

  it("is a caution where the silicon has no tolerance, or from the site's share of the curling load on", () => {
    const at = (stability_ratio: number) => ({
      ...SAFE,
      answer: { ...SAFE.answer, shape: { ...SAFE.answer.shape, stability_ratio } },
    });
    expect(answerOutcome(SAFE, limits)).toBe("clear");
    expect(answerOutcome(at(0.6999), limits)).toBe("clear");
    expect(answerOutcome(at(0.7), limits)).toBe("caution");
    expect(cautions(at(0.7), limits)).toEqual(["At 0.70 of the curling load; care is due from 0.70 on"]);
    expect(cautions(THICK, limits)[0]).toContain("no tolerance");
    expect(cautions(THIN, limits)).toEqual([]);
  });

  it("sets small-bow formulas against the free wafer in percent", () => {
    const shape = { ...SAFE.answer.shape, bow_m: -100e-6 };
    expect(plain(againstFreeWafer(-90e-6, shape))).toBe("10 % less than the free wafer");
    expect(plain(againstFreeWafer(-103e-6, shape))).toBe("3.0 % more than the free wafer");
    expect(plain(againstFreeWafer(-100e-6, shape))).toBe("as the free wafer");
    expect(plain(againstFreeWafer(5e-6, shape))).toBe("the other way than the free wafer");
    expect(plain(againstFreeWafer(-120e-6, { ...shape, regime: "curled" }))).toBe("20 % more than the edge lift");
  });
});

describe("a comparison", () => {
  it("says how each lies and whose curling limit is thicker", () => {
    const other = { ...estimated({ thickness_m: 400e-6 }, {}, { stress_Pa: 50e6 }), name: "Tern T-3" };
    const [lies, curls] = comparisonSentences(THIN, other, limits).map(plain);
    expect(lies).toMatch(/^At 400 µm Tern T-3 lies edges up \d+ µm; this stack, at 100 µm, rolls up/);
    expect(curls).toMatch(
      /^Tern T-3 curls below \d+ µm, this stack below \d+ µm: the other limit is \d+ µm thinner\.$/,
    );
  });

  it.each([
    [true, true, "Neither curls at any thickness."],
    [true, false, "this stack at no thickness."],
    [false, true, "Other does not curl, this stack does below"],
    [false, false, "Both curl below"],
  ])("with own still %s and other still %s", (ownStill, otherStill, words) => {
    const of = (still: boolean) => (still ? estimated({}, { films: [] }) : THICK);
    const [, curls] = comparisonSentences(of(ownStill), { ...of(otherStill), name: "Other" }, limits);
    expect(plain(curls ?? "")).toContain(words);
  });
});

describe("the curve", () => {
  it("has the thickness that was estimated as a point, with that very warp", () => {
    const point = drawnCurve(THICK, "warp").find(({ x }) => x === 725e-6);
    expect(point?.y).toBe(THICK.answer.shape.warp_m);
    const between = estimated({ thickness_m: 333.3e-6 });
    expect(drawnCurve(between, "warp").find(({ x }) => x === 333.3e-6)?.y).toBe(between.answer.shape.warp_m);
    expect(drawnCurve(between, "linear").find(({ x }) => x === 333.3e-6)?.y).toBe(-between.answer.stoney.bow_m);
  });

  it("stops where the roll is half a turn across, and ascends", () => {
    const strong = estimated({}, {}, { stress_Pa: 1e9 });
    const curve = drawnCurve(strong, "warp");
    const highest = Math.max(...curve.map(({ y }) => y));
    expect(highest).toBeLessThan(0.1 * (2 / Math.PI));
    expect(curve.length).toBeLessThan(121);
    expect(curve.map(({ x }) => x)).toEqual(curve.map(({ x }) => x).toSorted((a, b) => a - b));
  });

  it("shows the others only when there are any, the stack first and the linear reference last", () => {
    const ids = (data: ReturnType<typeof warpChart>) => data?.series.map(({ id }) => id);
    expect(ids(warpChart(THICK, { hot: null, overlay: null }, limits))).toEqual(["drawn", "linear"]);
    const hot = estimated({}, { temperature_K: 518.15 });
    const overlay = { ...THIN, name: "A stack with a very long name of its own" };
    const data = warpChart(THICK, { hot, overlay }, limits);
    expect(ids(data)).toEqual(["drawn", "hot", "overlay", "linear"]);
    expect(data?.series[2]?.label).toBe("A stack with a very…");
    expect(data?.thicknessLimits?.map(({ value }) => value)).toEqual([50e-6, 180e-6, 300e-6]);
  });

  it("is not drawn for a wafer that stays flat, and always has finite axes", () => {
    expect(warpChart(estimated({}, { films: [] }), { hot: null, overlay: null }, limits)).toBeNull();
    const data = warpChart(THIN, { hot: null, overlay: null }, limits);
    if (!data) throw new Error("A curled wafer has a curve.");
    const { x, y, chosen } = warpPlot(data);
    expect([x.from, x.to, y.from, y.to].every((value) => Number.isFinite(value) && value > 0)).toBe(true);
    expect(chosen?.y).toBe(THIN.answer.shape.warp_m);
  });
});

describe("the file of a curve", () => {
  it("reads back as the figures, one row a curve and thickness", () => {
    const hot = estimated({}, { temperature_K: 518.15 });
    const csv = stackCsv('Tern, "T-2"', THICK, { hot, overlay: { ...THIN, name: "=cmd" } });
    const { data, errors } = Papa.parse<Record<string, string>>(csv, { header: true, skipEmptyLines: true });
    expect(errors).toEqual([]);
    expect(data).toHaveLength(360);
    expect(data[0]).toEqual({
      stack: 'Tern, "T-2"',
      temperature_K: "298.15",
      silicon_thickness_um: "20",
      warp_um: String(Number(((THICK.answer.sweep?.[0]?.warp_m ?? 0) * 1e6).toPrecision(12))),
      linear_warp_um: String(Number(((THICK.answer.sweep?.[0]?.linear_warp_m ?? 0) * 1e6).toPrecision(12))),
      regime: "curled",
    });
    expect(data[120]?.["temperature_K"]).toBe("518.15");
    expect(data[240]?.["stack"]).toBe("'=cmd");
  });
});

describe("another temperature", () => {
  it.each([
    ["", null],
    ["  ", null],
    ["25 °C", null],
    ["298.15 K", null],
  ])("%j asks for 25 °C alone", (text, temperature) => {
    expect(viewTemperature(text).temperature).toBe(temperature);
  });

  it("is read with its unit, and refused without", () => {
    expect(viewTemperature("245 C").temperature).toBeCloseTo(518.15, 9);
    for (const text of ["245", "12 parsecs", "-400 °C", "2000 °C"]) {
      const { temperature, read } = viewTemperature(text);
      expect([temperature, read?.ok]).toEqual([null, false]);
    }
  });
});
