/*
 * The process window over two inputs, and contours on a grid.
 *
 *   x, y      values of the two inputs, SI
 *   level     value of the field on a contour
 */
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { applyChange, type FlowChange } from "#app/engine/trial/change.ts";
import { contours } from "#app/engine/window/contours.ts";
import { processWindow, type ProcessWindow } from "#app/engine/window/window.ts";
import { demoCatalogue } from "../../fixtures/demo-catalogue.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();
const { flow } = demoFlow("Petrel");

const axes = {
  x: {
    from: 2e-6,
    to: 8e-6,
    change: (value: number): FlowChange => ({ quantity: "film thickness", step: 6, film: 0, value }),
  },
  y: {
    from: 40e-6,
    to: 59e-6,
    change: (value: number): FlowChange => ({ quantity: "silicon after", step: 12, value }),
  },
};

function windowOf(cells: number): ProcessWindow {
  const search = processWindow(flow, limits, axes, { cells });
  for (;;) {
    const next = search.next();
    if (next.done) return next.value;
  }
}

describe("process window of Petrel, plated copper against silicon", () => {
  const found = windowOf(16);
  const at = (column: number, row: number) => found.points[row * 17 + column];

  it("has a point for every place and walks a part of them", () => {
    expect(found.points).toHaveLength(17 * 17);
    expect(found.walks).toBeLessThan(17 * 17);
  });

  it("runs with little copper and does not with much", () => {
    expect(at(0, 8)?.outcome).toBe("caution");
    expect(at(16, 8)?.outcome).toBe("do not run");
  });

  it.each([
    [0, 0],
    [16, 16],
    [8, 8],
    [3, 13],
    [11, 5],
  ])("says at column %i, row %i what a whole assessment says", (column, row) => {
    const [x, y] = [found.x[column] ?? 0, found.y[row] ?? 0];
    const changed = [axes.x.change(x), axes.y.change(y)].reduce(
      (variant, change) => applyChange(variant, change, demoCatalogue),
      flow,
    );
    expect(at(column, row)?.outcome).toBe(assessFlow(changed, limits).verdict.outcome);
  });

  it("tells how far it is, and once it has looked everywhere what is known so far", () => {
    const search = processWindow(flow, limits, axes, { cells: 16 });
    let [done, partial] = [0, 0];
    for (;;) {
      const next = search.next();
      if (next.done) break;
      expect(next.value.done).toBe((done += 1));
      expect(next.value.of).toBeGreaterThanOrEqual(done);
      const soFar = next.value.soFar();
      expect(soFar === null).toBe(done <= 25);
      if (!soFar) continue;
      partial += 1;
      expect(soFar.points).toHaveLength(17 * 17);
      expect(soFar.walks).toBe(done);
    }
    expect(done).toBe(found.walks);
    expect(partial).toBe(found.walks - 25);
  });

  it("can be left between two walks", () => {
    const search = processWindow(flow, limits, axes, { cells: 8 });
    expect(search.next().value).toMatchObject({ done: 1, of: 9 });
    expect(search.return({ x: [], y: [], points: [], walks: 0 }).done).toBe(true);
  });

  it("refuses an empty range and cells that cannot be halved", () => {
    const same = { ...axes.x, to: axes.x.from };
    expect(() => processWindow(flow, limits, { ...axes, x: same }).next()).toThrow(/empty/);
    expect(() => processWindow(flow, limits, axes, { cells: 7 }).next()).toThrow(/multiple of 4/);
  });
});

describe("contours", () => {
  const grid = [0, 1, 2, 3, 4];
  const field = (f: (x: number, y: number) => number) => grid.flatMap((y) => grid.map((x) => f(x, y)));

  it("of a slope are one straight line", () => {
    const [line, ...others] = contours(
      grid,
      grid,
      field((x) => x),
      1.5,
    );
    expect(others).toEqual([]);
    expect(line?.every(({ x }) => x === 1.5)).toBe(true);
    expect(line).toHaveLength(5);
  });

  it("of a hill are one closed line around it", () => {
    const lines = contours(
      grid,
      grid,
      field((x, y) => -((x - 2) ** 2) - (y - 2) ** 2),
      -2,
    );
    expect(lines).toHaveLength(1);
    expect(lines[0]?.at(0)).toEqual(lines[0]?.at(-1));
  });

  it("of a saddle keep apart what its middle keeps apart", () => {
    const lines = contours([0, 1], [0, 1], [1, -2, -2, 1], 0);
    expect(lines).toHaveLength(2);
  });

  it("leave out what is not known, and are none where the level is not reached", () => {
    expect(contours([0, 1], [0, 1], [1, null, -1, 1], 0)).toEqual([]);
    expect(
      contours(
        grid,
        grid,
        field(() => 1),
        0,
      ),
    ).toEqual([]);
  });
});
