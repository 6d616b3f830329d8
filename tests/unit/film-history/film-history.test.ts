import { describe, expect, it } from "vitest";
import { individualsPlot, rangesPlot } from "#app/components/drawings/stress-chart-plot.ts";
import { parityAxis } from "#app/components/drawings/parity-layout.ts";
import { standardUncertainty } from "#app/engine/measured.ts";
import { stressMean, type MeanReading } from "#app/lib/film-mean.ts";
import { keepUnchanged } from "#app/lib/keep-unchanged.ts";
import { measurableSteps, predictedBow } from "#app/lib/predicted-bow.ts";
import { chosenPoints, compared, predictionsCsv } from "#app/lib/predictions.ts";
import { stressCsv } from "#app/lib/stress-csv.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { StressValueRow } from "#app/schemas/film-stress.ts";
import type { PredictionPoint } from "#app/schemas/prediction.ts";
import { chartOf } from "#app/services/films/stress-chart.ts";

const MPa = 1e6;

const reading = (value: number, changed: Partial<MeanReading> = {}): MeanReading => ({
  value: value * MPa,
  standardUncertainty: 0.5 * MPa,
  commonUncertainty: 0.3 * MPa,
  measuredAt: new Date("2026-11-20T12:00:00Z"),
  state: "accepted",
  ...changed,
});

describe("the mean of a film's accepted values", () => {
  it("of one value has that value's own uncertainty, through the library's half-width and back", () => {
    const mean = stressMean([reading(31)]);
    expect(mean?.stress).toMatchObject({ value: 31 * MPa, meanOf: 1, note: "1 accepted value, 2026-11-20" });
    expect(standardUncertainty(mean?.stress ?? { value: 0, tolerance: 0, source: "assumed" }) / MPa).toBeCloseTo(
      0.5,
      4,
    );
  });

  it("leaves out what is set aside, and there is none when nothing counts", () => {
    const aside = reading(99, { state: "set aside" });
    expect(stressMean([reading(30), reading(32), aside])?.stress).toMatchObject({ value: 31 * MPa, meanOf: 2 });
    expect(stressMean([aside])).toBeNull();
  });

  it("does not shrink below what all values share", () => {
    const many = Array.from({ length: 400 }, () => reading(31));
    expect((stressMean(many)?.standardUncertainty ?? 0) / MPa).toBeCloseTo(0.3, 6);
  });
});

it("a property that comes back from its form unchanged keeps what the form does not show", () => {
  const stress = { value: 31.235 * MPa, tolerance: 2 * MPa, source: "measured here", note: "n", on: null, meanOf: 4 };
  const { meanOf: _gone, ...shown } = stress;
  const back = { ...shown, value: stress.value * (1 + 1e-13), text: "31.235 MPa" };
  expect(keepUnchanged({ stress }, { stress: back, name: "x" })).toMatchObject({ stress: { meanOf: 4 }, name: "x" });
  for (const other of [{ value: 31 * MPa }, { tolerance: null }, { source: "assumed" }, { note: "m" }])
    expect(keepUnchanged({ stress }, { stress: { ...back, ...other } })["stress"]).not.toHaveProperty("meanOf");
});

const row = (value: number, changed: Partial<StressValueRow> = {}): StressValueRow => ({
  id: String(value),
  version: 1,
  number: 1,
  value: value * MPa,
  standardUncertainty: 0.5 * MPa,
  filmThickness: 5e-6,
  instrument: "A",
  measuredAt: "2026-11-20T12:00:00.000Z",
  state: "accepted",
  origin: { kind: "scan", id: "1", label: "W-1", program: "Tern" },
  reason: "routine",
  acceptedAt: "2026-11-21T12:00:00.000Z",
  acceptedBy: "Ines Varga",
  setAside: null,
  putBack: null,
  ...changed,
});

describe("the control chart", () => {
  const rows = [30, 31, 30.5, 31.2, 30.8, 30.9, 60].map((value) => row(value));

  it("has centre, limits and a mark for each value, all within its axes", () => {
    const chart = chartOf(rows, "A");
    for (const plot of [individualsPlot(chart), rangesPlot(chart)]) {
      expect(plot.x.stops).toEqual([1, 2, 3, 4, 5, 6, 7]);
      for (const { points } of plot.series)
        for (const { y } of points) expect(y >= plot.y.from && y <= plot.y.to).toBe(true);
      for (const { value } of plot.yLimits ?? []) expect(value >= plot.y.from && value <= plot.y.to).toBe(true);
    }
    expect(individualsPlot(chart).yLimits).toHaveLength(2);
    expect(chart.working?.equation).toBe("control-limits");
  });

  it("counts no value that is set aside, and says when there are too few for limits", () => {
    const aside = chartOf(
      rows.map((each, n) => (n === 6 ? { ...each, state: "set aside" as const } : each)),
      "A",
    );
    expect(aside.limits?.from).toBe(6);
    expect(aside.signals).toEqual([]);
    const few = chartOf(rows.slice(0, 2), "A");
    expect(few).toMatchObject({ limits: null, working: null });
    expect(individualsPlot(few).yLimits).toEqual([]);
  });
});

