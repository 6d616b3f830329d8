/* What is shown can be typed in again. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DIMENSIONS, type Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const choices = fc.constantFrom(...(Object.keys(DIMENSIONS) as Dimension[])).chain((dimension) =>
  fc.tuple(
    fc.constant(dimension),
    fc.option(fc.constantFrom(...DIMENSIONS[dimension].units.map(({ symbol }) => symbol as string)), {
      nil: undefined,
    }),
  ),
);

describe("format and parse", () => {
  it("round-trip to the digits shown, in every unit of every dimension", () => {
    fc.assert(
      fc.property(
        choices,
        logarithmic(1e-12, 1e12),
        fc.boolean(),
        fc.integer({ min: 1, max: 17 }),
        (choice, size, negative, significant) => {
          const [dimension, unit] = choice;
          // Few digits can show a cold wafer below absolute zero, which cannot be typed.
          fc.pre(dimension !== "temperature" || (size > 100 && significant >= 4));
          const value = negative && dimension !== "temperature" ? -size : size;
          const text = formatQuantity(value, dimension, { unit, significant });
          const read = parseQuantity(text, dimension);
          if (!read.ok) throw new Error(`${text}: ${read.message}`);
          if (dimension === "temperature") {
            // Digits are of the shown number, which may be near zero degrees: measured against the size of the offset.
            expect(Math.abs(read.value - value)).toBeLessThan(
              10 ** (1 - significant) * (Math.abs(value) + 460) + 1e-12 * value,
            );
          } else {
            // Half a unit of the last digit, and a few roundings in double precision.
            expect(relative(read.value, value)).toBeLessThanOrEqual(0.5 * 10 ** (1 - significant) * (1 + 1e-9) + 1e-15);
          }
        },
      ),
      { numRuns: 1000 },
    );
  });

  it("never show a negative zero or a bare minus", () => {
    fc.assert(
      fc.property(
        choices,
        between(-1e-3, 1e-3),
        fc.integer({ min: 0, max: 6 }),
        ([dimension, unit], value, decimals) => {
          const text = formatQuantity(value, dimension, { unit, decimals });
          expect(text).not.toMatch(/^\u22120(\.0*)?(?![.\d])/);
          expect(text).not.toContain("-");
        },
      ),
    );
  });

  it("read the number as it stands, or refuse, for any text", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 20 }), choices, (text, [dimension]) => {
        const read = parseQuantity(text, dimension);
        if (read.ok) expect(Number.isFinite(read.value)).toBe(true);
        else expect(read.message).toMatch(/[.?]$/);
      }),
    );
  });
});
