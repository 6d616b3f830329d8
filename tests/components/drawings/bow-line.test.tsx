import { describe, expect, it } from "vitest";
import { BowLine, type BowLineProps } from "#app/components/drawings/BowLine.tsx";
import { bandPath, linePath, offsetCurve, type BowCurve } from "#app/components/drawings/bow-curve.ts";
import { drawBow, type BowShape } from "#app/components/drawings/bow-shape.ts";
import { HOLDINGS } from "#app/engine/vocabulary.ts";
import { attributes, render } from "./render.ts";

const D = 0.3;
const BOX = { width: 60, height: 60, middleY: 30 };
const draw = (shape: BowShape, exaggeration = 150) => drawBow(shape, D, exaggeration, BOX);
/** Rim height less centre height on the drawing, y down: negative means that the rim is drawn above the centre. */
const rimBelowCentre = (shape: BowShape) => {
  const { curve } = draw(shape);
  return offsetCurve(curve, 0).end[1] - curve.centreY;
};

function line(props: Partial<BowLineProps> = {}): string {
  return render(
    <BowLine
      diameter={D}
      shape={{ kind: "bowed", bow: 200e-6 }}
      deviceSideUp
      holding="bare"
      exaggeration={150}
      width={76}
      height={32}
      label="edges down 200 µm"
      {...props}
    />,
  );
}

describe("direction", () => {
  it("draws edges up with the rim above the centre, edges down with the rim below", () => {
    expect(rimBelowCentre({ kind: "bowed", bow: -200e-6 })).toBeLessThan(0);
    expect(rimBelowCentre({ kind: "bowed", bow: 200e-6 })).toBeGreaterThan(0);
    expect(rimBelowCentre({ kind: "rolled", radius: 0.3, edgesUp: true })).toBeLessThan(0);
    expect(rimBelowCentre({ kind: "rolled", radius: 0.3, edgesUp: false })).toBeGreaterThan(0);
    expect(rimBelowCentre({ kind: "flat" })).toBe(0);
    expect(rimBelowCentre({ kind: "held" })).toBe(0);
  });
});

describe("scale", () => {
  it("draws E times the true proportion of height to width", () => {
    const bow = 343e-6;
    const { curve } = draw({ kind: "bowed", bow }, 200);
    const [x, y] = offsetCurve(curve, 0).end;
    expect((y - curve.centreY) / (2 * x)).toBeCloseTo((200 * bow) / D, 9);
  });

  it("keeps E when the line is too high for its box", () => {
    const { curve } = drawBow({ kind: "bowed", bow: 800e-6 }, D, 150, { ...BOX, height: 10 });
    const [x, y] = offsetCurve(curve, 0).end;
    expect(y - curve.centreY).toBeCloseTo(10, 9);
    expect((y - curve.centreY) / (2 * x)).toBeCloseTo((150 * 800e-6) / D, 9);
  });

  it("draws a rolled wafer true, whatever the page's exaggeration, and keeps its length", () => {
    for (const exaggeration of [1, 400]) {
      const { curve } = draw({ kind: "rolled", radius: 0.172, edgesUp: true }, exaggeration);
      if (curve.kind !== "arc") throw new Error("a rolled wafer is an arc");
      expect(2 * curve.radius * curve.halfAngle).toBeCloseTo(BOX.width, 9);
      expect(curve.radius / BOX.width).toBeCloseTo(0.172 / D, 9);
    }
  });

  it("stops a roll short of closing", () => {
    const { curve } = draw({ kind: "rolled", radius: 0.03, edgesUp: true });
    expect(curve).toMatchObject({ kind: "arc", halfAngle: 0.96 * Math.PI });
  });

  it("prints the scale where asked, ×1 for a rolled wafer", () => {
    expect(line({ showScale: true })).toContain(">×150<");
    expect(line({ showScale: true, shape: { kind: "rolled", radius: 0.2, edgesUp: true } })).toContain(">×1<");
    expect(line()).not.toContain("×");
  });
});

describe("saddle", () => {
  it("has a solid section along x and a dashed one along y through the same centre on the datum", () => {
    const drawn = draw({ kind: "saddle", bowX: -180e-6, bowY: 120e-6 });
    expect(drawn.across?.centreY).toBe(drawn.curve.centreY);
    expect(drawn.datumY).toBe(drawn.curve.centreY);
    const markup = line({ shape: { kind: "saddle", bowX: -180e-6, bowY: 120e-6 } });
    expect(attributes(markup, "stroke-dasharray")).toContain("5 3");
  });
});