it("a history as CSV is blank where the reader may not know, and starts no formula", () => {
  const [, secret, typed] = stressCsv([
    row(30, { origin: { kind: "another program" }, reason: null }),
    row(31, { origin: { kind: "typed", source: "=1+1" } }),
  ]).split("\r\n");
  expect(secret).toContain(",,another program,scan,,");
  expect(typed).toContain("'=1+1");
});

const point = (id: string, predicted: number, measured: number, group = "step 1"): PredictionPoint => ({
  id,
  group,
  name: id,
  program: "Tern",
  predicted: predicted * 1e-6,
  predictedUncertainty: 2e-6,
  measured: measured * 1e-6,
  measuredUncertainty: 1e-6,
  stated: true,
  measuredAt: "2026-11-20T12:00:00.000Z",
  instrument: "",
  path: "/",
});

describe("predicted against measured", () => {
  const good = [1, 2, 3, 4, 5].map((n) => point(`g${n}`, -50 * n, -50 * n + (n % 2 ? 1 : -1)));
  const bad = [1, 2, 3, 4, 5].map((n) => point(`b${n}`, -50 * n, -50 * n + 30 + (n % 2 ? 1 : -1), "step 2"));

  it("names the step that the model is off at, and puts it first", () => {
    const found = compared([...good, ...bad]);
    expect(found?.groups.map(({ step, isOff }) => [step, isOff])).toEqual([
      ["step 2", true],
      ["step 1", false],
    ]);
    expect(found?.groups[0]?.bias).toBeCloseTo(30.2e-6, 8);
    expect(compared([])).toBeNull();
  });

  it("says for each flow what its steps are off by together, and nothing of points that are of no flow", () => {
    const of = (flow: string, points: PredictionPoint[]) => points.map((each) => ({ ...each, flow }));
    const found = compared([...of("A", good), ...of("B", bad), ...of("B", good.slice(0, 1)), point("loose", -50, -50)]);
    expect(found?.flows.map(({ step, count, isOff }) => [step, count, isOff])).toEqual([
      ["B", 6, true],
      ["A", 5, false],
    ]);
    expect(found?.flows[0]?.bias).toBeCloseTo(25.3e-6, 7);
    expect(compared(good)?.flows).toEqual([]);
  });

  it("does not know a prediction better by more wafers that share it", () => {
    const alone = compared(good)?.all.biasUncertainty ?? 0;
    const shared = compared(good.map((each) => ({ ...each, shared: "one assessment" })))?.all.biasUncertainty ?? 0;
    expect(alone).toBeLessThan(1.2e-6);
    expect(shared).toBeGreaterThan(2e-6);
    expect(shared).toBeLessThan(2.5e-6);
  });

  it("draws both axes in one scale that holds every bar", () => {
    const axis = parityAxis(
      "bow",
      [...good, ...bad].map((each) => ({ ...each, off: false })),
    );
    expect(axis.from).toBeLessThan(-254e-6);
    expect(axis.to).toBeGreaterThan(-17e-6);
    expect(parityAxis("bow", [{ ...point("one", 0, 0), predictedUncertainty: 0, off: false }]).to).toBeGreaterThan(0);
  });

  it("is searched, sorted by how far off it is, and exported in full", () => {
    const params = { query: "STEP 2", sort: "off", descending: true, page: 1, filters: {} };
    const chosen = chosenPoints([...good, ...bad], params);
    expect(chosen.map(({ group }) => group)).toEqual(Array(5).fill("step 2"));
    const [head, first] = predictionsCsv("bow", chosen).split("\r\n");
    expect(head?.split(",")).toHaveLength(first?.split(",").length ?? 0);
    expect(head).toContain("predicted_um");
  });
});

describe("the bow that an assessment predicts", () => {
  const step = (number: number, bow: number | null, changed = {}) =>
    ({
      number,
      title: `Step ${number}`,
      atRoom: bow === null ? null : { bow, regime: "linear", rollRadius: null, standardUncertainty: 1e-6 },
      ...changed,
    }) as unknown as StepResult;
  const whole = { steps: [step(1, -1e-5), step(2, null), step(3, -3e-5)] } as unknown as AssessmentResult;

  it("is there after steps at which the wafer has one of its own", () => {
    expect(measurableSteps(whole).map((each) => each.step)).toEqual([1, 3]);
    expect(predictedBow(whole, 3, null)).toMatchObject({ bow: -3e-5, standardUncertainty: 1e-6 });
    expect(predictedBow(whole, 2, null)).toMatch(/no bow of its own/);
    expect(predictedBow(whole, 9, null)).toMatch(/no step 9/);
  });

  it("goes by the slot of the wafer where the flow parts", () => {
    const other = { steps: [step(1, -2e-5), step(3, 0, { skipped: true })] } as unknown as AssessmentResult;
    const parted = {
      ...whole,
      legs: [
        { slots: [1, 2], result: null },
        { slots: [3], result: other },
      ],
    } as unknown as AssessmentResult;
    expect(predictedBow(parted, 1, 2)).toMatchObject({ bow: -1e-5 });
    expect(predictedBow(parted, 1, 3)).toMatchObject({ bow: -2e-5 });
    expect(predictedBow(parted, 3, 3)).toMatch(/no bow of its own/);
    expect(predictedBow(parted, 1, null)).toMatch(/slot is not known/);
    expect(predictedBow(parted, 1, 9)).toMatch(/no leg/);
  });
});
