/* Every unit of the tables against the units package as it comes ready made, with its own fractions: the same size and zero. */
import { readFileSync } from "node:fs";
import { unit } from "mathjs";
import { describe, expect, it } from "vitest";
import { toSi } from "#app/engine/units/convert.ts";
import {
  DIMENSIONS,
  type Dimension,
  type DimensionDefinition,
  type UnitDefinition,
} from "#app/engine/units/dimensions.ts";
import { factorsText } from "#app/engine/units/generator/factors-text.ts";
import { relative } from "../relative.ts";

const units = (Object.keys(DIMENSIONS) as Dimension[]).flatMap((dimension) => {
  const { si, units: list }: DimensionDefinition = DIMENSIONS[dimension];
  return list.flatMap((one) =>
    si === null || one.base === null ? [] : [{ dimension, si, base: one.base, one, symbol: one.symbol }],
  );
});

describe("units", () => {
  it.each(units)("$symbol of $dimension is what the package says", ({ dimension, si, base, one }) => {
    const size = (value: number, of: UnitDefinition) => toSi(value, of, dimension);
    for (const value of [1, 37.5])
      // A few roundings in double precision.
      expect(relative(size(value, one), unit(value * one.times, base).toNumber(si))).toBeLessThan(1e-15);
  });
});

describe("the table of units", () => {
  it("is what its generator makes", () => {
    const file = new URL("../../../app/engine/units/table/factors.ts", import.meta.url);
    expect(readFileSync(file, "utf8")).toBe(factorsText());
  });
});
