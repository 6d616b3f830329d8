import { describe, expect, it } from "vitest";
import type { SampledStep, SampledWarps } from "#app/engine/flow/sample-warps.ts";
import { wafersRun } from "#app/lib/wafers-run.ts";
import { wafersView } from "#app/lib/wafers-view.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";
import { exact, flow, step } from "../../engine/unit/flow-samples.ts";

const nb = (text: string) => text.replaceAll("\u00A0", " ");

const planned = flow([step({ title: "Coat" }), step({ title: "Cure", peakTemperature: 523.15 })]);

function view(steps: Partial<SampledStep>[]) {
  const warps: SampledWarps = {
    draws: 20_000,
    inputs: 7,
    steps: steps.map((each, index) => ({ step: index + 1, warps: [], beyond: [], ...each })),
  };
  return wafersView(warps, planned);
}

const warp = (band: [number, number], moment: "atRoom" | "atPeak" = "atRoom") => ({
  moment,
  nominal: (band[0] + band[1]) / 2,
  band,
  standardErrors: [0.2e-6, 0.3e-6] as [number, number],
  firstOrder: band,
});

describe("wafers drawn, in words", () => {
  it.each([
    [[82e-6, 104e-6], "edges up 82 to 104 µm"],
    [[-104e-6, -82e-6], "edges down 82 to 104 µm"],
    [[12.34e-6, 56.78e-6], "edges up 12.3 to 56.8 µm"],
    [[-12e-6, 30e-6], "edges down 12 µm to edges up 30 µm"],
  ] as [[number, number], string][])("a band of %j m is %s", (band, words) => {
    expect(nb(view([{ warps: [warp(band)] }]).rows[0]?.drawn ?? "")).toBe(words);
  });

  it("says when it is free at peak, and which steps have no shape", () => {
    const { rows, without, ends } = view([{}, { warps: [warp([1e-6, 2e-6]), warp([3e-6, 4e-6], "atPeak")] }]);
    expect(rows.map(({ step: number, title, when }) => [number, title, nb(when)])).toEqual([
      [2, "Cure", "as it leaves"],
      [2, "Cure", "free at 250 °C"],
    ]);
    expect(without).toEqual([1]);
    expect(nb(ends ?? "")).toBe("0.3 µm");
  });

  it("names for each limit the moment at which most wafers are beyond", () => {
    const share = (when: "as it is loaded" | "as it leaves", edges: "up" | "down", probability: number) => ({
      edges,
      limit: 400e-6,
      when,
      chance: { probability, standardError: 0.0013 },
    });
    const [row] = view([
      {
        warps: [warp([1e-6, 2e-6])],
        beyond: [
          share("as it is loaded", "up", 0.002),
          share("as it leaves", "up", 0.0321),
          share("as it is loaded", "down", 0),
          share("as it leaves", "down", 0),
        ],
      },
    ]).rows;
    expect(row?.beyond.map(({ limit, share: said, some }) => [nb(limit), nb(said), some])).toEqual([
      ["up 400 µm", "3.2 ± 0.1 % as it leaves", true],
      ["down 400 µm", "none", false],
    ]);
  });

  it("says all rather than a share without an error", () => {
    const chance = { probability: 1, standardError: 0.00005 };
    const beyond = [{ edges: "up" as const, limit: 1e-4, when: "as it leaves" as const, chance }];
    expect(view([{ warps: [warp([1e-6, 2e-6])], beyond }]).rows[0]?.beyond[0]?.share).toBe("all as it leaves");
  });
});

describe("a flow of 24 steps with tolerances on everything that it adds", () => {
  const { flow: fulmar } = demoFlow("Fulmar A");
  const spread = {
    ...fulmar,
    steps: fulmar.steps.map((each) => ({
      ...each,
      adds: each.adds.map((film) => ({
        ...film,
        thickness: exact(film.thickness.value, film.thickness.value / 20),
        stress: exact(film.stress.value, Math.abs(film.stress.value) / 5),
      })),
    })),
  };

  it("tells how far it is and comes to a row for every step with a shape", () => {
    const run = wafersRun({ flow: spread, limits: defaultLimits() });
    let told = 0;
    for (;;) {
      const next = run.next();
      if (!next.done) {
        expect(next.value.done).toBeGreaterThan(told);
        told = next.value.done;
        continue;
      }
      expect(told).toBe(20_000);
      const { rows, without } = next.value;
      expect(new Set([...rows.map(({ step: number }) => number), ...without]).size).toBe(fulmar.steps.length);
      return;
    }
  });
});
