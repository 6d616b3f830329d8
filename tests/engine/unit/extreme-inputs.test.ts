/*
 * The ends of what may be put in: 5 nm of film on 775 µm, 5 µm of silicon, 100 layers, wafers of 450 mm. Results stay accurate
 * there, or are refused by the name of the input.
 *
 *   M_i, h_i, f_i   biaxial modulus, thickness, area fraction of layer i     Pa, m, 1
 *   e_i             free strain of layer i                                   1
 *   κ               curvature, bowl positive                                 1/m
 *   S               load over the load at which a free wafer rolls           1
 *
 * Reference: the two equations of equilibrium as they stand about the bottom face, solved in 64 digits by a general matrix
 * package. Tolerances: what double precision leaves, 1e-10 for a curvature, which a 5 nm film makes of parts 1e5 times as large.
 */
import { all, create, type BigNumber } from "mathjs";
import { describe, expect, it } from "vitest";
import {
  assessFlow,
  defaultLimits,
  estimateStack,
  laminateInputValues,
  laminateModel,
  leastThickness,
  solveDirectionalLaminate,
  solveLaminate,
  walkFlow,
  type Layer,
  type StackInput,
} from "#app/engine/index.ts";
import { relative } from "../relative.ts";
import { addition, adhesive, bondStep, carrier, celsius, exact, film, flow, step, um } from "./flow-samples.ts";

const math = create(all ?? {}, { number: "BigNumber", precision: 64 });
const big = (value: number) => math.bignumber(value);

interface Slab {
  modulus: BigNumber;
  thickness: number;
  coverage: number;
  strain: BigNumber;
}

/** Curvature of slabs, bottom to top: integrals of strain and of strain times height, both zero. */
function bruteForce(slabs: Slab[]): number {
  let [a, b, d, n, q, low] = [big(0), big(0), big(0), big(0), big(0), big(0)];
  for (const { modulus, thickness, coverage, strain } of slabs) {
    const high = low.plus(thickness);
    const stiffness = modulus.times(coverage);
    const first = high.minus(low);
    const second = high.pow(2).minus(low.pow(2)).div(2);
    a = a.plus(stiffness.times(first));
    b = b.plus(stiffness.times(second));
    d = d.plus(stiffness.times(high.pow(3).minus(low.pow(3)).div(3)));
    n = n.plus(stiffness.times(first).times(strain));
    q = q.plus(stiffness.times(second).times(strain));
    low = high;
  }
  const solved = math.lusolve(
    math.matrix([
      [a, b],
      [b, d],
    ]),
    math.matrix([[n], [q]]),
  );
  return -math.number(math.subset(solved, math.index(1, 0)) as unknown as BigNumber);
}

/** A layer that carries a stress at 25 °C. */
function slab({ thickness, youngsModulus, poissonsRatio, stress = 0, coverage = 1 }: Layer): Slab {
  const modulus = big(youngsModulus).div(big(1).minus(big(poissonsRatio)));
  return {
    modulus,
    thickness,
    coverage,
    strain: big(typeof stress === "number" ? stress : NaN)
      .div(modulus)
      .neg(),
  };
}

const silicon = (thickness: number): Layer => ({
  thickness,
  youngsModulus: 151.3e9,
  poissonsRatio: 0.1605,
  cte: "silicon",
});
const filmOf = (thickness: number, stress: number, youngsModulus = 270e9): Layer => ({
  thickness,
  youngsModulus,
  poissonsRatio: 0.25,
  stress,
  cte: 2.3e-6,
});
const many = Array.from({ length: 99 }, (_, n) => ({
  ...filmOf(5e-9 * 1.09 ** n, (n % 2 === 0 ? 1 : -1) * (100 + n) * 1e6, (3 + 3 * n) * 1e9),
  coverage: n % 3 === 0 ? 0.4 : 1,
}));

const stacks: [string, Layer[]][] = [
  ["5 nm on 775 µm", [silicon(775e-6), filmOf(5e-9, 1.1e9)]],
  ["5 nm under 775 µm", [filmOf(5e-9, -1.1e9), silicon(775e-6)]],
  ["5 nm of a weak stress on 925 µm", [silicon(925e-6), filmOf(5e-9, 1e3)]],
  ["5 nm on either side of 775 µm, nearly balanced", [filmOf(5e-9, 1e9), silicon(775e-6), filmOf(5e-9, 1.0001e9)]],
  ["1 µm on 5 µm", [silicon(5e-6), filmOf(1e-6, -3e8)]],
  ["50 µm on 5 µm", [silicon(5e-6), filmOf(50e-6, 4e7, 3e9)]],
  ["5 nm on 5 µm", [silicon(5e-6), filmOf(5e-9, 1e9)]],
  ["100 layers from 5 nm to 23 µm on 775 µm", [silicon(775e-6), ...many]],
  ["100 layers on 5 µm", [...many.slice(0, 50), silicon(5e-6), ...many.slice(50)]],
];

describe("a laminate at the ends of what may be put in", () => {
  it.each(stacks)("%s is as accurate as double precision allows", (_, layers) => {
    const wanted = bruteForce(layers.map(slab));
    expect(relative(solveLaminate(layers).curvature, wanted)).toBeLessThan(1e-10);
    const both = solveDirectionalLaminate(layers);
    expect(relative(both.curvatureX, wanted)).toBeLessThan(1e-9);
    expect(relative(both.curvatureY, wanted)).toBeLessThan(1e-9);
    const values = Float64Array.from(laminateInputValues(layers));
    const sampled = new Float64Array(1);
    laminateModel(layers).curvature.evaluate(values, 1, sampled);
    expect(relative(sampled[0], wanted)).toBeLessThan(1e-9);
  });
});

