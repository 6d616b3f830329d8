import { describe, expect, test } from "vitest";
import { referencePlot } from "#app/components/drawings/reference-plot.ts";
import { referenceSummary, signedMicrometres } from "#app/lib/reference-summary.ts";

const known = { bow: -45e-6, bowUncertainty: 0.1e-6 };
const readings = (...errors: number[]) =>
  errors.map((error, n) => ({
    measuredOn: `2026-11-${String(n + 1).padStart(2, "0")}`,
    bow: known.bow + error * 1e-6,
    setAside: null as string | null,
  }));
const texts = (errors: number[], tool: number | null = 0.1e-6) =>
  referenceSummary(known, readings(...errors), tool).sentences.map(({ level, text }) => `${level}: ${text}`);

describe("readings of a wafer of known bow", () => {
  test("that agree say so, and without a study nothing is claimed", () => {
    expect(texts([0.1, -0.1, 0.05])).toEqual([
      expect.stringMatching(/^clear: The instrument reads the known bow within its uncertainty/),
      expect.stringMatching(/^clear: No drift can be told/),
      "note: Control limits come with 2 more readings.",
    ]);
    expect(texts([5, 5, 5], null)[0]).toMatch(/^note: Without a repeatability study/);
  });

  test("that lie off, drift or jump are a caution with the size", () => {
    expect(texts([0.9, 1, 1.1])[0]).toMatch(/^caution: The instrument reads \+1\.0\d? ± 0\.\d+.µm .*towards a dome/u);
    expect(texts([0, 0.5, 1, 1.5, 2, 2.5])[1]).toMatch(/^caution: It drifts by \+15\.\d* ± /u);
    expect(texts([0, 0.1, 0, 0.1, 0, 0.1, 3]).at(-1)).toMatch(/^caution: /);
  });

  test("that were set aside do not count, and stay on the drawing", () => {
    const list = readings(0.1, -0.1, 0.1, -0.1, 0.1, 30);
    const last = list[5];
    if (last) last.setAside = "chuck was dirty";
    const summary = referenceSummary(known, list, 0.1e-6);
    expect(summary.bias?.value).toBeCloseTo(0.02e-6, 10);
    expect(summary.limits?.upper).toBeLessThan(1e-6);
    const plot = referencePlot({ readings: list, summary, formatError: signedMicrometres });
    expect(plot.series.find(({ id }) => id === "aside")?.points).toEqual([
      { x: 6, y: expect.closeTo(30e-6, 9) as number },
    ]);
    expect(plot.series.find(({ id }) => id === "read")?.points).toHaveLength(5);
  });

  test("one alone makes a drawing, none at all a sentence", () => {
    const plot = referencePlot({
      readings: readings(0),
      summary: referenceSummary(known, readings(0), null),
      formatError: signedMicrometres,
    });
    expect([plot.x.from, plot.x.to]).toEqual([0.5, 1.5]);
    expect(plot.y.to).toBeGreaterThan(0);
    expect(texts([])).toContain("note: No reading counts yet.");
  });
});
