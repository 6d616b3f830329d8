/* The address of a comparison, what moves a warp, the file, and what one page holds. */
import { describe, expect, it } from "vitest";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { comparisonSearch, moved, readComparison } from "#app/lib/comparison/asked.ts";
import { thicknessLines, warpLines } from "#app/lib/comparison/limit-lines.ts";
import { comparedCurves } from "#app/lib/stack-comparison/chart.ts";
import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import type { ComparisonChart } from "#app/schemas/comparison.ts";
import { comparisonCsv } from "#app/lib/stack-comparison/csv.ts";
import { comparedOver } from "#app/lib/stack-comparison/over.ts";
import { sensitivityWords, warpMovers } from "#app/lib/stack-comparison/sensitivities.ts";
import { layer, RANGE, stack } from "./samples.ts";

const plain = (text: string) => text.replaceAll("\u00A0", " ");
const [ONE, TWO, THREE] = [1, 2, 3].map((n) => `0000000${n}-0000-4000-8000-000000000000`) as [string, string, string];

describe("the address", () => {
  it("is read from one list or from several fields, without repeats, and written back the same", () => {
    const one = readComparison(
      new URLSearchParams(`of=${ONE},${TWO}&of=${ONE}&at=245+C&scale=linear&only=differences`),
    );
    expect(one.ids).toEqual([ONE, TWO]);
    expect(comparisonSearch(one)).toBe(`?of=${ONE},${TWO}&at=245+C&scale=linear&only=differences`);
    expect(readComparison(new URLSearchParams(comparisonSearch(one)))).toEqual(one);
    expect(comparisonSearch(readComparison(new URLSearchParams("of=,&scale=odd&from=")))).toBe("?of=");
  });

  it("keeps nothing that could leave it, whatever is typed", () => {
    const odd = readComparison(
      new URLSearchParams([
        ["of", "a&b#c"],
        ["q", "x&of=y"],
      ]),
    );
    expect(new URLSearchParams(comparisonSearch(odd)).get("q")).toBe("x&of=y");
    expect(new URLSearchParams(comparisonSearch(odd)).getAll("of")).toEqual(["a&b#c"]);
  });

  it("moves a stack by one place, and stays at the ends", () => {
    expect(moved([ONE, TWO, THREE], THREE, -1)).toEqual([ONE, THREE, TWO]);
    expect(moved([ONE, TWO, THREE], ONE, 1)).toEqual([TWO, ONE, THREE]);
    expect(moved([ONE, TWO], ONE, -1)).toEqual([ONE, TWO]);
    expect(moved([ONE, TWO], TWO, 1)).toEqual([ONE, TWO]);
  });

  it("says at the field what is wrong with a temperature or a range, and takes the usual one", () => {
    const over = (text: string) => comparedOver(readComparison(new URLSearchParams(text)), 775e-6);
    expect(over("")).toEqual({ temperature: null, range: { from: 20e-6, to: 775e-6 }, faults: {} });
    expect(over("from=50+um&to=0.3+mm").range).toEqual({ from: 50e-6, to: 0.3e-3 });
    const wrong = over("at=12+parsecs&from=many&to=-3+um");
    expect(Object.keys(wrong.faults)).toEqual(["at", "from", "to"]);
    expect(wrong.range).toEqual({ from: 20e-6, to: 775e-6 });
    expect(over("from=300+um&to=100+um").faults.to).toContain("The range is empty");
  });
});

describe("what moves the warp", () => {
  const sample = stack("A", [layer({ um: 1, tolerance: 20 })], { um: 700, tolerance: 5 });

  it("is each tolerance times the slope, largest first: as far as the model goes with it", () => {
    const found = warpMovers(sample);
    const figures = sample.figures;
    if (!found || !figures) throw new Error("The sample has tolerances.");
    expect(found.movers.map(({ moves }) => moves)).toEqual(
      found.movers.map(({ moves }) => moves).toSorted((a, b) => b - a),
    );
    const stress = found.movers.find(({ input }) => input === "stress of film 1");
    const warpAt = (by: number) => {
      const films = figures.stack.films.map((film) => ({ ...film, stress: film.stress + by }));
      return estimateStack({ ...figures.stack, films }).shape.warp;
    };
    const half = (warpAt(20e6) - warpAt(-20e6)) / 2;
    expect(Math.abs((stress?.moves ?? 0) / half - 1)).toBeLessThan(1e-3);
  });

  it("is said in words, with bars on one scale", () => {
    const [words, none] = sensitivityWords([sample, stack("B", [layer()])]);
    expect(plain(words?.lines.map(({ input, tolerance }) => `${input} ${tolerance}`).join("; ") ?? "")).toContain(
      "Stress of Plated copper A ± 20 MPa",
    );
    expect(words?.lines[0]?.share).toBe(1);
    expect(words?.lines.length).toBeLessThanOrEqual(5);
    expect(none).toMatchObject({ remark: "Nothing of it has a tolerance, so nothing is known to move it.", lines: [] });
  });
});

