/* Uncertainty of a bow from the tolerances of its stack. */
import { describe, expect, it } from "vitest";
import type { StackInput } from "#app/engine/stack/model.ts";
import { bowUncertainty, warpUncertainty } from "#app/engine/stack/warp-uncertainty.ts";
import { relative } from "../relative.ts";

const stack = (stress: number, tolerance: number | undefined): StackInput => ({
  wafer: { diameter: 0.2, orientation: "100", thickness: 725e-6 },
  films: [
    {
      side: "front",
      thickness: 1e-6,
      stress,
      youngsModulus: 117e9,
      poissonsRatio: 0.34,
      stressTolerance: tolerance,
    },
  ],
});

describe("the uncertainty of a bow", () => {
  it("is that of the warp where the wafer is a bowl, and keeps the sign of the bow", () => {
    const [bow, warp] = [bowUncertainty(stack(100e6, 10e6)), warpUncertainty(stack(100e6, 10e6))];
    expect(bow?.linear).toBe(true);
    expect(bow?.value).toBeGreaterThan(0);
    expect(relative(bow?.standardUncertainty ?? NaN, warp?.standardUncertainty ?? NaN)).toBeLessThan(1e-3);
    expect(bowUncertainty(stack(-100e6, 10e6))?.value).toBeLessThan(0);
  });

  it("of a flat wafer does not shrink with it, as that of a warp does, which has no sign", () => {
    const flat = bowUncertainty(stack(0, 10e6));
    const bent = bowUncertainty(stack(100e6, 10e6));
    expect(relative(flat?.standardUncertainty ?? NaN, bent?.standardUncertainty ?? NaN)).toBeLessThan(1e-2);
    expect(warpUncertainty(stack(0, 10e6))?.standardUncertainty).toBeLessThan(
      1e-3 * (flat?.standardUncertainty ?? NaN),
    );
  });

  it("is unknown where nothing has a tolerance", () => {
    expect(bowUncertainty(stack(100e6, undefined))).toBeNull();
  });
});
