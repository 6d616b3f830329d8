/* The bibliography and the registry of equations: complete, readable with the fonts shipped, free of addresses. */
import { describe, expect, it } from "vitest";
import { EQUATIONS, type Equation } from "#app/engine/equations.ts";
import { citation, SOURCES, type Source, type SourceId } from "#app/engine/sources.ts";

const equations: [string, Equation][] = Object.entries(EQUATIONS);
const sources: [string, Source][] = Object.entries(SOURCES);

/** Latin, Latin extended A, Greek, and a few marks that the shipped subsets hold. */
const GLYPHS = /^[\u0020-\u007E\u00A0-\u017F\u0370-\u03FF\u2013\u2212\u201C\u201D\u2018\u2019]*$/;

describe("equations", () => {
  it.each(equations)("%s is stated in full", (_, equation) => {
    expect(equation.title).not.toBe("");
    expect(equation.range).toMatch(/\.$/);
    expect(equation.sources.length).toBeGreaterThan(0);
    for (const source of equation.sources) expect(SOURCES).toHaveProperty(source);
    const text = [equation.title, equation.formula, equation.range, equation.caution ?? ""];
    for (const part of [...text, ...equation.symbols.flatMap(({ symbol, meaning }) => [symbol, meaning])]) {
      expect(part).toMatch(GLYPHS);
    }
  });

  it.each(equations)("%s explains symbols that its formula holds", (_, { formula, symbols }) => {
    for (const { symbol } of symbols.slice(0, 2)) {
      // Running indices stand as given; S/S_cr is explained by its parts.
      expect(formula).toContain(symbol.split("/")[0] ?? symbol);
    }
  });

  it("holds every equation that other parts name", () => {
    for (const id of [
      "stoney-curvature",
      "stoney-stress",
      "film-force",
      "thickness-rule",
      "warp-against-limit",
      "first-order-uncertainty",
    ]) {
      expect(EQUATIONS).toHaveProperty(id);
    }
  });
});

describe("sources", () => {
  it.each(sources)("%s is cited without an address", (id, source) => {
    const text = citation(id as SourceId);
    expect(text).toContain(source.title);
    expect(text).toContain(source.basis);
    expect(text).not.toMatch(/https?:|www\.|\.com|\.org|doi/i);
    expect(text).toMatch(GLYPHS);
  });
});
