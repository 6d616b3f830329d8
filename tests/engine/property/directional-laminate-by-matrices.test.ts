/*
 * The directional laminate by another route: each layer's compliance written down, inverted and turned as a tensor by a
 * general matrix package, and the six equations of equilibrium solved as they stand about the mid-plane.
 *
 *   E, ν, G   Young's modulus, Poisson's ratio, shear modulus   Pa, 1, Pa
 *   S         compliance                                        1/Pa
 *   g         share of the blanket stress kept across a line    1
 *   α, ΔT     expansion, rise over 25 °C                        1/K, K
 *   κ         curvature, bowl positive                          1/m
 */
import fc from "fast-check";
import { inv, lusolve, multiply, transpose } from "mathjs";
import { describe, expect, it } from "vitest";
import type { DirectionalLayer } from "#app/engine/directional/layer.ts";
import { solveDirectionalLaminate } from "#app/engine/directional/solve-directional-laminate.ts";
import { edgeRelief, transferLength } from "#app/engine/patterned/edge-relief.ts";
import { between, logarithmic } from "./arbitraries.ts";

type Rows = number[][];

interface Sample {
  layer: DirectionalLayer;
  /** Compliance in the layer's own axes, whole film and as the wafer feels it. */
  blanket: Rows;
  felt: Rows;
  angle: number;
  coverage: number;
  stress: number[];
  expansion: number;
}

const angles = between(-3, 3);
/** Whole pascals: a denormal stress would test nothing but the end of the number range. */
const stresses = fc.integer({ min: -1e9, max: 1e9 }).map((value) => (value === 0 ? 0 : value));

const films: fc.Arbitrary<Sample> = fc
  .record({
    thickness: logarithmic(10e-9, 1e-4),
    youngsModulus: logarithmic(1e8, 400e9),
    poissonsRatio: between(0, 0.45),
    x: stresses,
    y: stresses,
    cte: between(0, 60e-6),
    coverage: between(0.05, 1),
    lineWidth: logarithmic(1e-6, 1e-3),
    direction: angles,
  })
  .map(({ x, y, coverage, lineWidth, direction, ...layer }) => {
    const { youngsModulus: e, poissonsRatio: nu, thickness } = layer;
    const g = edgeRelief(lineWidth, transferLength(thickness, e, "line"));
    return {
      layer: { ...layer, stress: { x, y }, pattern: { kind: "lines", coverage, lineWidth, direction } },
      blanket: [
        [1 / e, -nu / e, 0],
        [-nu / e, 1 / e, 0],
        [0, 0, (2 * (1 + nu)) / e],
      ],
      // Along a line a pull stretches it as a bar; across, it gives way as the relieved edges let it.
      felt: [
        [1 / e, -nu / e, 0],
        [-nu / e, (1 - nu * nu * (1 - g)) / (g * e), 0],
        [0, 0, (2 * (1 + nu)) / (g * e)],
      ],
      angle: direction,
      coverage,
      stress: [x, y, 0],
      expansion: layer.cte,
    };
  });

const [C11, C12, C44] = [165.64e9, 63.94e9, 79.51e9];
const determinant = (C11 - C12) * (C11 + 2 * C12);
const [S11, S12, S44] = [(C11 + C12) / determinant, -C12 / determinant, 1 / C44];

const wafers: fc.Arbitrary<Sample> = fc
  .record({ thickness: logarithmic(20e-6, 1e-3), angle: angles, cte: between(2e-6, 4e-6) })
  .map(({ thickness, angle, cte }) => {
    const compliance = [
      [S11, S12, 0],
      [S12, S11, 0],
      [0, 0, S44],
    ];
    return {
      layer: { thickness, cte, silicon: { direction: "100", angle } },
      blanket: compliance,
      felt: compliance,
      angle,
      coverage: 1,
      stress: [0, 0, 0],
      expansion: cte,
    };
  });

