/*
 * What a comparison works out of a flow, held to the engine by another way: warps to the findings and shapes of the walk, movers and
 * curves to whole walks of a flow that was changed by hand, and the released shapes to what the fixture's own program printed.
 */
import { describe, expect, it } from "vitest";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import type { Measured } from "#app/engine/measured.ts";
import { thinningCurve } from "#app/lib/flow-comparison/curve.ts";
import { flowFigures } from "#app/lib/flow-comparison/figures.ts";
import { flowMovers } from "#app/lib/flow-comparison/movers.ts";
import { decidingWarp } from "#app/lib/flow-comparison/tightest.ts";
import { DEMO_FLOWS, demoFlow } from "../../fixtures/demo-flow-input.ts";
import { assessed, figuresOf, limits } from "./samples.ts";

const alike = (found: number | undefined, wanted: number | undefined, share = 1e-9) =>
  expect(Math.abs((found ?? NaN) / (wanted ?? NaN) - 1)).toBeLessThan(share);

/** The flow stopped at a step that leaves another thickness, m. */
function stoppedAt(flow: FlowInput, number: number, thickness: number): FlowInput {
  const steps = flow.steps
    .slice(0, number)
    .map((step, index) =>
      index === number - 1 && step.siliconAfter
        ? { ...step, siliconAfter: { ...step.siliconAfter, value: thickness } }
        : step,
    );
  return { ...flow, steps };
}

const releasedWarp = (flow: FlowInput) => walkFlow(flow, limits).steps.at(-1)?.released.warp;

describe.each(DEMO_FLOWS)("%s", (name) => {
  const { flow, expected } = demoFlow(name);
  const { thinning, deciding, films } = figuresOf(name);
  const { findings, steps } = assessFlow(flow, limits);

  it("decides at the step whose warp uses most of its tool's limit, among all findings of the warp rule", () => {
    const judged = findings.flatMap(({ rule, step, limit, figures: [warp] }) =>
      rule === 2 && limit && warp ? [{ step, warp: warp.value, limit: limit.value }] : [],
    );
    const [most] = judged.toSorted((a, b) => b.warp / b.limit - a.warp / a.limit);
    expect(judged.length).toBeGreaterThan(1);
    expect(deciding?.judgedAt).toBe(most?.step);
    alike(deciding?.warp, most?.warp);
    alike(deciding?.limit?.value, most?.limit);
  });

  it("takes that warp from the shape of the walk: at the step, or as the step before has left the wafer", () => {
    const state = steps[(deciding?.step.number ?? 0) - 1]?.state;
    const shape = deciding?.moment === "atRoom" ? state?.atRoom : state?.atPeak;
    alike(deciding?.warp, shape?.warp);
    expect(deciding?.step.number).toBeLessThanOrEqual(deciding?.judgedAt ?? 0);
  });

  it("knows every step that thins and how far", () => {
    const thicknesses = [flow.wafer.thickness.value, ...steps.map(({ state }) => state.after.silicon.value)];
    const wanted = flow.steps.flatMap((_, index) => {
      const [to = 0, from = 0] = [thicknesses[index], thicknesses[index + 1]];
      return from < to ? [{ number: index + 1, from, to }] : [];
    });
    expect(thinning?.steps.map(({ number, from, to }) => ({ number, from, to }))).toEqual(wanted);
    expect(thinning?.range).toEqual({ from: wanted.at(-1)?.from, to: wanted[0]?.to });
  });

  it("warps on the way of its thinning as a flow that stops there, let go", () => {
    for (const step of thinning?.steps ?? [])
      for (const thickness of [step.from, Math.sqrt(step.from * step.to)])
        alike(thinning?.within(step, thickness).warp, releasedWarp(stoppedAt(flow, step.number, thickness)));
  });

  it("ends as the fixture's program says that the wafer would roll or not, were it let go", () => {
    for (const step of thinning?.steps ?? []) {
      const { regime } = expected[step.number - 1]?.if_released_free ?? {};
      expect(thinning?.within(step, step.from).curled).toBe(regime === "curled");
    }
  });

  it("has as its films what its steps put down, in their order", () => {
    const put = flow.steps.flatMap(({ adds }) => adds.map((each) => [each.film.name, each.thickness.value]));
    expect(films.map((each) => [each.name, each.thickness])).toEqual(put);
  });
});

