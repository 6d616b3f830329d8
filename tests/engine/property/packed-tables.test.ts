/* Tables as text: what goes in comes out. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { packTable, unpackTable } from "#app/engine/gravity/smooth-table.ts";
import { packIntegers, unpackIntegers } from "#app/engine/packed-integers.ts";

describe("packed integers", () => {
  it("come out as they went in", () => {
    const integer = fc.oneof(
      fc.integer({ min: -50, max: 50 }),
      fc.maxSafeInteger().map((value) => Math.trunc(value / 4)),
    );
    fc.assert(
      fc.property(fc.array(integer), (values) => {
        expect(unpackIntegers(packIntegers(values))).toEqual(values.map((value) => value + 0));
      }),
    );
  });

  it("take one character each while they are small, and none that a string has to escape", () => {
    const small = Array.from({ length: 44 }, (_, n) => n - 22);
    expect(packIntegers(small)).toHaveLength(44);
    expect(packIntegers(Array.from({ length: 5000 }, (_, n) => n - 2500))).toMatch(/^[^"'`\\$<\s]*$/);
  });
});

describe("a packed table of smooth columns", () => {
  it("comes out rounded to its quantum, whatever is in it", () => {
    const row = fc.tuple(...[0, 1, 2, 3].map(() => fc.double({ min: -2, max: 2, noNaN: true })));
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 40 }), (rows) => {
        const found = unpackTable(packTable(rows, 1e6), 4, 1e6);
        expect(found).toHaveLength(rows.length);
        rows.forEach((values, n) =>
          values.forEach((value, column) => expect(Math.abs((found[n]?.[column] ?? NaN) - value)).toBeLessThan(5.1e-7)),
        );
      }),
    );
  });
});
