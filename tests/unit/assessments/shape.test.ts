/**
 * Symbols: warp w and bow b in m, roll radius r in m, u standard uncertainty in m. The standard bow is positive when the centre
 * lies above the plane with the device side up.
 */
import { describe, expect, it } from "vitest";
import { releasedText, shapeText, standardBowText } from "#app/lib/assessment-shape.ts";
import { isRolled, lyingAs } from "#app/lib/lying-as.ts";
import type { ShapeResult } from "#app/schemas/assessment-result.ts";

const bowl: ShapeResult = {
  temperature: 298.15,
  bow: -228e-6,
  warp: 228e-6,
  edgesUp: true,
  regime: "linear",
  stabilityRatio: 0.11,
  rollRadius: null,
  standardUncertainty: 10e-6,
  working: null,
};
const rolled: ShapeResult = { ...bowl, regime: "curled", stabilityRatio: 41.07, rollRadius: 0.324, warp: 15.3e-3 };
const plain = (text: string | null) => text?.replaceAll("\u00A0", " ");

describe("the bow line", () => {
  it("is drawn as the wafer lies: edges up is a low centre, whichever side is up", () => {
    expect(lyingAs(bowl)).toEqual({ kind: "bowed", bow: -228e-6 });
    expect(lyingAs({ ...bowl, bow: 228e-6, edgesUp: true })).toEqual({ kind: "bowed", bow: -228e-6 });
    expect(lyingAs({ ...bowl, edgesUp: false })).toEqual({ kind: "bowed", bow: 228e-6 });
  });

  it("of a rolled wafer keeps its radius, and one on tape is held", () => {
    expect(lyingAs(rolled)).toEqual({ kind: "rolled", radius: 0.324, edgesUp: true });
    expect(lyingAs(null)).toEqual({ kind: "held" });
  });
});

describe("the words", () => {
  it("are as loaded, with the standard bow second", () => {
    expect(plain(shapeText(bowl))).toBe("edges up 228 ± 20 µm");
    expect(plain(shapeText({ ...bowl, edgesUp: false }))).toBe("edges down 228 ± 20 µm");
    expect(plain(standardBowText(bowl))).toBe("standard bow −228 ± 20 µm");
  });

  it("call a wafer flat that the site calls flat, and still say how much", () => {
    expect(plain(shapeText({ ...bowl, warp: 4e-6, standardUncertainty: 2e-6 }, "flat"))).toBe("flat, 4.0 ± 4.0 µm");
  });

  it("give a rolled wafer a radius and an edge lift, and never a bow", () => {
    expect(plain(shapeText(rolled))).toBe("rolls up, radius about 0.32 m, edges lift 15 mm");
    expect(plain(shapeText({ ...rolled, rollRadius: 0.0276 }))).toContain("radius about 28 mm");
    expect(standardBowText(rolled)).toBeNull();
    expect(isRolled(rolled)).toBe(true);
  });

  it("set the load of a wafer that is let go against the one at which it rolls", () => {
    expect(plain(releasedText(rolled))).toBe(
      "rolls up, radius about 0.32 m, edges lift 15 mm. Its load is 41 times the one at which it starts to roll",
    );
    expect(plain(releasedText({ ...bowl, standardUncertainty: null }))).toBe(
      "edges up 228 µm, device side up. Its load is 0.11 of the one at which it starts to roll",
    );
  });
});
