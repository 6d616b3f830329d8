import { describe, expect, it } from "vitest";
import { ProfileChart } from "#app/components/charts/ProfileChart.tsx";
import { WarpChart } from "#app/components/charts/WarpChart.tsx";
import { limitLabels } from "#app/components/drawings/limit-labels.ts";
import { plotScale } from "#app/components/drawings/plot-scale.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { profilePlot } from "#app/components/drawings/profile-plot.ts";
import { seriesValue } from "#app/components/drawings/series-value.ts";
import { spreadLabels } from "#app/components/drawings/spread-labels.ts";
import { warpPlot } from "#app/components/drawings/warp-plot.ts";
import { attributes, render, words } from "./render.ts";
import { WARP } from "./samples.ts";

const FRAME = { left: 0, right: 400, top: 0, bottom: 300 };

describe("scales", () => {
  it("put decades at equal steps on a logarithmic axis and values at equal steps on a linear one", () => {
    const axis = { from: 1e-5, to: 1e-3, ticks: [], format: String };
    const log = plotScale({ ...axis, scale: "log" }, 0, 200);
    expect(log(1e-5)).toBeCloseTo(0, 9);
    expect(log(1e-4)).toBeCloseTo(100, 9);
    expect(log(1e-3)).toBeCloseTo(200, 9);
    const linear = plotScale({ ...axis, scale: "linear", from: -1, to: 1 }, 300, 100);
    expect(linear(0)).toBe(200);
    expect(linear(1)).toBe(100);
  });
});

describe("values along a curve", () => {
  it("lie on the straight line of the plot's own scales, and nowhere outside the curve", () => {
    const plot = warpPlot(WARP);
    const drawn = plot.series[0];
    if (drawn === undefined) throw new Error("the sample has series");
    // The sample is a power law, which is straight on logarithmic axes.
    expect(seriesValue(plot, drawn, 137e-6)).toBeCloseTo(1.1e-2 * (100 / 137) ** 2, 9);
    expect(seriesValue(plot, drawn, 10e-6)).toBeNull();
    expect(seriesValue(plot, drawn, 800e-6)).toBeNull();
  });
});

describe("labels", () => {
  it("spread to their pitch, symmetrically, and stay between the ends", () => {
    expect(spreadLabels([100, 104], [18, 18])).toEqual([93, 111]);
    expect(spreadLabels([10, 200], [18, 18])).toEqual([10, 200]);
    const [low = 0, high = 0] = spreadLabels([2, 3], [18, 18], 0, 300);
    expect(low).toBeGreaterThanOrEqual(9);
    expect(high - low).toBeGreaterThanOrEqual(17.9);
    const [, last = 0] = spreadLabels([298, 299], [18, 18], 0, 300);
    expect(last).toBeLessThanOrEqual(291.01);
  });

  it("of limits stand right of their line, left where only that side is free, and a tier up where they meet", () => {
    expect(limitLabels([100], [50], [], FRAME)).toEqual([{ x: 105, anchor: "start", tier: 0 }]);
    expect(limitLabels([100], [50], [130], FRAME)).toEqual([{ x: 95, anchor: "end", tier: 0 }]);
    expect(limitLabels([390], [50], [], FRAME)).toEqual([{ x: 385, anchor: "end", tier: 0 }]);
    expect(limitLabels([100, 120], [70, 70], [], FRAME).map((label) => label.tier)).toEqual([0, 0]);
    expect(limitLabels([100, 120], [70, 70], [30], FRAME).map((label) => label.tier)).toEqual([0, 1]);
  });
});