describe("what moves the deciding warp", () => {
  /** Petrel with a tolerance on the film that is put down first. */
  const { flow: exact } = demoFlow("Petrel");
  const at = exact.steps.findIndex(({ adds }) => adds.length > 0);
  const stress = exact.steps[at]?.adds[0]?.stress;
  if (!stress) throw new Error("Petrel puts a film down.");
  const filmId = exact.steps[at]?.adds[0]?.film.id;
  const reach = 20e6;
  const withStress = (value: number, tolerance: number | null): FlowInput => ({
    ...exact,
    steps: exact.steps.map((step) => ({
      ...step,
      adds: step.adds.map((added) => {
        const same = added.film.id === filmId && added.stress.value === stress.value;
        const changed: Measured = { ...added.stress, value, tolerance };
        return same ? { ...added, stress: changed } : added;
      }),
    })),
  });
  const flow = withStress(stress.value, reach);
  const deciding = decidingWarp(assessed(flow));
  if (!deciding) throw new Error("Petrel lies with a warp of its own.");
  const place = { step: deciding.step.number, moment: deciding.moment };
  const movers = flowMovers(flow, place);

  it("is half of what lies between two whole walks with the input at both ends", () => {
    const warpAt = (by: number) => {
      const state = walkFlow(withStress(stress.value + by, null), limits).steps[place.step - 1];
      return (place.moment === "atRoom" ? state?.atRoom : state?.atPeak)?.warp ?? NaN;
    };
    const found = movers.find(({ unknown }) => unknown.label.endsWith(", stress"));
    expect(found?.whole).toBe(true);
    alike(found?.moves, Math.abs(warpAt(reach) - warpAt(-reach)) / 2, 1e-6);
  });

  it("stands largest first, with nothing in it that moves nothing", () => {
    const moves = movers.map((mover) => mover.moves);
    expect(moves.length).toBeGreaterThan(1);
    expect(moves).toEqual(moves.toSorted((a, b) => b - a));
    expect(Math.min(...moves)).toBeGreaterThan(0);
  });
});

describe("what cannot decide", () => {
  it("is told apart: without a judged warp the largest that the wafer lies with, and nothing where nothing lies", () => {
    const result = assessed(demoFlow("Tern").flow);
    const unjudged = { ...result, findings: result.findings.filter(({ rule }) => rule !== 2) };
    const largest = Math.max(...result.steps.flatMap(({ atRoom, atPeak }) => [atRoom?.warp ?? 0, atPeak?.warp ?? 0]));
    expect(decidingWarp(unjudged)).toMatchObject({ warp: largest, limit: null });
    const flat = { ...unjudged, steps: result.steps.map((step) => ({ ...step, atRoom: null, atPeak: null })) };
    expect(decidingWarp(flat)).toBeNull();
  });

  it("a flow that thins nothing has no curve over thickness", () => {
    const { flow } = demoFlow("Tern");
    const unthinned = { ...flow, steps: flow.steps.slice(0, 3).map((step) => ({ ...step, siliconAfter: null })) };
    expect(flowFigures(unthinned, assessed(unthinned)).thinning).toBeNull();
  });
});

describe("the curve over silicon thickness", () => {
  const { thinning } = figuresOf("Petrel");
  if (!thinning) throw new Error("Petrel is thinned.");
  const whole = thinningCurve({ letter: "A", name: "Petrel" }, thinning, thinning.range);

  it("goes from thin to thick within the range, and marks where the flow ends and where the wafer begins to curl", () => {
    const places = whole.points.map(({ x }) => x);
    expect(places).toEqual(places.toSorted((a, b) => a - b));
    expect(whole.own?.x).toBe(thinning.range.from);
    const onset = whole.onset?.x ?? NaN;
    expect(thinning.at(onset).curled).toBe(true);
    expect(thinning.at(onset * 1.001).curled).toBe(false);
  });

  it("leaves out what is outside the range, the dot of its end as well", () => {
    const middle = Math.sqrt(thinning.range.from * thinning.range.to);
    const part = thinningCurve({ letter: "A", name: "Petrel" }, thinning, { from: middle, to: thinning.range.to });
    expect(part.points.every(({ x }) => x >= middle)).toBe(true);
    expect(part.own).toBeNull();
  });
});
