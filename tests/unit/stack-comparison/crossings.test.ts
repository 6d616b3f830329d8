/* Where two stacks warp alike, against the full model and against a case with a known answer. */
import { describe, expect, it } from "vitest";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { withThickness } from "#app/engine/stack/model.ts";
import { allCrossings, pairSentence } from "#app/lib/comparison/crossing-words.ts";
import { warpCrossings, type PairOfWarps } from "#app/lib/comparison/crossings.ts";
import { stackCurves, type ComparedStack } from "#app/lib/stack-comparison/figures.ts";
import { layer, RANGE, stack } from "./samples.ts";

const plain = (text: string) => text.replaceAll("\u00A0", " ");
const curveOf = (sample: ComparedStack) => {
  const [found] = stackCurves([sample]);
  if (!found) throw new Error("The sample can be estimated.");
  return found.curve;
};
const pair = (one: ComparedStack, other: ComparedStack) => warpCrossings(curveOf(one), curveOf(other), RANGE);
const warpBy = ({ figures }: ComparedStack, thickness: number) =>
  figures ? estimateStack(withThickness(figures.stack, thickness)).shape.warp : NaN;

describe("crossings", () => {
  // A thin film that pulls hard beside a thick one that pulls a little more: the thick one stiffens the wafer where it is thin.
  const thin = stack("A", [layer({ um: 0.2, MPa: 100 })]);
  const thick = stack("B", [layer({ um: 10, MPa: 2.2 })]);

  it("are roots of the full model to the last digits, and none between them is left out", () => {
    const found = pair(thin, thick);
    if (found.kind !== "crossing") throw new Error(`They cross, but were called ${found.kind}.`);
    for (const { thickness, warp } of found.at) {
      expect(warpBy(thin, thickness)).toBeCloseTo(warp, 9);
      expect(Math.abs(warpBy(thin, thickness) / warpBy(thick, thickness) - 1)).toBeLessThan(1e-7);
    }
    // Signs on a grid far finer than the search's own.
    let changes = 0;
    let before = 0;
    for (let n = 0; n <= 2000; n += 1) {
      const thickness = found.from * (RANGE.to / found.from) ** (n / 2000);
      const sign = Math.sign(warpBy(thin, thickness) - warpBy(thick, thickness));
      if (before !== 0 && sign !== before) changes += 1;
      before = sign;
    }
    expect(found.at).toHaveLength(changes);
  });

  it("of films that balance at one thickness lie on both sides of it", () => {
    const balanced = stack("A", [layer({ um: 5, MPa: 20 }), layer({ side: "back", um: 6, MPa: 16.7 })]);
    const weak = stack("B", [layer({ um: 0.1, MPa: 10 })]);
    const found = pair(balanced, weak);
    if (found.kind !== "crossing") throw new Error(`They cross, but were called ${found.kind}.`);
    expect(found.at.length).toBeGreaterThanOrEqual(2);
    for (const { thickness } of found.at) expect(warpBy(balanced, thickness)).toBeCloseTo(warpBy(weak, thickness), 10);
  });

  it("are told apart from stacks that are the same and from stacks that never meet", () => {
    const weak = stack("A", [layer({ um: 1, MPa: 20 })]);
    const strong = stack("B", [layer({ um: 1, MPa: 30 })], { um: 100 });
    expect(pair(weak, { ...weak, letter: "B" })).toEqual({ kind: "the same", from: RANGE.from });
    expect(pair(strong, weak)).toMatchObject({ kind: "apart", thinner: "first" });
    expect(pair(weak, strong)).toMatchObject({ kind: "apart", thinner: "second" });
  });

  it("are not looked for where one is rolled past half a turn, however low its closed roll lies", () => {
    const rolling = stack("A", [layer({ um: 5, MPa: 200 })]);
    const found = pair(rolling, stack("B", [layer({ um: 5, MPa: 60 })]));
    expect(found).toMatchObject({ kind: "apart", thinner: "first" });
    expect("from" in found ? found.from : 0).toBeGreaterThan(RANGE.from);
    expect(warpCrossings(curveOf(rolling), curveOf(rolling), { from: 10e-6, to: 12e-6 })).toEqual({
      kind: "rolled up",
    });
  });

  it("have numbers that run through all pairs, with a sentence for each pair", () => {
    const { marks, words } = allCrossings(stackCurves([thin, thick, stack("C", [layer({ MPa: 60 })])]), RANGE);
    expect(words.map(({ key }) => key)).toEqual(["AB", "AC", "BC"]);
    expect(marks.length).toBeGreaterThan(0);
    expect(marks.map(({ number }) => number)).toEqual(marks.map((_, n) => n + 1));
    expect(words.flatMap(({ numbers }) => numbers)).toEqual(marks.map(({ number }) => number));
  });

  it("are said in words", () => {
    const said = (pairOf: PairOfWarps) => plain(pairSentence("A", "B", pairOf, RANGE));
    const { from } = RANGE;
    const at = [{ thickness: 83.4e-6, warp: 4.12e-3 }];
    expect(said({ kind: "crossing", from, thinner: "first", at })).toBe(
      "A and B warp alike at 83.4 µm (4.12 mm). Thinner than that, A warps more.",
    );
    const two = [...at, { thickness: 310e-6, warp: 212e-6 }];
    expect(said({ kind: "crossing", from, thinner: "second", at: two })).toBe(
      "A and B warp alike two times, at 83.4 µm (4.12 mm) and 310 µm (212 µm). Thinner than the first of these, B warps more.",
    );
    expect(said({ kind: "apart", from: 41.2e-6, thinner: "second" })).toBe(
      "A and B are nowhere equal from 42 µm to 725 µm: B warps more at 42 µm. Below 42 µm one of them is rolled past half a turn.",
    );
    expect(said({ kind: "the same", from })).toBe("A and B warp the same from 20 µm to 725 µm.");
    expect(said({ kind: "rolled up" })).toContain("one of them is rolled past half a turn");
  });
});
