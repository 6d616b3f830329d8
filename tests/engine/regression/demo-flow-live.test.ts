/* What a page judges while somebody types is what an assessment says, without the workings. */
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { judgeFlow } from "#app/engine/flow/judge.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const without = (findings: Finding[]) =>
  findings.map((finding) => ({
    ...finding,
    figures: finding.figures.map((figure) => ("working" in figure ? { ...figure, working: null } : figure)),
  }));

describe.each(["Tern", "Fulmar A"])("%s", (name) => {
  it("is judged as it is assessed", { timeout: 60_000 }, () => {
    const { flow } = demoFlow(name);
    const limits = defaultLimits();
    const assessed = assessFlow(flow, limits);
    const { steps, findings, verdict } = judgeFlow(flow, limits);
    expect(findings).toEqual(without(assessed.findings));
    expect(verdict).toEqual(assessed.verdict);
    expect(
      steps.map(({ outcome, required, uncertainty, budget }) => ({ outcome, required, uncertainty, budget })),
    ).toEqual(
      assessed.steps.map(({ outcome, required, uncertainty, budget }) => ({ outcome, required, uncertainty, budget })),
    );
    expect(assessed.findings.some(({ figures }) => figures.some(({ working }) => working))).toBe(true);
  });
});
