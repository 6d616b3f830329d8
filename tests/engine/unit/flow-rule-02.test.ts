import { describe, expect, it } from "vitest";
import type { EquipmentInput, StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import {
  addition,
  bondStep,
  celsius,
  exact,
  film,
  findings,
  flow,
  outcomes,
  step,
  tapeStep,
  tool,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();

/** A film that bows a free wafer: tension on the device side lifts the edges. */
const pulling = (overrides: Partial<StepInput> = {}, stress = 400e6): StepInput =>
  step({
    kind: "deposit",
    title: "Deposit",
    adds: [addition({ stress: exact(stress), thickness: exact(um(2)) })],
    ...overrides,
  });

const warpAt = (steps: StepInput[]) => walkFlow(flow(steps), limits).steps.at(-1)?.atRoom?.warp ?? 0;

const taking = (edgesUp: number | null, edgesDown: number | null, more: Partial<EquipmentInput> = {}) =>
  tool({
    warpLimitEdgesUp: edgesUp === null ? null : exact(edgesUp),
    warpLimitEdgesDown: edgesDown === null ? null : exact(edgesDown),
    ...more,
  });

describe("rule 2, warp against the tool's limits", () => {
  const warp = warpAt([pulling()]);
  const against = (edgesUp: number) => outcomes(flow([pulling({ equipment: taking(edgesUp, um(1)) })]), 2);

  it("is clear below limit minus margin, a caution from there to the limit, and stops beyond it", () => {
    expect(warp).toBeGreaterThan(um(100));
    expect(against(warp / 0.799)).toEqual(["clear"]);
    expect(against(warp / 0.8)).toEqual(["caution"]);
    expect(against(warp)).toEqual(["caution"]);
    expect(against(warp * 0.999)).toEqual(["do not run"]);
  });

  it("takes the margin that the site has set", () => {
    const wide = { ...limits, warpMargin: { value: 0.5, source: "site" } };
    expect(outcomes(flow([pulling({ equipment: taking(warp / 0.6, um(1)) })]), 2, { limits: wide })).toEqual([
      "caution",
    ]);
  });

  it("holds edges up and edges down against their own limits", () => {
    expect(outcomes(flow([pulling({ equipment: taking(um(1000), um(1)) })]), 2)).toEqual(["clear"]);
    const pushing = pulling({ equipment: taking(um(1000), um(1)) }, -400e6);
    const [found] = findings(flow([pushing]), 2);
    expect(found).toMatchObject({ outcome: "do not run", limit: { label: "Tool, edges down" } });
    expect(found?.reason).toMatch(/^Edges down \d/);
  });

  it("turns the direction round while the pair lies back side up", () => {
    const thin = [
      pulling(),
      bondStep(),
      step({
        kind: "grind",
        planned: "carrier",
        siliconAfter: exact(um(200), um(3)),
        equipment: taking(um(2000), um(2000)),
      }),
    ];
    // The film lies on the carrier once little silicon is left: it lifts the edges, a dome with the device side up.
    const dome = walkFlow(flow(thin), limits).steps.at(-1)?.atRoom;
    expect(dome?.sagitta).toBeLessThan(0);
    const [found] = findings(flow(thin), 2);
    expect(found?.reason).toMatch(/^Edges up/);
  });

  it("gives the standard bow second: negative for a film in tension", () => {
    const [found] = findings(flow([pulling()]), 2);
    expect(found?.figures[0]?.value).toBeGreaterThan(0);
    expect(found?.figures[1]).toMatchObject({ label: "Bow, device side up" });
    expect(found?.figures[1]?.value).toBeLessThan(0);
    expect(found?.figures[0]?.working).toBeTruthy();
  });

  it("judges the wafer as it is loaded too", () => {
    const [found] = findings(flow([pulling(), tapeStep({ equipment: taking(um(50), um(50)) })]), 2);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("as it is loaded");
  });

  it("judges the peak only where the tool leaves the wafer free", () => {
    const hot = {
      peakTemperature: celsius(300),
      adds: [addition({ film: film({ expansion: exact(30e-6) }), thickness: exact(um(2)) })],
    };
    const [held] = findings(flow([step({ ...hot, equipment: taking(um(2000), um(2000), { atPeak: "held" }) })]), 2);
    const [free] = findings(flow([step({ ...hot, equipment: taking(um(2000), um(2000), { atPeak: "free" }) })]), 2);
    expect(held?.reason).toContain("as it leaves");
    expect(free?.reason).toContain("at 300 °C, free".replace(" °", "\u00a0°"));
  });

  it("calls flat what is flat, and says nothing of a wafer that is held flat", () => {
    const [found] = findings(flow([step()]), 2);
    expect(found).toMatchObject({ outcome: "clear" });
    expect(found?.reason).toMatch(/^Flat, 0/);
    expect(findings(flow([tapeStep(), step({ planned: "grinding tape" })]), 2)).toEqual([]);
  });

  it("says how far the edges lift and how tightly it rolls, never a bow, once it has curled", () => {
    const thin = [pulling({ siliconAfter: exact(um(60), um(3)), equipment: taking(um(500), um(500)) })];
    const [found] = findings(flow(thin), 2);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toMatch(/^Rolls up, radius about 0\.\d+\u00a0m, edges lift \d+\u00a0µm as it leaves/);
  });

  it("cannot judge without a tool, or without the limit for the way it lies", () => {
    expect(outcomes(flow([pulling({ equipment: null })]), 2)).toEqual(["cannot judge"]);
    const [found] = findings(flow([pulling({ equipment: taking(null, um(1000)) })]), 2);
    expect(found).toMatchObject({ outcome: "cannot judge", limit: null });
    expect(found?.reason).toContain("has no warp limit for edges up");
  });

  it("says in words how many wafers are expected beyond the limit", () => {
    const spread = pulling({
      adds: [addition({ stress: exact(400e6, 80e6), thickness: exact(um(2)) })],
      equipment: taking(warp * 1.05, um(500)),
    });
    const [found] = findings(flow([spread]), 2);
    expect(found?.reason).toContain("±");
    expect(found?.reason).toContain("up to half of the wafers");
  });
});
