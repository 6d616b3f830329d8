import { describe, expect, it } from "vitest";
import type { IncomingGate } from "#app/engine/flow/handling-inputs.ts";
import { exact, flow, findings, outcomes, step, um } from "./flow-samples.ts";

type Lot = NonNullable<IncomingGate["lot"]>;
const good: Lot = {
  name: "L1",
  bow: um(-90),
  warp: um(95),
  thickness: um(725),
  edgeChips: "none",
  identity: "matches",
};

const gated = (lot: Partial<Lot> | null, gate: IncomingGate = {}) => ({
  ...flow([step({ kind: "receive" }), step({ kind: "measure" })], { tolerance: 10 }),
  gate: { bow: exact(um(-90), um(30)), warp: exact(um(150)), ...gate, lot: lot && { ...good, ...lot } },
});
const worst = (lot: Partial<Lot>) => outcomes(gated(lot), 15).filter((outcome) => outcome !== "clear");

describe("rule 15, incoming gate", () => {
  it("is clear for a lot as assessed, at the incoming measurement", () => {
    expect(outcomes(gated({}), 15)).toEqual(["clear", "clear", "clear"]);
    expect(outcomes(gated({}), 15, { at: 1 })).toEqual([]);
  });

  it("has nothing to judge in a plan", () => {
    expect(outcomes(gated(null), 15)).toEqual([]);
    expect(outcomes(flow([step()]), 15)).toEqual([]);
  });

  it.each([
    { bow: -119, outcome: [] },
    { bow: -120, outcome: ["caution"] },
    { bow: -121, outcome: ["do not run"] },
    { bow: -60, outcome: ["caution"] },
    { bow: -59, outcome: ["do not run"] },
    { bow: -180, outcome: ["do not run"] },
  ])("a bow of $bow µm against −90 ± 30 µm: $outcome", ({ bow, outcome }) => {
    expect(worst({ bow: um(bow) })).toEqual(outcome);
  });

  it.each([
    { warp: 149, outcome: [] },
    { warp: 150, outcome: ["caution"] },
    { warp: 151, outcome: ["do not run"] },
  ])("a warp of $warp µm against at most 150 µm: $outcome", ({ warp, outcome }) => {
    expect(worst({ warp: um(warp) })).toEqual(outcome);
  });

  it.each([
    { thickness: 716, outcome: [] },
    { thickness: 715, outcome: ["caution"] },
    { thickness: 714, outcome: ["do not run"] },
    { thickness: 736, outcome: ["do not run"] },
  ])("a thickness of $thickness µm against 725 ± 10 µm: $outcome", ({ thickness, outcome }) => {
    expect(worst({ thickness: um(thickness) })).toEqual(outcome);
  });

  it.each(["bow", "warp", "thickness", "edgeChips", "identity"] as const)("cannot judge without its %s", (what) => {
    const [found] = findings(gated({ [what]: null }), 15).filter(({ outcome }) => outcome !== "clear");
    expect(found).toMatchObject({ outcome: "cannot judge" });
    expect(found?.remedy).toBeTruthy();
  });

  it("stops a lot with edge chips, or of another identity", () => {
    expect(worst({ edgeChips: "found" })).toEqual(["do not run"]);
    expect(worst({ identity: "differs" })).toEqual(["do not run"]);
  });
});