describe("warp against thickness", () => {
  const plot = warpPlot(WARP);

  it("spans the curves on two logarithmic axes, with decades of warp and 1, 2, 5 of thickness", () => {
    expect(plot.x).toMatchObject({ scale: "log", from: 20e-6 });
    expect(plot.x.ticks.map((tick) => tick.text)).toEqual(["20", "50", "100", "200", "500", "775"]);
    expect(plot.y.ticks.map((tick) => tick.text)).toEqual(
      ["1\u00a0mm", "10\u00a0mm", "100\u00a0mm"].slice(0, plot.y.ticks.length),
    );
    expect(plot.y.scale).toBe("log");
  });

  it("puts the chosen thickness on the first curve", () => {
    expect(plot.chosen?.x).toBe(100e-6);
    expect(plot.chosen?.y).toBeCloseTo(1.1e-2, 6);
    expect(warpPlot({ ...WARP, chosenThickness: undefined }).chosen).toBeUndefined();
  });

  it("is the same data for screen and paper: the drawing is a pure function of it", () => {
    const drawing = <PrintPlot plot={plot} label="Warp against silicon thickness" />;
    expect(render(drawing)).toBe(render(drawing));
    expect(render(drawing)).toContain('role="img" aria-label="Warp against silicon thickness"');
  });

  it("shades the curled regime from the left edge to its line and names both sides", () => {
    const markup = render(<PrintPlot plot={plot} label="w" />);
    expect(words(markup)).toContain("curls below 307 µm");
    expect(words(markup)).toContain("curled about one axis");
    expect(markup).toMatch(/<rect x="\d+" y="12.5" width="[\d.]+" height="\d+(\.\d+)?" fill="var\(--wash\)"/);
    expect(render(<PrintPlot plot={warpPlot({ ...WARP, curling: undefined })} label="w" />)).not.toContain("--wash");
  });

  it("draws limits dotted and dashed with their words, and series by dash and marker", () => {
    const markup = render(<PrintPlot plot={plot} label="w" />);
    expect(attributes(markup, "stroke-dasharray").filter((dash) => dash === "2 3")).toHaveLength(2);
    expect(attributes(markup, "stroke-dasharray")).toContain("6 3");
    expect(attributes(markup, "stroke-dasharray")).toContain("5 4");
    for (const text of ["tape or ring", "below 150", "coater, 300 µm", "as drawn, 25 °C", "linear"])
      expect(words(markup)).toContain(text);
  });
});

describe("profile", () => {
  const xs = Array.from({ length: 41 }, (_, index) => -0.095 + (0.19 * index) / 40);
  const parabola = (curvature: number) => xs.map((x) => ({ x, y: (curvature * x * x) / 2 }));
  const input = {
    pre: parabola(0.002),
    post: parabola(0.044),
    difference: parabola(0.042),
    fit: parabola(0.042),
    radius: 0.1,
    edgeExclusion: 0.005,
    formatPosition: (metres: number) => `${Math.round(metres * 1e3)} mm`,
    formatHeight: (metres: number) => `${Math.round(metres * 1e6)} µm`,
  };

  it("rules the excluded rim on both sides with level lines", () => {
    const plot = profilePlot(input);
    expect(plot.leftOut).toEqual([
      { from: -0.1, to: -0.095 },
      { from: 0.095, to: 0.1 },
    ]);
    const ruled = attributes(render(<PrintPlot plot={plot} label="p" />), "d").filter((d) =>
      /^(M[\d.]+ [\d.]+H[\d.]+){20,}$/.test(d),
    );
    expect(ruled).toHaveLength(2);
    expect(profilePlot({ ...input, edgeExclusion: 0 }).leftOut).toEqual([]);
  });

  it("uses the minus sign, even ticks, and names all four curves", () => {
    const plot = profilePlot(input);
    expect(plot.x.ticks.map((tick) => tick.text)).toEqual(["−100", "−50", "0", "50", "100"]);
    const text = words(render(<PrintPlot plot={plot} label="p" />));
    for (const label of ["before film", "after film", "difference", "fitted parabola"]) expect(text).toContain(label);
  });

  it("is drawn on the server too", () => {
    expect(words(render(<ProfileChart data={input} label="Profile at 0°" summary="A bowl of 211 µm." />))).toContain(
      "A bowl of 211 µm.",
    );
  });
});

describe("chart on the server", () => {
  const markup = render(
    <WarpChart data={WARP} label="Warp, free wafer" summary="Warp grows as silicon gets thinner." />,
  );

  it("is the plain drawing in the chart's reserved place, without the charting library", () => {
    expect(markup).not.toContain("recharts");
    expect(markup).toContain('role="img" aria-label="Warp, free wafer"');
    expect(markup).toContain("min-h-");
  });

  it("says what it shows and carries its figures as a table", () => {
    expect(words(markup)).toContain("Warp grows as silicon gets thinner.");
    expect(markup).toContain("<details");
    expect(words(markup)).toMatch(/Silicon thickness as drawn, 25 °C linear 20 µm/);
    expect(words(markup)).toContain("100 µm 11.0 mm 8.0 mm");
  });
});
