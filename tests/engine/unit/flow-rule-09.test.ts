/*
 *   cover     bump height over what covers it, 1; left: what remains over it, m
 *   variation total thickness variation, m; linear: sum, root-sum-square: of independent ones
 */
import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { adhesive, bondStep, carrier, exact, findings, flow, outcomes, step, tapeStep, um } from "./flow-samples.ts";

const bumped = (height: number, tolerance: number | null = null): StepInput =>
  step({ kind: "reflow", bumps: { height: exact(um(height), tolerance) } });

describe("rule 9, cover", () => {
  it.each([
    { height: 27.9, outcome: "clear" },
    { height: 28, outcome: "caution" },
    { height: 34, outcome: "caution" },
    { height: 35, outcome: "caution" },
    { height: 35.1, outcome: "do not run" },
  ])("bumps of $height µm in 40 µm of adhesive: $outcome", ({ height, outcome }) => {
    const [found] = findings(flow([bumped(height), bondStep()]), 9);
    expect(found).toMatchObject({ outcome });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it.each([
    { left: 10.1, outcome: "clear" },
    { left: 10, outcome: "caution" },
    { left: 5, outcome: "caution" },
    { left: 4.9, outcome: "do not run" },
  ])("$left µm left over low bumps: $outcome", ({ left, outcome }) => {
    const onto = { carrier: carrier(), material: adhesive(), thickness: exact(um(10 + left)) };
    expect(outcomes(flow([bumped(10), bondStep({ bond: onto })]), 9)).toEqual([
      outcome === "clear" ? "clear" : outcome,
    ]);
  });

  it("takes the bumps at their tallest", () => {
    expect(outcomes(flow([bumped(27.9, um(1)), bondStep()]), 9)).toEqual(["caution"]);
  });

  it("stops bumps that stand out", () => {
    const [found] = findings(flow([bumped(50), bondStep()]), 9);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("they stand out");
  });

  it("cannot judge bumps of unknown height, and asks nothing where there are none", () => {
    expect(outcomes(flow([step({ kind: "reflow" }), bondStep()]), 9)).toEqual(["cannot judge"]);
    expect(outcomes(flow([step({ kind: "reflow" }), tapeStep()]), 9)).toEqual(["cannot judge"]);
    expect(outcomes(flow([step(), bondStep()]), 9)).toEqual([]);
    expect(outcomes(flow([step(), tapeStep()]), 9)).toEqual([]);
  });

  const tape = (depth: number | null) =>
    tapeStep({ tape: { name: "Soft tape", embeddingDepth: depth === null ? null : exact(um(depth)) } });

  it.each([
    { depth: 200, outcome: "clear" },
    { depth: 100, outcome: "caution" },
    { depth: 60, outcome: "do not run" },
    { depth: 0, outcome: "do not run" },
    { depth: null, outcome: "cannot judge" },
  ])("bumps of 70 µm in a tape that takes up $depth µm: $outcome", ({ depth, outcome }) => {
    expect(outcomes(flow([bumped(70), tape(depth)]), 9)).toEqual([outcome]);
  });

  it("covers topography where there are no bumps", () => {
    const topography = step({ topography: exact(um(4)) });
    expect(findings(flow([topography, bondStep()]), 9)[0]?.reason).toContain("Topography of 4");
  });
});

describe("rule 9, thickness budget", () => {
  /** Carrier 0.5 µm, adhesive 2 % of 40 µm = 0.8 µm, and the grind: linear 1.3 µm + grind. */
  const ground = (
    grind: number | null,
    final = 50,
    more: Partial<StepInput> = {},
    onto = carrier(),
    material = adhesive(),
  ) =>
    flow([
      bondStep({}, material, onto),
      step({
        kind: "grind",
        planned: "carrier",
        siliconAfter: exact(um(final), 0),
        thicknessVariation: grind === null ? null : exact(um(grind)),
        ...more,
      }),
    ]);

  it.each([
    { grind: 3.6, outcome: "clear" },
    { grind: 3.7, outcome: "caution" },
    { grind: 4.9, outcome: "caution" },
    { grind: 5, outcome: "do not run" },
  ])("a grind of $grind µm to 50 µm, of which a tenth is allowed: $outcome", ({ grind, outcome }) => {
    // At 3.7 µm the sum is exactly 5 µm; at 4.9 µm the root-sum-square is 4.99 µm, at 5 µm it is 5.09 µm.
    const [found] = findings(ground(grind), 9);
    expect(found).toMatchObject({ outcome, limit: { label: "A tenth of the final thickness" } });
    expect(found?.figures.map(({ working }) => working?.equation)).toEqual([
      "thickness-budget-linear",
      "thickness-budget",
    ]);
  });

  it("is held to what the vias stand proud where that is less", () => {
    const [found] = findings(ground(1, 50, { viaProtrusion: exact(um(2)) }), 9);
    expect(found).toMatchObject({ outcome: "caution", limit: { value: um(2), label: "Protrusion of the vias" } });
  });

  it("cannot judge with a contribution missing, and names it", () => {
    const [found] = findings(ground(null), 9);
    expect(found).toMatchObject({ outcome: "cannot judge" });
    expect(found?.reason).toContain("variation of grind is not given");
    const none = ground(
      null,
      50,
      {},
      carrier({ thicknessVariation: null }),
      adhesive({ thicknessVariationShare: null }),
    );
    expect(findings(none, 9)[0]?.reason).toContain("carrier, adhesive, grind is not given");
  });

  it("stops where the known ones alone are too much", () => {
    expect(outcomes(ground(9, 50, {}, carrier({ thicknessVariation: null })), 9)).toEqual(["do not run"]);
  });

  it("is judged once, at the last thinning on the carrier", () => {
    const input = ground(1);
    const relieved = step({ kind: "stress relief", planned: "carrier", siliconAfter: exact(um(48), 0) });
    const both = flow([...input.steps, relieved]);
    expect([2, 3].map((at) => outcomes(both, 9, { at }).length)).toEqual([0, 1]);
  });

  it("takes the adhesive of this bond where it is known better", () => {
    const input = ground(1);
    const measured = flow(
      input.steps.map((one) =>
        one.bond ? { ...one, bond: { ...one.bond, thicknessVariation: exact(um(0.2)) } } : one,
      ),
    );
    expect(findings(measured, 9)[0]?.figures[0]?.value).toBeCloseTo(um(1.7), 12);
  });

  it("asks on tape only when the tape's own variation is known", () => {
    const grind = step({
      kind: "grind",
      planned: "grinding tape",
      siliconAfter: exact(um(50), 0),
      thicknessVariation: exact(um(1)),
    });
    expect(outcomes(flow([tapeStep(), grind]), 9)).toEqual([]);
    const tape = tapeStep({ tape: { name: "Tape", thicknessVariation: exact(um(3)) } });
    expect(outcomes(flow([tape, grind]), 9)).toEqual(["clear"]);
  });
});
