/*
 * Many stacks bent together: however many there are, and wherever their numbers stand, each bends as it does alone.
 *
 *   κ   curvature   1/m
 */
import { describe, expect, it } from "vitest";
import { MOST_LAYERS } from "#app/engine/laminate/laminate-sums.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { BLOCK } from "#app/engine/uncertainty/drawing.ts";
import { laminateInputValues, laminateModel } from "#app/engine/uncertainty/laminate-model.ts";
import { relative } from "../relative.ts";

const film = (n: number): Layer => ({
  thickness: (1 + (n % 3)) * 1e-7,
  youngsModulus: (60 + n) * 1e9,
  poissonsRatio: 0.2,
  stress: (150 + 7 * n) * 1e6,
  cte: 2e-6,
  coverage: n % 2 === 0 ? 1 : 0.6,
});

const silicon: Layer = { thickness: 200e-6, youngsModulus: 130e9, poissonsRatio: 0.28, cte: "silicon" };

const stackOf = (films: number, change: Partial<Layer> = {}): Layer[] => [
  { ...silicon },
  ...Array.from({ length: films }, (_, n) => ({ ...film(n), ...change })),
];

/** The inputs of a stack in so many rows, thicknesses a little more from row to row. */
function rowsOf(layers: readonly Layer[], rows: number): Float64Array {
  const values = laminateInputValues(layers);
  return Float64Array.from({ length: rows * values.length }, (_, place) => {
    const n = place % values.length;
    const row = (place - n) / values.length;
    return (values[n] ?? 0) * (n < layers.length ? 1 + row * 1e-4 : 1);
  });
}

const inRow = (layers: readonly Layer[], row: number): Layer[] =>
  layers.map((layer) => ({ ...layer, thickness: layer.thickness * (1 + row * 1e-4) }));

describe("many stacks together", () => {
  const cases: [string, Layer[], number, number][] = [
    ["more rows than are bent at once", stackOf(4, { coverage: 1 }), 298.15, 300],
    ["films that cover a part, hot", stackOf(4), 500, 300],
    ["so many layers that few stacks fit", stackOf(180), 500, 70],
    ["so many layers that few stacks fit, as stated", stackOf(180, { coverage: 1 }), 298.15, 70],
  ];

  it.each(cases)("%s: every row as by itself", (_, layers, temperature, rows) => {
    const out = new Float64Array(rows);
    laminateModel(layers, { temperature }).curvature.evaluate(rowsOf(layers, rows), rows, out);
    // The sums are about the neutral plane of the first row, up to 3 % off that of the last.
    out.forEach((curvature, row) => {
      expect(relative(curvature, solveLaminate(inRow(layers, row), { temperature }).curvature)).toBeLessThan(1e-12);
    });
  });

  it.each(cases)("%s: a figure that bends a laminate itself disturbs nothing", (_, layers, temperature, rows) => {
    const plain = new Float64Array(rows);
    const disturbed = new Float64Array(rows);
    const model = laminateModel(layers, { temperature });
    model.curvature.evaluate(rowsOf(layers, rows), rows, plain);
    const warp = (curvature: number) => {
      solveLaminate([silicon, film(3)]);
      return curvature;
    };
    model.shape({ warp, sagitta: warp }, "warp").evaluate(rowsOf(layers, rows), rows, disturbed);
    expect(disturbed).toEqual(plain);
  });

  it("gives the same where the rows stand in its own memory, and leaves them there", () => {
    for (const [layers, temperature] of [
      [stackOf(4, { coverage: 1 }), 298.15],
      [stackOf(4), 500],
    ] as const) {
      const { curvature } = laminateModel(layers, { temperature });
      const { block } = curvature;
      if (!block) throw new Error("five layers fit");
      const rows = rowsOf(layers, BLOCK);
      const out = new Float64Array(BLOCK);
      const inPlace = new Float64Array(BLOCK);
      curvature.evaluate(rows, BLOCK, out);
      block.set(rows);
      curvature.evaluate(block, BLOCK, inPlace);
      expect(inPlace).toEqual(out);
      expect(block.subarray(0, rows.length)).toEqual(rows);
    }
  });

  it("refuses more layers than there is room for", () => {
    expect(solveLaminate(stackOf(MOST_LAYERS - 1)).curvature).toBeGreaterThan(0);
    expect(() => solveLaminate(stackOf(MOST_LAYERS))).toThrow("at most 4096");
  });
});
