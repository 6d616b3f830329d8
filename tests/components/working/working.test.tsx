/* Formulas and workings as a reader sees them. */
import { describe, expect, it } from "vitest";
import { EQUATIONS } from "#app/engine/equations.ts";
import { stoneyCurvatureWorking } from "#app/engine/stoney/working.ts";
import type { UnitSymbol, Working } from "#app/engine/working.ts";
import { Formula } from "#app/components/working/Formula.tsx";
import { FormulaLines } from "#app/components/working/FormulaLines.tsx";
import { shownWorking } from "#app/lib/shown-working.ts";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { formatInUnit } from "#app/lib/format-unit.ts";
import { render, words } from "../drawings/render.ts";

describe("a formula", () => {
  it.each([
    ["κ = 6 σ_f h_f / (M h^2)", "κ = 6 σ<sub>f</sub> h<sub>f</sub> / (M h<sup>2</sup>)"],
    ["h_i^2 / 12", "h<sub>i</sub><sup>2</sup> / 12"],
    ["2 f / (1 + ν)^1.5", "2 f / (1 + ν)<sup>1.5</sup>"],
    ["κ − κ_0", "κ − κ<sub>0</sub>"],
    ["e^(−x t) + 1", "e<sup>−x t</sup> + 1"],
    ["2 c_2 / (1 + c_1^2)^1.5", "2 c<sub>2</sub> / (1 + c<sub>1</sub><sup>2</sup>)<sup>1.5</sup>"],
    ["α_base dT", "α<sub>base</sub> dT"],
    ["10^−6 m", "10<sup>−6</sup> m"],
    ["S/S_cr", "S/S<sub>cr</sub>"],
    ["σ = M ε", "σ = M ε"],
  ])("%s is set as %s", (text, markup) => {
    expect(render(<Formula text={text} />)).toBe(markup);
  });

  it.each(Object.entries(EQUATIONS))("of %s leaves no mark of its notation behind", (_, { formula, symbols }) => {
    for (const text of [formula, ...symbols.map(({ symbol }) => symbol)])
      expect(words(render(<Formula text={text} />))).not.toMatch(/[_^]/);
  });

  it("of several relations has a line for each, and parts nothing inside brackets", () => {
    const lines = (formula: string) => render(<FormulaLines title="t" formula={formula} />).match(/<p/g)?.length;
    expect(lines("a = b, c = f(d, e)")).toBe(2);
  });
});

describe("a value", () => {
  it.each<[number, UnitSymbol, boolean, string]>([
    [343.21e-6, "m", false, "343.21 µm"],
    [-120e6, "Pa", false, "−120 MPa"],
    [298.15, "K", true, "25 °C"],
    [20, "K", false, "20 K"],
    [0.00211, "1/m", false, "0.00211 1/m"],
    [16.7e-6, "1/K", false, "16.7 ppm/K"],
    [494.2, "N/m", false, "494.2 N/m"],
    [0.016809, "N·m", false, "0.016809 N·m"],
    [0.1605, "1", false, "0.1605"],
    [90, "s", false, "1.5 min"],
    [2329, "kg/m3", false, "2329 kg/m³"],
  ])("%f %s reads %s %s", (value, unit, point, text) => {
    expect(formatInUnit(value, unit, point).replaceAll("\u00A0", " ")).toBe(text);
  });
});

describe("a working", () => {
  const curvature = stoneyCurvatureWorking({
    filmStress: 100e6,
    filmThickness: 1e-6,
    substrateThickness: 725e-6,
    biaxialModulus: 180.2e9,
  });
  const working: Working = {
    equation: "bow-parabola",
    inputs: [
      { symbol: "κ", meaning: "curvature", value: 0.0063, unit: "1/m", source: "stoney-1909" },
      { symbol: "R", meaning: "wafer radius", value: 0.1, unit: "m", source: "supplier, drawing" },
    ],
    result: { symbol: "s", meaning: "rim over centre", value: 31.6e-6, unit: "m" },
    note: "A note of this use.",
    from: [curvature],
  };
  const markup = render(<WorkingView working={shownWorking(working)} />);
  const said = words(markup);

  it("says the equation, every symbol with its unit, the result, where it holds and what might be got wrong", () => {
    for (const text of [
      "Bow from curvature",
      "curvature",
      "0.0063 1/m",
      "wafer radius",
      "100 mm",
      "rim over centre",
      "31.6 µm",
      "A note of this use.",
      EQUATIONS["bow-parabola"].range,
      EQUATIONS["bow-parabola"].caution,
    ])
      expect(said.replaceAll("\u00A0", " ")).toContain(text);
  });

  it("cites a source of the bibliography and repeats a provenance as it is", () => {
    expect(said).toContain("The tension of metallic films deposited by electrolysis");
    expect(said).toContain("supplier, drawing");
  });

  it("puts what it rests on below it, one heading deeper, never past the sixth", () => {
    expect(markup).toMatch(/<h3[^>]*>Bow from curvature<\/h3>/);
    expect(markup).toMatch(/<h4[^>]*>Curvature from a thin film&#x27;s stress<\/h4>/);
    expect(render(<WorkingView working={shownWorking(working)} level={6} />)).not.toMatch(/<h[78]/);
  });
});
