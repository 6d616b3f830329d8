/*
 * Laminates worked out for this program in 40-digit arithmetic by three routes (stiffness sums about the mid-plane, Hsueh's
 * closed form, equations of equilibrium), which agree to 25 digits. No printed values.
 *
 *   t        thickness                                m
 *   M        biaxial modulus                          Pa
 *   e        free strain                              1
 *   κ        curvature, bowl positive: minus the growth of strain with height, 1/m
 *   ε_0      strain at the mid-plane                  1
 *   σ        mean stress of a layer                   Pa
 */
import { describe, expect, it } from "vitest";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import { bowFromCurvature } from "#app/engine/stoney/bow.ts";
import { relative } from "../relative.ts";

/** A layer given by biaxial modulus and free strain: stress −M e at the reference temperature. */
function layer(thickness: number, modulus: number, freeStrain: number): Layer {
  return { thickness, youngsModulus: modulus, poissonsRatio: 0, stress: -modulus * freeStrain };
}

const cases = [
  {
    name: "100 µm wafer, 10 µm copper, misfit 0.0018",
    layers: [layer(100e-6, 180e9, 0), layer(10e-6, 169230769230.76923, -0.0018)],
    curvature: 7.77624124639086,
    midplane: null,
    means: [-21227869.75, 212278697.5],
  },
  {
    name: "775 µm wafer, 1 µm film",
    layers: [layer(775e-6, 180e9, 0), layer(1e-6, 100e9, -0.003)],
    curvature: 0.016623049627469,
    midplane: null,
    means: [-385987.8555, 299140588.0],
  },
  {
    name: "glass, adhesive, silicon heated by 175 K",
    layers: [layer(700e-6, 80e9, 0.0005775), layer(20e-6, 3333333333.3333335, 0.0105), layer(50e-6, 180e9, 0.000455)],
    curvature: 0.049390209977051,
    midplane: 0.000571710393289,
    means: [-324875.949, -33147804.75, 17807385.19],
  },
  {
    name: "seven layers",
    layers: [
      layer(700e-6, 93589743589.74359, -0.00032),
      layer(30e-6, 2.5e9, -0.007),
      layer(5e-6, 5384615384.615384, -0.00907142857142857),
      layer(5e-6, 177272727272.7273, -0.002234102564102564),
      layer(2e-6, 84337349397.59036, 0.0017235714285714287),
      layer(50e-6, 180e9, -0.00026),
      layer(1e-6, 84337349397.59036, 0.0023164285714285713),
    ],
    curvature: 0.094864580889289,
    midplane: -0.000336610908841,
    means: [-1141767.34, 16582936.81, 46862001.65, 330638956.8, -176506533.7, -20116482.49, -226918566.0],
  },
];

describe("laminates", () => {
  it.each(cases)("$name", ({ layers, curvature, midplane, means }) => {
    const solved = solveLaminate(layers);
    // Thirteen digits written down for the curvature, nine to ten for the others.
    expect(relative(solved.curvature, curvature)).toBeLessThan(1e-12);
    if (midplane !== null) expect(relative(solved.midplaneStrain, midplane)).toBeLessThan(1e-11);
    means.forEach((mean, n) => expect(relative(solved.meanStress[n], mean)).toBeLessThan(2e-8));
  });

  it("stresses at the faces of the first case", () => {
    const { stressBottom, stressTop } = solveLaminate(cases[0]?.layers ?? []);
    expect(relative(stressBottom[0], 48758301.47)).toBeLessThan(1e-9);
    expect(relative(stressTop[0], -91214040.97)).toBeLessThan(1e-9);
    expect(relative(stressBottom[1], 218858594.0)).toBeLessThan(1e-9);
    expect(relative(stressTop[1], 205698801.1)).toBeLessThan(1e-9);
  });

  it("bow of the second case on a 300 mm wafer", () => {
    const { curvature } = solveLaminate(cases[1]?.layers ?? []);
    expect(relative(bowFromCurvature({ curvature, radius: 0.15 }), 0.0001870093083)).toBeLessThan(1e-9);
  });

  it("mean film stress from curvature: (M_s h³ + M_f h_f³) κ / (6 h_f (h + h_f))", () => {
    const solved = solveLaminate(cases[0]?.layers ?? []);
    const mean = ((180e9 * 100e-6 ** 3 + 169230769230.76923 * 10e-6 ** 3) * solved.curvature) / (6 * 10e-6 * 110e-6);
    expect(relative(mean, 212278697.5)).toBeLessThan(1e-9);
    expect(relative(solved.meanStress[1], mean)).toBeLessThan(1e-12);
  });
});

describe("thick film against the thin-film formula, film as stiff as the wafer", () => {
  it.each([
    [0.001, 0.99700599],
    [0.01, 0.97059015],
    [0.05, 0.8638376],
    [0.1, 0.7513148],
    [0.2, 0.5787037],
    [0.5, 0.2962963],
    [1.0, 0.125],
  ])("thickness ratio %d", (ratio, expected) => {
    const film = layer(ratio * 1e-4, 180e9, -1e-3);
    const { curvature } = solveLaminate([layer(1e-4, 180e9, 0), film]);
    const thin = stoneyCurvature({
      filmStress: 180e6,
      filmThickness: ratio * 1e-4,
      substrateThickness: 1e-4,
      biaxialModulus: 180e9,
    });
    // Seven to eight digits written down; the closed form is (1 + ratio)^−3.
    expect(relative(curvature / thin, expected)).toBeLessThan(1e-7);
    expect(relative(curvature / thin, (1 + ratio) ** -3)).toBeLessThan(1e-12);
  });
});

describe("reference state of a second film", () => {
  const wafer = layer(100e-6, 180e9, 0);

  it.each([
    { thickness: 10e-6, first: 2.9151228, virgin: 5.0123762, chucked: 5.1564943 },
    { thickness: 1e-6, first: 0.32923975, virgin: 0.65022266, chucked: 0.65203666 },
  ])("films of $thickness m at 100 MPa", ({ thickness, first, virgin, chucked }) => {
    const film = layer(thickness, 100e9, -1e-3);
    const one = solveLaminate([wafer, film]);
    // Eight digits written down.
    expect(relative(one.curvature, first)).toBeLessThan(2e-8);
    // Quoted on the virgin wafer, the convention of the engine: order and company do not matter.
    expect(relative(solveLaminate([wafer, film, film]).curvature, virgin)).toBeLessThan(2e-8);
    // Quoted while the coated wafer is held flat: the second film is longer by the strain of the flat stack.
    const flatStrain = (-1e-3 * 100e9 * thickness) / (180e9 * 100e-6 + 100e9 * thickness);
    const second = { ...film, plasticStrain: flatStrain };
    expect(relative(solveLaminate([wafer, film, second]).curvature, chucked)).toBeLessThan(2e-8);
  });
});