/** Stiffness in the axes x, y: strain tensor turned into the material's axes, stress turned back. */
function stiffnessInPlane(compliance: Rows, angle: number): Rows {
  const own = inv(compliance);
  const turn = [
    [Math.cos(angle), Math.sin(angle)],
    [-Math.sin(angle), Math.cos(angle)],
  ];
  const columns = [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ].map(([x = 0, y = 0, shear = 0]) => {
    const strain: Rows = [
      [x, shear / 2],
      [shear / 2, y],
    ];
    const inside = multiply(multiply(turn, strain), transpose(turn));
    const along = [inside[0]?.[0] ?? NaN, inside[1]?.[1] ?? NaN, 2 * (inside[0]?.[1] ?? NaN)];
    const [sx = NaN, sy = NaN, tau = NaN] = multiply(own, along);
    const stress: Rows = [
      [sx, tau],
      [tau, sy],
    ];
    const outside = multiply(multiply(transpose(turn), stress), turn);
    return [outside[0]?.[0] ?? NaN, outside[1]?.[1] ?? NaN, outside[0]?.[1] ?? NaN];
  });
  return transpose(columns);
}

/** Strain at the mid-plane and its growth per height, as one vector of six. */
function byMatrices(samples: Sample[], rise: number): number[] {
  const total = samples.reduce((sum, { layer }) => sum + layer.thickness, 0);
  const six: Rows = Array.from({ length: 6 }, () => new Array<number>(6).fill(0));
  const right = new Array<number>(6).fill(0);
  let below = -0.5;
  for (const { layer, blanket, felt, angle, coverage, stress, expansion } of samples) {
    // Heights in units of the stack's thickness, so that all rows are of one size.
    const [low, high] = [below, below + layer.thickness / total];
    below = high;
    const powers = [high - low, (high ** 2 - low ** 2) / 2, (high ** 3 - low ** 3) / 3];
    const q = stiffnessInPlane(felt, angle);
    const thermal = [expansion * rise, expansion * rise, 0];
    const free = multiply(inv(stiffnessInPlane(blanket, angle)), stress).map((value, n) => (thermal[n] ?? NaN) - value);
    const pull = multiply(q, free);
    for (let i = 0; i < 6; i += 1) {
      right[i] = (right[i] ?? NaN) + coverage * (powers[i < 3 ? 0 : 1] ?? NaN) * (pull[i % 3] ?? NaN);
      for (let j = 0; j < 6; j += 1) {
        const power = powers[(i < 3 ? 0 : 1) + (j < 3 ? 0 : 1)] ?? NaN;
        const row = six[i];
        if (row) row[j] = (row[j] ?? NaN) + coverage * power * (q[i % 3]?.[j % 3] ?? NaN);
      }
    }
  }
  const solution = lusolve(six, right) as Rows;
  return solution.map(([value = NaN], n) => (n < 3 ? value : value / total));
}

describe("solveDirectionalLaminate against general matrices", () => {
  it("lines, unequal stress, silicon at any angle, any temperature: curvatures, twist and strains to 1e-10", () => {
    const stacks = fc.tuple(fc.array(films, { maxLength: 3 }), wafers, fc.array(films, { maxLength: 3 }));
    fc.assert(
      fc.property(stacks, fc.integer({ min: -150, max: 300 }), ([lower, wafer, upper], rise) => {
        const samples = [...lower, wafer, ...upper];
        const [x = NaN, y = NaN, xy = NaN, kx = NaN, ky = NaN, ks = NaN] = byMatrices(samples, rise);
        const solved = solveDirectionalLaminate(
          samples.map(({ layer }) => layer),
          { temperature: 298.15 + rise },
        );
        const strain = Math.max(1e-20, ...solved.freeStrain.flatMap((e) => [e.x, e.y, e.xy].map(Math.abs)));
        const total = samples.reduce((sum, { layer }) => sum + layer.thickness, 0);
        // Rounding of the six equations about the mid-plane, which is the less careful of the two routes.
        expect(Math.abs(solved.midplaneStrain.x - x)).toBeLessThanOrEqual(1e-10 * strain);
        expect(Math.abs(solved.midplaneStrain.y - y)).toBeLessThanOrEqual(1e-10 * strain);
        expect(Math.abs(solved.midplaneStrain.xy - xy)).toBeLessThanOrEqual(1e-10 * strain);
        expect(Math.abs(solved.curvatureX + kx)).toBeLessThanOrEqual((1e-10 * strain) / total);
        expect(Math.abs(solved.curvatureY + ky)).toBeLessThanOrEqual((1e-10 * strain) / total);
        expect(Math.abs(2 * solved.twist + ks)).toBeLessThanOrEqual((1e-10 * strain) / total);
      }),
    );
  });
});