describe("curve beside the middle line", () => {
  const curves: BowCurve[] = [
    { kind: "parabola", centreY: 30, half: 30, rise: 20 },
    { kind: "parabola", centreY: 30, half: 30, rise: -20 },
    { kind: "parabola", centreY: 30, half: 30, rise: 0 },
    { kind: "arc", centreY: 30, radius: 20, halfAngle: 1.2, edgesUp: true },
    { kind: "arc", centreY: 30, radius: 20, halfAngle: 1.2, edgesUp: false },
  ];

  it.each(curves)("lies at the asked distance from the rim, above for positive offsets: %o", (curve) => {
    const rim = offsetCurve(curve, 0).end;
    const above = offsetCurve(curve, 3).end;
    expect(Math.hypot(above[0] - rim[0], above[1] - rim[1])).toBeCloseTo(3, 9);
    expect(above[1]).toBeLessThan(rim[1]);
  });

  it("passes the centre at the asked distance as well", () => {
    const path = linePath({ kind: "parabola", centreY: 30, half: 30, rise: 20 }, -5);
    const [, first = 0] =
      path
        .match(/C-?[\d.]+ (-?[\d.]+)/)
        ?.slice(0, 2)
        .map(Number) ?? [];
    const end = offsetCurve({ kind: "parabola", centreY: 30, half: 30, rise: 20 }, -5).end[1];
    // Middle of a symmetrical cubic: a quarter of its ends and three quarters of its control points.
    expect(end / 4 + (3 * first) / 4).toBeCloseTo(35, 1);
  });

  it("closes a band", () => {
    expect(bandPath({ kind: "arc", centreY: 30, radius: 20, halfAngle: 1, edgesUp: true }, -2, -6)).toMatch(
      /^M.*A.*L.*A.*Z$/,
    );
  });
});

describe("what holds the wafer", () => {
  /** Heights of the first point of every path of a flat wafer: its own line is at 16. */
  const heights = (markup: string) => attributes(markup, "d").map((d) => Number(d.match(/^M-?[\d.]+ (-?[\d.]+)/)?.[1]));
  const flat = (props: Partial<BowLineProps>) => line({ shape: { kind: "held" }, withoutDatum: true, ...props });

  it("draws a carrier as a closed band below, with the device side facing it when that is down", () => {
    const [carrier = 0, wafer = 0, device = 0] = heights(flat({ holding: "carrier", deviceSideUp: false }));
    expect(wafer).toBe(16);
    expect(device).toBeGreaterThan(wafer);
    expect(carrier).toBeGreaterThan(device);
    expect(flat({ holding: "carrier" })).toMatch(/ d="M[^"]*Z"/);
  });

  it("draws the device side above when it is up", () => {
    const [wafer = 0, device = 0] = heights(flat({ deviceSideUp: true }));
    expect(device).toBeLessThan(wafer);
  });

  it("draws tape as a dashed line, a frame with two open squares as well, an edge ring with the squares alone", () => {
    const squares = (markup: string) => markup.match(/<rect/g)?.length ?? 0;
    const dashes = (markup: string) => attributes(markup, "stroke-dasharray");
    expect(dashes(flat({ holding: "grinding tape" }))).toEqual(["3 2"]);
    expect(squares(flat({ holding: "grinding tape" }))).toBe(0);
    expect(dashes(flat({ holding: "film frame" }))).toEqual(["3 2"]);
    expect(squares(flat({ holding: "film frame" }))).toBe(2);
    expect(dashes(flat({ holding: "edge ring" }))).toEqual([]);
    expect(squares(flat({ holding: "edge ring" }))).toBe(2);
  });

  it("tells every holding from every other without colour", () => {
    const drawings = HOLDINGS.map((holding) => flat({ holding }).replace(/var\(--[a-z]+\)/g, ""));
    expect(new Set(drawings).size).toBe(HOLDINGS.length);
  });
});

describe("words", () => {
  it("is an image with a name, or hidden where the words stand beside it", () => {
    expect(line()).toContain('role="img" aria-label="edges down 200 µm"');
    const silent = line({ label: "" });
    expect(silent).toContain('aria-hidden="true"');
    expect(silent).not.toContain("role=");
  });
});
