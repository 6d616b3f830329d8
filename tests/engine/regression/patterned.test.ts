/*
 * Lines on a wafer in the two limits, worked out for this program from the limits of Shen, Suresh and Blech 1996 and Wikström,
 * Gudmundson and Suresh 1999 (from memory of the named publications). No printed values. And the shear lag between the limits
 * against this program's own finite elements.
 *
 *   f      area fraction covered               1
 *   σ      stress of the blanket film          Pa
 *   h_f    film thickness                      m
 *   N      film force per width                N/m
 *   κ      curvature, bowl positive            1/m
 *   w, g   line width; share of the stress kept across it
 */
import { describe, expect, it } from "vitest";
import { solveDirectionalLaminate } from "#app/engine/directional/solve-directional-laminate.ts";
import { directionalStoneyCurvature } from "#app/engine/patterned/directional-stoney.ts";
import { edgeRelief, transferLength } from "#app/engine/patterned/edge-relief.ts";
import { patternedFilm } from "#app/engine/patterned/patterned-film.ts";
import { relative } from "../relative.ts";

const film = { stress: 200e6, thickness: 3e-6, youngsModulus: 117e9, poissonsRatio: 0.34 };
const wafer = { substrateThickness: 200e-6, youngsModulus: 169e9, poissonsRatio: 0.0625 };
const lines = (lineWidth: number) => ({ kind: "lines" as const, coverage: 0.5, lineWidth, direction: 0 });

describe("half covered by lines of 3 µm at 200 MPa on 200 µm of silicon, lines along <110>", () => {
  it("narrow lines: N = 198 N/m along, none across, κ = 0.17574 and −0.0109837 1/m", () => {
    const { force } = patternedFilm({ ...film, pattern: lines(1e-10) });
    // Three digits written down, and exact in the limit: 0.5 × 200 MPa × 3 µm × 0.66.
    expect(relative(force.x, 198)).toBeLessThan(1e-9);
    expect(Math.abs(force.y)).toBeLessThan(1e-6);
    const { x, y } = directionalStoneyCurvature({ ...wafer, force });
    // Five to six digits written down.
    expect(relative(x, 0.17574)).toBeLessThan(2e-5);
    expect(relative(y, -0.0109837)).toBeLessThan(5e-6);
  });

  it("wide lines: N = 300 N/m and κ = 0.24963 1/m both ways", () => {
    const { force } = patternedFilm({ ...film, pattern: lines(10) });
    // What the edges of lines of 10 m still relieve, one part in a million.
    expect(relative(force.x, 300)).toBeLessThan(2e-6);
    expect(relative(force.y, 300)).toBeLessThan(2e-6);
    const { x, y } = directionalStoneyCurvature({ ...wafer, force: { x: 300, y: 300 } });
    expect(relative(x, 0.24963)).toBeLessThan(2e-5);
    expect(y).toBe(x);
  });

  it("the laminate of a soft, very thin film of the same force bends alike, but for the lever of half the film", () => {
    // One nanometre at as many pascals as keep the force in proportion: only the arm (1 + h_f/h) and the stiffness are left.
    const scale = 3e-6 / 1e-9;
    const solved = solveDirectionalLaminate([
      { thickness: 200e-6, youngsModulus: 169e9, poissonsRatio: 0.0625 },
      { ...film, thickness: 1e-9, youngsModulus: 1e3, pattern: lines(1e-10) },
    ]);
    const lever = 1 + 1e-9 / 200e-6;
    const { force } = patternedFilm({ ...film, pattern: lines(1e-10) });
    const thin = directionalStoneyCurvature({ ...wafer, force });
    // The line of 0.1 nm on a film of 1 nm keeps a share of 0.0008 across: taken from the film's own force.
    const own = patternedFilm({ ...film, thickness: 1e-9, youngsModulus: 1e3, pattern: lines(1e-10) });
    const exact = directionalStoneyCurvature({ ...wafer, force: own.force });
    expect(relative(solved.curvatureX, exact.x * lever)).toBeLessThan(1e-11);
    expect(relative(solved.curvatureY, exact.y * lever)).toBeLessThan(1e-11);
    expect(relative(solved.curvatureX * scale, thin.x)).toBeLessThan(1e-3);
  });
});

describe("share of the stress kept, against plane finite elements of lines on thick silicon, coverage 0.5", () => {
  /** Young's modulus, then the computed shares at line widths of 2, 5, 10, 20 and 50 film thicknesses. */
  it.each([
    { modulus: 3.2e9, shares: [0.242, 0.555, 0.768, 0.884, 0.954] },
    { modulus: 70e9, shares: [0.19, 0.447, 0.669, 0.816, 0.919] },
    { modulus: 117e9, shares: [0.15, 0.358, 0.58, 0.752, 0.886] },
    { modulus: 180e9, shares: [0.132, 0.315, 0.526, 0.708, 0.86] },
  ])("film of $modulus Pa", ({ modulus, shares }) => {
    [2, 5, 10, 20, 50].forEach((width, n) => {
      const share = shares[n] ?? NaN;
      // The docstring's bound for the practical form.
      expect(Math.abs(edgeRelief(width, transferLength(1, modulus, "line")) - share)).toBeLessThan(0.09);
    });
  });
});