describe("the chart", () => {
  it("has for each stack its curve within the range, its own thickness and where it begins to curl", () => {
    const [curve] = comparedCurves([stack("A", [layer({ MPa: 400 })])], { from: 60e-6, to: 500e-6 });
    expect(curve?.points.every(({ x }) => x >= 60e-6 && x <= 500e-6)).toBe(true);
    expect(curve?.own?.x).toBe(300e-6);
    expect(curve?.points.some(({ x }) => x === curve.onset?.x)).toBe(true);
    const [other] = comparedCurves([stack("A", [layer()])], { from: 400e-6, to: 500e-6 });
    expect(other?.own).toBeNull();
  });

  it("names the diameter of a thickness limit only where there are several", () => {
    const limits = defaultLimits();
    expect(thicknessLines([0.2, 0.2], limits).map(({ lines }) => lines[0])).toEqual([
      "carrier",
      "tape or ring",
      "gripper",
    ]);
    expect(thicknessLines([0.2, 0.3], limits).map(({ lines }) => plain(lines[0] ?? ""))).toEqual([
      "carrier",
      "tape or ring, 200 mm",
      "tape or ring, 300 mm",
      "gripper, 200 mm",
      "gripper, 300 mm",
    ]);
  });

  it("draws the strictest and the most lenient tool for the largest wafer, or the one that is chosen", () => {
    const tool = (id: string, edgesUp: number | null, edgesDown: number | null, largestDiameter = 0.3) => ({
      id,
      name: `Tool ${id}`,
      edgesUp,
      edgesDown,
      largestDiameter,
    });
    const tools = [
      tool("1", 400e-6, 500e-6),
      tool("2", 2e-3, 2e-3),
      tool("3", 100e-6, 100e-6, 0.2),
      tool("4", 1e-3, null),
    ];
    expect(warpLines(tools, "", [0.2, 0.3]).map(({ value }) => value)).toEqual([400e-6, 2e-3]);
    expect(warpLines(tools, "", [0.2]).map(({ value }) => value)).toEqual([100e-6, 2e-3]);
    expect(warpLines(tools, "1", [0.3]).map(({ lines }) => plain(lines[0] ?? ""))).toEqual([
      "edges up 400 µm: Tool 1",
      "edges down 500 µm: Tool 1",
    ]);
    expect(warpLines(tools, "4", [0.3])).toHaveLength(1);
    expect(warpLines(tools, "none", [0.3])).toEqual([]);
    expect(warpLines([], "", [0.3])).toEqual([]);
  });
});

describe("the file", () => {
  it("has inputs, figures and curves, numbers to full precision, and no text that runs as a formula", () => {
    const odd = { ...stack("A", [layer({ tolerance: 20, filmName: "=cmd|' /C calc'!A0" })]), name: '=HYPERLINK("x")' };
    const named = { ...odd, program: { name: "@program" }, silicon: { ...odd.silicon, name: "+1+1" } };
    const lines = comparisonCsv([named, { ...stack("B", []), figures: null }])
      .trimEnd()
      .split("\r\n");
    expect(lines[0]).toBe("part,stack,film,quantity,silicon_thickness_um,value,unit");
    expect(lines.filter((line) => line.startsWith("curve,"))).toHaveLength(60);
    expect(lines.some((line) => line.includes("cannot be estimated"))).toBe(true);
    for (const line of lines) expect(line).not.toMatch(/(^|,)"?[=+@]/);
    expect(lines.find((line) => line.includes("stress at 25 C"))).toMatch(/,200,MPa$/);
    expect(lines.find((line) => line.includes("stress tolerance"))).toMatch(/,20,MPa$/);
    expect(RANGE.from).toBe(20e-6);
  });
});

describe("the plot", () => {
  const chart = (scale: "log" | "linear"): ComparisonChart => ({
    scale,
    range: { from: 200 * 1e-6, to: 775e-6 },
    curves: comparedCurves([stack("A", [layer()]), stack("B", [layer({ MPa: 60 })])], { from: 200e-6, to: 775e-6 }),
    thicknessLimits: [],
    warpLimits: [{ value: 400e-6, lines: ["400 µm: tool"] }],
    crossings: [{ x: 300e-6, y: 500e-6, number: 1 }],
  });

  it("has every tick on its axis, whatever the last digit of the range", () => {
    for (const { x, y } of [comparisonPlot(chart("log")), comparisonPlot(chart("linear"))])
      for (const axis of [x, y])
        for (const { value } of axis.ticks) {
          expect(value).toBeGreaterThanOrEqual(axis.from);
          expect(value).toBeLessThanOrEqual(axis.to);
        }
    expect(comparisonPlot(chart("linear")).x.ticks[0]?.text).toBe("200");
  });

  it("tells series apart by dash and marker, shades what is curled and points out dots, bars and crossings", () => {
    const { series, bands, marks } = comparisonPlot(chart("log"));
    expect(new Set(series.map(({ dash }) => dash)).size).toBe(2);
    expect(new Set(series.map(({ marker }) => marker)).size).toBe(2);
    expect(bands?.length).toBeGreaterThan(0);
    expect(marks?.filter(({ kind }) => kind === "own")).toHaveLength(2);
    expect(marks?.filter(({ kind }) => kind === "crossing").map(({ text }) => text)).toEqual(["1"]);
  });
});
