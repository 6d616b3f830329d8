import { describe, expect, it } from "vitest";
import { coursePlot, type CourseLine } from "#app/components/drawings/course-plot.ts";
import { seriesPath } from "#app/components/drawings/series-path.ts";
import { seriesValue } from "#app/components/drawings/series-value.ts";
import { lyingText } from "#app/lib/course-words.ts";
import { warpCourse } from "#app/lib/warp-course.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";

const LINE: Omit<CourseLine, "values"> = {
  id: "room",
  label: "25 °C",
  dash: "solid",
  marker: "circle",
  colourToken: "silicon",
  band: true,
};
const at = (micrometres: number, uncertainty = 0) => ({ warp: micrometres * 1e-6, uncertainty: uncertainty * 1e-6 });
const NO_LIMITS = { up: null, down: null };

/** A plot of one line, of as many places as it has values. */
function plotOf(
  values: CourseLine["values"],
  limits = values.map(() => NO_LIMITS as { up: number | null; down: number | null }),
) {
  return coursePlot({
    places: values.map((_, index) => ({ tick: `${index + 1}`, name: `${index + 1}, Step` })),
    lines: [{ ...LINE, values }],
    limits,
    rolled: [],
    formatWarp: lyingText,
  });
}

describe("how a wafer lies along its flow", () => {
  it("edges up counts up, edges down counts down, and what is held flat has no value", () => {
    const course = warpCourse(demoResult("Tern"));
    expect(course).toHaveLength(19);
    expect(course[11]).toMatchObject({ number: 12, limits: { up: 500e-6, down: 500e-6 } });
    expect(course[11]?.room?.warp).toBeGreaterThan(200e-6);
    expect(course[9]?.peak?.warp).toBeLessThan(0);
    expect(course[14]).toMatchObject({ room: null, peak: null, rolled: false });
  });

  it("at a step that is not heated the peak is as at 25 °C", () => {
    const step = warpCourse(demoResult("Tern"))[11];
    expect(step?.peak).toEqual(step?.room);
  });

  it("a wafer that has rolled up has no bow", () => {
    const result = demoResult("Tern");
    const shape = result.steps[11]?.atRoom;
    if (!shape) throw new Error("step 12 of Tern is held");
    Object.assign(shape, { regime: "curled", rollRadius: 0.3 });
    expect(warpCourse(result)[11]).toMatchObject({ room: null, rolled: true });
  });

  it("in words", () => {
    expect([lyingText(228e-6), lyingText(-40e-6)]).toEqual(["edges up 228\u00A0µm", "edges down 40\u00A0µm"]);
  });
});

describe("the chart along the flow", () => {
  it("lifts the pen where there is no value, and reads none there", () => {
    const plot = plotOf([at(10), at(20), null, at(30), at(40)]);
    const [series] = plot.series;
    if (!series) throw new Error("no series");
    expect(series.gaps).toEqual([{ from: 2, to: 4 }]);
    expect(
      seriesPath(series, { x: (x) => x, y: () => 0 })
        .match(/[ML]/g)
        ?.join(""),
    ).toBe("MLML");
    expect(seriesValue(plot, series, 3)).toBeNull();
    expect(seriesValue(plot, series, 4)).toBeCloseTo(30e-6, 12);
  });

  it("has a band of one run for each stretch, and none where no uncertainty is known", () => {
    const [band] = plotOf([at(10, 2), at(20, 3), null, at(30, 1), at(40)]).bands ?? [];
    expect(band?.runs.map((run) => run.map(({ x }) => x))).toEqual([[1, 2], [4]]);
    expect(band?.runs[0]?.[0]?.low).toBeCloseTo(8e-6, 12);
    expect(band?.runs[0]?.[0]?.high).toBeCloseTo(12e-6, 12);
  });

  it("keeps limits in view that are near, and does not let far ones flatten the curve", () => {
    const near = plotOf([at(200)], [{ up: 400e-6, down: 400e-6 }]);
    expect(near.y.to).toBeGreaterThan(400e-6);
    expect(near.y.from).toBeLessThan(-400e-6);
    const far = plotOf([at(20)], [{ up: 1500e-6, down: null }]);
    expect(far.y.to).toBeLessThan(100e-6);
    expect(far.series.map(({ id }) => id)).toEqual(["room", "up"]);
  });

  it("stands still on a flat wafer", () => {
    const plot = plotOf([at(0), at(0)]);
    expect(plot.y.ticks.length).toBeGreaterThan(2);
    expect(JSON.stringify(plot)).not.toMatch(/null|NaN/);
  });
});