const stack = (diameter: number, thickness: number, films: [number, number][]): StackInput => ({
  wafer: { diameter, orientation: "111", thickness },
  films: films.map(([height, stress]) => ({
    side: "front",
    thickness: height,
    stress,
    youngsModulus: 70e9,
    poissonsRatio: 0.17,
    expansion: 0.5e-6,
  })),
});

describe("a free wafer at the ends of what may be put in", () => {
  it("of 450 mm with 5 nm bends as little as it should", () => {
    const { shape, laminate } = estimateStack(stack(0.45, 925e-6, [[5e-9, -3e8]]));
    // A spherical bowl: κ R²/2, the exact arc and the plate's second order both below 1e-6 here.
    expect(relative(shape.bowMajor, (laminate.curvature * 0.225 ** 2) / 2)).toBeLessThan(1e-6);
    expect(shape.regime).toBe("linear");
  });

  it("of 5 µm rolls up into a tube, as an endless one does", () => {
    for (const diameter of [0.1, 0.45]) {
      const { shape, disc, laminate } = estimateStack(stack(diameter, 5e-6, [[1e-6, -3e8]]));
      expect(shape.regime).toBe("curled");
      expect(shape.stabilityRatio).toBeGreaterThan(1e3);
      // An endless roll has (1 + ν) κ; edges that stay behind take a share of the order 1/sqrt(S) of it.
      const roll = (1 + disc.poissonsRatio) * Math.abs(laminate.curvature);
      expect(relative(1 / (shape.rollRadius ?? NaN), roll)).toBeLessThan(2 / Math.sqrt(shape.stabilityRatio));
      for (const value of [shape.bowMajor, shape.bowMinor, shape.warp]) expect(Number.isFinite(value)).toBe(true);
    }
  });

  it("has a least thickness down to 5 µm on 450 mm", () => {
    const weak = stack(0.45, 925e-6, [[20e-9, -1e7]]);
    const found = leastThickness(weak, 1e-3, { thinnest: 5e-6, thickest: 925e-6 });
    if (found.kind !== "answer") throw new Error("there is an answer");
    expect(relative(estimateStack(stack(0.45, found.value, [[20e-9, -1e7]])).shape.warp, 1e-3)).toBeLessThan(1e-9);
  });
});

describe("a flow at the ends of what may be put in", () => {
  const limits = defaultLimits();
  const oxide = film({ youngsModulus: exact(70e9), poissonsRatio: exact(0.17) });
  const hundred = Array.from({ length: 100 }, (_, n) =>
    addition({
      film: oxide,
      thickness: exact(5e-9 * (n + 1)),
      stress: exact((n % 2 === 0 ? 1 : -1) * (100 + n) * 1e6),
    }),
  );

  it("with 100 films bends as the laminate does", () => {
    const [made] = walkFlow(flow([step({ adds: hundred })], { thickness: 925, diameter: 0.45 }), limits).steps;
    if (!made?.atRoom) throw new Error("it lies free");
    const wanted = bruteForce(made.atRoom.layers.map(slab));
    expect(relative(made.atRoom.linearCurvature, wanted)).toBeLessThan(1e-10);
  });

  it("with 5 µm of silicon and 100 films is walked through yielding, bond and heat without a gap", () => {
    const copper = film({
      kind: "metal",
      youngsModulus: exact(117e9),
      poissonsRatio: exact(0.34),
      expansion: exact(16.7e-6),
      yieldStress: exact(150e6),
    });
    const adds = hundred.map((one, n) => (n % 4 === 0 ? { ...one, film: copper } : one));
    const steps = [
      step({ adds }),
      bondStep({}, adhesive(), carrier({ diameter: 0.45 })),
      step({ kind: "grind", siliconAfter: exact(um(5)), planned: "carrier" }),
      step({ kind: "anneal", peakTemperature: celsius(350), planned: "carrier" }),
    ];
    const { steps: assessed } = assessFlow(flow(steps, { thickness: 925, diameter: 0.45 }), limits);
    for (const { state } of assessed) {
      const shapes = [state.atRoom, state.atPeak, state.released].filter((shape) => shape !== null);
      for (const { sagitta, sagittaMinor, warp } of shapes)
        for (const value of [sagitta, sagittaMinor, warp]) expect(Number.isFinite(value)).toBe(true);
      for (const { stress } of state.filmStress) expect(Number.isFinite(stress)).toBe(true);
    }
  });

  it.each([
    [{ thickness: exact(5e-11) }, /thickness/],
    [{ stress: exact(1e12) }, /stress/],
    [{ coverage: 1.2 }, /coverage/],
  ])("beyond them names the step and the film: %o", (change, name) => {
    expect(() => walkFlow(flow([step({ adds: [addition(change)] })]), limits)).toThrow(name);
    expect(() => walkFlow(flow([step({ adds: [addition(change)] })]), limits)).toThrow(/steps\[0\]/);
  });

  it("without silicon, hotter than silicon's expansion is known, or on a wafer of no size is refused by name", () => {
    const plain = flow([step({ adds: [addition()], peakTemperature: 1600 })]);
    expect(() => walkFlow(plain, limits)).toThrow(/1500/);
    expect(() => walkFlow(flow([step()], { thickness: 0 }), limits)).toThrow(/thickness/);
    expect(() => walkFlow(flow([step({ adds: [addition()] })], { diameter: 0 }), limits)).toThrow(/radius/);
  });
});
